import type { Box } from '../../../shared/domain/fact.ts'
import { type PlacedWord, boxAround } from '../../../shared/domain/sheet-text.ts'

export interface Place {
  page: number
  box: Box
}
type Page = readonly PlacedWord[]

const middle = (word: PlacedWord) => (word[2] + word[4]) / 2
const onLine = (a: PlacedWord, b: PlacedWord) => Math.abs(middle(a) - middle(b)) < 4
const tokens = (text: string) => text.split(/\s+/).filter(Boolean)

/** Where a run of words begins, in reading order from `from` on. */
function runAt(words: Page, wanted: readonly string[], from: number): number {
  for (let start = from; start + wanted.length <= words.length; start++) {
    if (wanted.every((token, index) => words[start + index]?.[0] === token)) return start
  }
  return -1
}

/** The place of words in the row that a label begins: the page and the box around the words. `nth` tells equal words of one row apart. */
export function placeInRow(pages: readonly Page[], { label, words, nth = 0 }: { label: string; words: string; nth?: number }): Place {
  const wanted = tokens(words)
  for (const [index, page] of pages.entries()) {
    const starts = page.flatMap((_, at) => (runAt(page, tokens(label), at) === at ? [at] : []))
    for (const start of starts) {
      const first = page[start]
      const row = first ? page.slice(start + tokens(label).length).filter((word) => middle(word) > middle(first) - 4) : []
      const line = first ? row.filter((word) => onLine(word, first)) : []
      const found = nthRun(line, wanted, nth) ?? (nth === 0 ? nthRun(row.slice(0, wanted.length + 2), wanted, 0) : undefined)
      const box = found && boxAround(found)
      if (box) return { page: index + 1, box: box.map((edge) => Math.round(edge * 10) / 10) as unknown as Box }
    }
  }
  throw new Error(`The sheet does not say “${words}” beside “${label}”.`)
}

function nthRun(words: Page, wanted: readonly string[], nth: number): Page | undefined {
  let from = 0
  for (let count = 0; ; count++) {
    const at = runAt(words, wanted, from)
    if (at < 0) return undefined
    if (count === nth) return words.slice(at, at + wanted.length)
    from = at + wanted.length
  }
}
