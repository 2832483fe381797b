import type { Box } from './fact.ts'

/** A word of a page with left, top, right, bottom in points from the top-left corner as shown. */
export type PlacedWord = readonly [text: string, left: number, top: number, right: number, bottom: number]

/** The box grown by `by` points on all sides. */
function grown([left, top, right, bottom]: Box, by: number): Box {
  return [left - by, top - by, right + by, bottom + by]
}

/** The smallest box around words; null without words. */
export function boxAround(words: readonly PlacedWord[]): Box | null {
  if (words.length === 0) return null
  return [
    Math.min(...words.map((word) => word[1])),
    Math.min(...words.map((word) => word[2])),
    Math.max(...words.map((word) => word[3])),
    Math.max(...words.map((word) => word[4])),
  ]
}

/** Words whose middle lies in the box, in the order of the page. `slack` in points widens the box. */
export function wordsIn(words: readonly PlacedWord[], box: Box, slack = 0): PlacedWord[] {
  const [left, top, right, bottom] = grown(box, slack)
  return words.filter((word) => {
    const x = (word[1] + word[3]) / 2
    const y = (word[2] + word[4]) / 2
    return x >= left && x <= right && y >= top && y <= bottom
  })
}

/** Do two words stand on one line? Their middles differ by less than half the lower one's height. */
function onOneLine(a: PlacedWord, b: PlacedWord): boolean {
  const difference = Math.abs((a[2] + a[4]) / 2 - (b[2] + b[4]) / 2)
  return difference < Math.min(a[4] - a[2], b[4] - b[2]) / 2
}

/** What a box says: its words joined, one space between. */
export function quoteOf(words: readonly PlacedWord[], box: Box): string {
  return wordsIn(words, box)
    .map(([text]) => text)
    .join(' ')
}

/** Characters that are written in more than one way, brought to one for comparison. */
function searchable(text: string): string {
  return text
    .toLowerCase()
    .replace(/[\u2010-\u2015\u2212]/g, '-')
    .replace(/[\u2018\u2019]/g, "'")
    .replace(/[\u201c\u201d]/g, '"')
    .replace(/\u00b5/g, 'μ')
}

export interface PhraseHit {
  /** One box a line: a phrase may run over the end of one. */
  boxes: Box[]
  /** The words around the phrase. */
  excerpt: string
}

/**
 * Where a phrase stands on a page, in the page's order. The first and the last word may be met in part ("cur" finds "cure");
 * white space between words does not matter, so "75°F" finds "75 °F" and the other way round.
 */
export function findPhrase(words: readonly PlacedWord[], phrase: string): PhraseHit[] {
  const wanted = searchable(phrase).replace(/\s+/g, '')
  if (wanted === '') return []
  let joined = ''
  const wordAt: number[] = []
  words.forEach(([text], index) => {
    const word = searchable(text)
    joined += word
    for (let i = 0; i < word.length; i++) wordAt.push(index)
  })
  const hits: PhraseHit[] = []
  for (let from = joined.indexOf(wanted); from >= 0; from = joined.indexOf(wanted, from + wanted.length)) {
    const first = wordAt[from] ?? 0
    const last = wordAt[from + wanted.length - 1] ?? first
    hits.push({ boxes: boxesByLine(words.slice(first, last + 1)), excerpt: excerptAround(words, first, last) })
  }
  return hits
}

function boxesByLine(words: readonly PlacedWord[]): Box[] {
  const lines: PlacedWord[][] = []
  for (const word of words) {
    const line = lines.at(-1)
    const before = line?.at(-1)
    if (line && before && onOneLine(before, word)) line.push(word)
    else lines.push([word])
  }
  return lines.map(boxAround).filter((box) => box !== null)
}

const wordsAround = 5

function excerptAround(words: readonly PlacedWord[], first: number, last: number): string {
  const from = Math.max(0, first - wordsAround)
  const to = Math.min(words.length, last + 1 + wordsAround)
  const text = words
    .slice(from, to)
    .map(([word]) => word)
    .join(' ')
  return `${from > 0 ? '… ' : ''}${text}${to < words.length ? ' …' : ''}`
}
