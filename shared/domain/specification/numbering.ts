import type { Article, Item, SpecPart } from './document.ts'

/** A, B … Z, AA, BB …: as word processors count letters, so that the printed and the editable document agree. Counts from 0. */
export function letters(index: number): string {
  return String.fromCharCode(65 + (index % 26)).repeat(Math.floor(index / 26) + 1)
}

/** PageFormat (CSI): paragraphs A., subparagraphs 1., a., 1), a). Deeper there is none. */
const labels: readonly ((index: number) => string)[] = [
  (index) => `${letters(index)}.`,
  (index) => `${index + 1}.`,
  (index) => `${letters(index).toLowerCase()}.`,
  (index) => `${index + 1})`,
  (index) => `${letters(index).toLowerCase()})`,
]

/** Label of a paragraph by its level (0 for `A.`) and place. @throws RangeError below the deepest level */
export function labelOf(level: number, index: number): string {
  const label = labels[level]
  if (!label) throw new RangeError('PageFormat has no deeper level')
  return label(index)
}

/** "2.03": the third article of part 2. */
export function articleNumber(part: number, index: number): string {
  return `${part}.${String(index + 1).padStart(2, '0')}`
}

export interface NumberedItem {
  label: string
  level: number
  runs: Item['runs']
}

/** Paragraphs of an article in reading order; numbering starts anew under every parent. */
export function numberedItems(items: readonly Item[], level = 0): NumberedItem[] {
  return items.flatMap((item, index) => [{ label: labelOf(level, index), level, runs: item.runs }, ...numberedItems(item.items, level + 1)])
}

/** Articles of a part with their numbers. */
export function numberedArticles(part: SpecPart): (Pick<Article, 'id' | 'title'> & { number: string; items: NumberedItem[] })[] {
  return part.articles.map(({ id, title, items }, index) => ({
    id,
    title,
    number: articleNumber(part.number, index),
    items: numberedItems(items),
  }))
}
