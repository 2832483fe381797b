import type { Fact, Origin } from '../fact.ts'
import { type Figure, type KnownFigure, type Missing, isTypical } from '../figure.ts'
import type { Property } from '../property.ts'
import { formatConditions, formatRange, formatValue, formatWindow } from '../format.ts'
import type { Known, Run, Runs, SpecDocument, SpecSource } from './document.ts'
import { line, notStatedRun, quoted } from './runs.ts'

type Lists = Pick<SpecDocument, 'sources' | 'workings' | 'entered' | 'typicals'>

/** Hands out the tags of a document: each page of a sheet, each entered value, typical value and working once, in the order of first use. */
export interface Register {
  /** A fact of the catalogue: its value with its tag. */
  fact(fact: Fact): Run
  /** The same with the conditions that it holds at. */
  factAt(fact: Fact): Runs
  /** A figure in words, "not stated" with its reason where it is. */
  figure(figure: Figure, options?: { window?: boolean }): Runs
  /** "not stated", of a property of a mix or product; kept for the front of the document. */
  notStated(of: string, property: Property): Runs
  /** What the document has called not stated so far: figures, and what sheets are silent on. */
  gaps(): { figures: Missing[]; silences: { of: string; property: Property }[] }
  /** Words that several facts state together, with the tags of all. */
  cite(text: string, facts: readonly Fact[]): Run
  /** A number worked out for the document itself. */
  working(text: string, working: { formula: string; sum: string; source: string; facts?: readonly Fact[] }): Run
  lists(): Lists
}

const knownOf: Record<Origin['kind'], Known> = { stated: 'stated', entered: 'entered', typical: 'typical' }
/** The words with which `evaluate` marks what a person chose for a course. */
const chosenFormula = 'chosen for this course'

export function createRegister(): Register {
  const lists: Lists = { sources: [], workings: [], entered: [], typicals: [] }
  const gaps: ReturnType<Register['gaps']> = { figures: [], silences: [] }

  const tagOf = (origin: Origin): string => {
    if (origin.kind === 'stated') return sheetTag(lists.sources, origin.citation)
    if (origin.kind === 'entered') {
      const { reason, by, at } = origin
      return once(lists.entered, 'E', { entry: { reason, by, at }, same: (one) => one.reason === reason && one.by === by })
    }
    const { source, dated } = origin
    return once(lists.typicals, 'T', { entry: { source, dated }, same: (one) => one.source === source && one.dated === dated })
  }
  const cited = (text: string, origin: Origin): Run => ({
    kind: 'figure',
    text,
    known: knownOf[origin.kind],
    tags: [tagOf(origin)],
    citation: origin.kind === 'stated' ? origin.citation : null,
  })
  const working: Register['working'] = (text, { formula, sum, source, facts = [] }) => ({
    kind: 'figure',
    text,
    known: 'computed',
    citation: null,
    tags: [
      once(lists.workings, 'W', {
        entry: { formula, sum, source, from: [...new Set(facts.map(({ origin }) => tagOf(origin)))] },
        same: (one) => one.formula === formula && one.sum === sum && one.source === source,
      }),
    ],
  })
  const computedRun = (figure: Extract<KnownFigure, { kind: 'computed' }>, text: string): Run => {
    if (figure.working.formula === chosenFormula) return { kind: 'figure', text, known: 'chosen', tags: [], citation: null }
    const from = [...new Set(figure.from.flatMap(({ origin }) => (origin ? [tagOf(origin)] : [])))]
    const { formula, sum, source } = figure.working
    const tag = once(lists.workings, 'W', {
      entry: { formula, sum, source, from },
      same: (one) => one.formula === formula && one.sum === sum && String(one.from) === String(from),
    })
    return { kind: 'figure', text, known: isTypical(figure) ? 'typical' : 'computed', tags: [tag], citation: null }
  }
  const cite: Register['cite'] = (text, facts) => {
    const [first] = facts
    if (!first) return quoted(text)
    return { ...cited(text, first.origin), tags: [...new Set(facts.map(({ origin }) => tagOf(origin)))] } as Run
  }
  const fact: Register['fact'] = (one) => cited(formatValue(one), one.origin)
  return {
    fact,
    factAt: (one) => {
      const conditions = formatConditions(one.at)
      return conditions ? line`${fact(one)} ${quoted(conditions)}` : [fact(one)]
    },
    figure: (figure, { window = false } = {}) => {
      if (figure.kind === 'not-stated') {
        gaps.figures.push(figure.missing)
        return notStatedRun(figure.missing.because)
      }
      const text = window ? formatWindow(figure.value) : formatRange(figure.value)
      if (figure.kind === 'computed') return [computedRun(figure, text)]
      const run = cited(text, figure.origin)
      return figure.condition === 'no temperature stated' ? line`${run} (no temperature stated)` : [run]
    },
    notStated: (of, property) => {
      gaps.silences.push({ of, property })
      return notStatedRun()
    },
    gaps: () => gaps,
    cite,
    working,
    lists: () => lists,
  }
}

/** Finds the same entry or adds it under the next tag of its letter. */
function once<T extends object>(
  list: ({ tag: string } & T)[],
  letter: string,
  { entry, same }: { entry: T; same: (one: T) => boolean },
): string {
  const known = list.find(same)
  if (known) return known.tag
  const tag = `${letter}${list.length + 1}`
  list.push({ tag, ...entry })
  return tag
}

function sheetTag(sources: SpecSource[], citation: Extract<Origin, { kind: 'stated' }>['citation']): string {
  const { sheetTitle: title, revisionDate, revisionId, page, quote } = citation
  const same = sources.find((one) => one.revisionId === revisionId && one.page === page)
  const source = same ?? { tag: `S${sources.length + 1}`, title, revisionDate, revisionId, page, quotes: [] }
  if (!same) sources.push(source)
  if (quote && !source.quotes.includes(quote)) source.quotes.push(quote)
  return source.tag
}
