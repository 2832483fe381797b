import { type PictogramCode, ghsStatement, pictogramsOfStatement, signalWordOfStatement } from '../reference/ghs.ts'
import type { HazardSummary } from './evaluation.ts'
import { type Fact, codesOf, textOf } from './fact.ts'
import type { Property } from './property.ts'

/** Whatever a safety sheet speaks of: a component, an aggregate, or a mix whose parts share one sheet. */
export interface Handled {
  id: string
  name: string
  facts: readonly Fact[]
}

/** A statement that goes without saying beside another on one label. Source: GHS 1.4.10.5.3.3, CLP Article 27. */
const leftOut: Record<string, string> = { H318: 'H314', H400: 'H410', H401: 'H411', H402: 'H412', P261: 'P260' }

const acute = /^H3(02|12|32)/
const skinOrEye = new Set(['H315', 'H319'])
const sensitised = new Set(['H315', 'H317', 'H319'])
const singles = (codes: readonly string[]): readonly string[] =>
  codes.some((code) => code.includes('+')) ? codes.flatMap((code) => code.split('+')) : codes

/** Statements that are said on one label: without duplicates and without those that go without saying, in the order of their numbers. */
export function statementsOf(codes: readonly string[]): string[] {
  const said = new Set(singles(codes))
  return [...new Set(codes)].filter((code) => !said.has(leftOut[code] ?? '')).sort()
}

/**
 * Pictograms of one label's hazard statements, with precedence: the exclamation mark goes where the skull stands for acute toxicity,
 * where corrosion stands for skin or eye irritation, and where the health hazard stands for respiratory sensitisation.
 * Source: GHS 1.4.10.5.3.1, HCS Appendix C.2.1.
 */
export function pictogramsOf(codes: readonly string[]): PictogramCode[] {
  const asked = singles(codes)
  const has = (pictogram: PictogramCode) => asked.some((code) => pictogramsOfStatement(code).includes(pictogram))
  const covered = (code: string) =>
    (has('GHS06') && acute.test(code)) || (has('GHS05') && skinOrEye.has(code)) || (asked.includes('H334') && sensitised.has(code))
  const shown = asked.flatMap((code) => pictogramsOfStatement(code).filter((pictogram) => pictogram !== 'GHS07' || !covered(code)))
  return [...new Set(shown)].sort()
}

/** Danger goes before Warning, however a sheet writes them. Source: GHS 1.4.10.5.3.2. */
export function signalWordOf(words: readonly (string | undefined)[]): 'Danger' | 'Warning' | null {
  const said = words.map((word) => word?.trim().toLowerCase() ?? '')
  return said.some((word) => word.startsWith('danger')) ? 'Danger' : said.some((word) => word.startsWith('warning')) ? 'Warning' : null
}

/** What one label says, read once. */
interface Label {
  name: string
  /** Hazard and supplemental statements. */
  codes: string[]
  precautions: string[]
  signalWords: (string | undefined)[]
  words: Partial<Record<Property, string[]>>
}

const worded: ReadonlySet<Property> = new Set(['gloves', 'eyeProtection', 'respiratoryProtection', 'emergencyPhone'])

function labelOf({ name, facts }: Handled): Label {
  const label: Label = { name, codes: [], precautions: [], signalWords: [], words: {} }
  for (const fact of facts) {
    if (fact.property === 'hazardStatements' || fact.property === 'supplementalStatements') label.codes.push(...codesOf(fact))
    else if (fact.property === 'precautionaryStatements') label.precautions.push(...codesOf(fact))
    else if (fact.property === 'signalWord') label.signalWords.push(textOf(fact))
    else if (worded.has(fact.property)) (label.words[fact.property] ??= []).push(textOf(fact)?.trim() ?? '')
  }
  return label
}

/** Words of a property on each sheet, with whose they are. */
function wordsOf(labels: readonly Label[], property: Property) {
  return labels.flatMap(({ name, words }) => [...new Set(words[property])].filter(Boolean).map((text) => ({ text, from: name })))
}

/** Codes of several labels as statements, each with whose label it stands on. */
function united(labels: readonly { name: string; codes: readonly string[] }[]) {
  const sources = new Map<string, Set<string>>()
  for (const { name, codes } of labels) for (const code of codes) sources.set(code, (sources.get(code) ?? new Set()).add(name))
  return [...sources]
    .sort(([a], [b]) => (a < b ? -1 : 1))
    .map(([code, from]) => ({ code, text: ghsStatement(code) ?? code, from: [...from] }))
}

/** Precautions of everything together: of two that say one thing, the stricter. */
function precautionsOf(labels: readonly Label[]): HazardSummary['precautions'] {
  const all = united(labels.map(({ name, precautions }) => ({ name, codes: precautions })))
  const kept = new Set(statementsOf(all.map(({ code }) => code)))
  return all.filter(({ code }) => kept.has(code))
}

/** True when a safety sheet has been read: it states hazards, a signal word, or that there are none. */
export function hasHazards({ facts }: Pick<Handled, 'facts'>): boolean {
  return facts.some(({ property }) => property === 'hazardStatements' || property === 'signalWord')
}

/**
 * Hazards of several things handled together: the union of their labels, each by the rules of one label, so that nothing that stands on a pail is lost
 * because another pail bears more. The signal word is the sheets' own or what the standard gives to their statements, whichever is graver. What arises in mixing, curing and grinding is on no sheet, and what no sheet states is listed as not stated.
 */
export function unionOfHazards(all: readonly Handled[]): HazardSummary {
  const handled = [...new Map(all.map((one) => [one.id, one])).values()]
  const labels = handled.map(labelOf)
  const standard = labels.flatMap(({ codes }) => singles(codes).map(signalWordOfStatement))
  return {
    signalWord: signalWordOf([...labels.flatMap(({ signalWords }) => signalWords), ...standard]),
    pictograms: [...new Set(labels.flatMap(({ codes }) => pictogramsOf(codes)))].sort(),
    statements: united(labels.map(({ name, codes }) => ({ name, codes: statementsOf(codes) }))),
    precautions: precautionsOf(labels),
    gloves: wordsOf(labels, 'gloves'),
    eyes: wordsOf(labels, 'eyeProtection'),
    breathing: wordsOf(labels, 'respiratoryProtection'),
    emergencyPhones: wordsOf(labels, 'emergencyPhone'),
    notStated: handled.filter((one) => !hasHazards(one)).map(({ name }) => name),
  }
}

/** The first-aid statements among precautions: P30x, P31x, P33x, P34x, P35x, P36x and what they are joined to. */
export function firstAidOf(precautions: HazardSummary['precautions']): HazardSummary['precautions'] {
  return precautions.filter(({ code }) => /^P3[0-6]/.test(code))
}
