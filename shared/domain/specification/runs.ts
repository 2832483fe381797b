import type { Item, Known, Run, Runs } from './document.ts'

type Piece = string | Run

/** The document's own words; a number in them belongs in a figure. */
const text = (words: string): Run => ({ kind: 'text', text: words })

/** Names, reasons and words that are taken as they stand. */
export const quoted = (words: string): Run => ({ kind: 'quoted', text: words })

/** A value that needs no tag: what the job measured, what the build-up chose, what a standard says. */
export const plainFigure = (words: string, known: Known): Run => ({ kind: 'figure', text: words, known, tags: [], citation: null })
export const standard = (words: string): Run => plainFigure(words, 'standard')
export const measured = (words: string): Run => plainFigure(words, 'measured')
export const chosen = (words: string): Run => plainFigure(words, 'chosen')
export const notStatedRun = (because?: string): Runs => [
  plainFigure('not stated', 'not-stated'),
  ...(because ? [text(' ('), quoted(because), text(')')] : []),
]

/** A line put together from words and figures: `` line`Apply at ${rate}.` `` */
export function line(words: TemplateStringsArray, ...pieces: readonly (Piece | readonly Run[])[]): Runs {
  const runs = words.flatMap((part, index): Run[] => {
    const piece = pieces[index]
    const own = part === '' ? [] : [text(part)]
    if (piece === undefined) return own
    if (typeof piece === 'string') return [...own, quoted(piece)]
    return [...own, ...(Array.isArray(piece) ? (piece as Run[]) : [piece as Run])]
  })
  return runs
}

/** Runs of several lines one after the other, with words between. */
export function joined(lines: readonly Runs[], between: string): Runs {
  return lines.flatMap((runs, index) => (index === 0 ? runs : [text(between), ...runs]))
}

/** A paragraph, with its subparagraphs. */
export function item(runs: Runs, items: readonly (Item | null)[] = []): Item {
  return { runs, items: items.filter((one) => one !== null) }
}

/** Paragraphs of the document's own words alone. */
export const plain = (...lines: string[]): Item[] => lines.map((words) => item([text(words)]))
