import type { Box } from '../../../shared/domain/fact.ts'
import { type PlacedWord, boxAround, wordsIn } from '../../../shared/domain/sheet-text.ts'

export interface MarkedPlace {
  revisionId: string
  page: number
  box: Box
  quote: string
}

const nowhere = 'https://here.invalid'

/** The address to go back to with the marked place in its query; undefined unless it is one of this site's own pages. */
export function backWith(returnTo: string, { revisionId, page, box, quote }: MarkedPlace): string | undefined {
  const address = ownPage(returnTo)
  if (!address) return undefined
  address.searchParams.set('revision', revisionId)
  address.searchParams.set('page', String(page))
  address.searchParams.set('box', box.map(tenths).join(','))
  address.searchParams.set('quote', quote)
  return `${address.pathname}${address.search}${address.hash}`
}

/** A relative address of this site, or undefined: `//elsewhere`, `/\elsewhere` and `https:` lead away and are refused. */
export function ownPage(address: string): URL | undefined {
  if (!/^\/(?![/\\])/.test(address) || !URL.canParse(address, nowhere)) return undefined
  const url = new URL(address, nowhere)
  return url.origin === nowhere ? url : undefined
}

export const tenths = (points: number) => Math.round(points * 10) / 10

/** `left,top,right,bottom` of the address, or undefined when it is no box. */
export function boxOf(text: string | null): Box | undefined {
  const edges = (text ?? '').split(',').map(Number)
  const [left = NaN, top = NaN, right = NaN, bottom = NaN] = edges
  return edges.length === 4 && edges.every(Number.isFinite) && left < right && top < bottom ? [left, top, right, bottom] : undefined
}

/** A box drawn roughly, drawn close around the words whose middle it holds; as drawn where there are none. */
export function closeAround(words: readonly PlacedWord[], drawn: Box): Box {
  return boxAround(wordsIn(words, drawn)) ?? drawn
}

export interface PageSize {
  width: number
  height: number
}
const least = 4

/** A box moved (`by` on left and right alike) or sized, kept on the page. */
export function nudged(box: Box, step: { x: number; y: number }, { size, sizing }: { size: PageSize; sizing: boolean }): Box {
  const [left, top, right, bottom] = box
  if (sizing) {
    return [left, top, clamp(right + step.x, left + least, size.width), clamp(bottom + step.y, top + least, size.height)]
  }
  const x = clamp(step.x, -left, size.width - right)
  const y = clamp(step.y, -top, size.height - bottom)
  return [left + x, top + y, right + x, bottom + y]
}

const clamp = (value: number, least: number, most: number) => Math.min(Math.max(value, least), most)

/** The box between two corners, kept on the page. */
export function between(a: { x: number; y: number }, b: { x: number; y: number }, size: PageSize): Box {
  const x = [a.x, b.x].map((value) => clamp(value, 0, size.width)).sort((one, other) => one - other)
  const y = [a.y, b.y].map((value) => clamp(value, 0, size.height)).sort((one, other) => one - other)
  return [x[0] ?? 0, y[0] ?? 0, x[1] ?? 0, y[1] ?? 0]
}
