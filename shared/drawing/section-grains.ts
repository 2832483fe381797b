import { type SectionScale, scaleFor } from './scale.ts'
import { scatter, seeded, stone } from './scatter.ts'
import { type PlacedLayer, heightAt } from './section-place.ts'
import type { Point, Shape } from './shapes.ts'

const sands = ['#a58d63', '#b7a27a', '#8c764f', '#c9b894']
/** Drawn for a grain whose size is not stated: marked as a stand-in in the notes. */
const standIn = 300

/** Pixels of a grain's radius: to its course's scale, never too small to see. */
function radiusOf(grain: number | null, { layer, bottom, top }: PlacedLayer, scale: SectionScale): number {
  const perMicrometre = layer.thickness === null ? (bottom - top) / 1500 : scaleFor(layer.thickness, scale)
  return Math.max(((grain ?? standIn) * perMicrometre) / 2, 0.65)
}

/** Paths of stones, one a colour. */
function sand(
  places: readonly Point[],
  radius: number,
  { id, random, least = 0.62 }: { id: string; random: () => number; least?: number },
): Shape[] {
  const edge = radius > 2.2 ? { stroke: '#6f5d3c', strokeWidth: 0.5 } : {}
  const byColor = sands.map((): string[] => [])
  for (const at of places)
    byColor[Math.floor(random() * sands.length)]?.push(stone(at, radius * (least + random() * (1.08 - least)), random))
  return byColor.flatMap((d, index): Shape[] =>
    d.length > 0 ? [{ kind: 'path', d: d.join(''), fill: sands[index] ?? sands[0] ?? '', course: id, ...edge }] : [],
  )
}

/** Sand mixed into a course: throughout its body, down into the spalls it takes. */
export function fillerGrains(placed: PlacedLayer, scale: SectionScale): Shape[] {
  const { layer, upper, lower, top } = placed
  if (!layer.filler) return []
  const random = seeded(`filler ${layer.id}`)
  const radius = radiusOf(layer.filler.grain, placed, scale)
  const deepest = Math.max(...lower.map(([, y]) => y))
  const field = { left: lower[0]?.[0] ?? 0, right: lower.at(-1)?.[0] ?? 0, top, bottom: deepest, pitch: radius * 2.15 }
  const inside = scatter(field, random).filter(
    ([x, y]) =>
      y > heightAt(upper, x) + radius * 0.8 && y < heightAt(lower, x) - radius * 0.8 && x > field.left + radius && x < field.right - radius,
  )
  return sand(inside, radius, { id: layer.id, random })
}

/** Sand thrown on the wet film: standing in it, packed when thrown to refusal, sparse otherwise. */
export function broadcastGrains(placed: PlacedLayer, scale: SectionScale): Shape[] {
  const { layer, upper, lower, top, bottom } = placed
  if (!layer.broadcast) return []
  const random = seeded(`broadcast ${layer.id}`)
  const radius = radiusOf(layer.broadcast.grain, placed, scale)
  const left = (lower[0]?.[0] ?? 0) + radius * 1.15
  const right = (lower.at(-1)?.[0] ?? 0) - radius * 1.15
  const film = bottom - top
  const rests = (x: number) => Math.min(heightAt(lower, x) - radius, heightAt(upper, x) + radius * 0.35)
  const row: Point[] = []
  const pitch = radius * (layer.broadcast.toRefusal ? 1.9 : 3.6)
  for (let x = left; x < right && row.length < 400; x += pitch * (0.95 + random() * 0.15)) row.push([x, rests(x) - random() * radius * 0.5])
  if (!layer.broadcast.toRefusal || film < radius * 3) return sand(row, radius, { id: layer.id, random, least: 0.86 })
  const body = scatter({ left, right, top: top + radius, bottom: bottom + 8, pitch: radius * 2.3 }, random).filter(
    ([x, y]) => y > heightAt(upper, x) + radius && y < heightAt(lower, x) - radius * 0.9,
  )
  return sand([...body, ...row], radius, { id: layer.id, random, least: 0.8 })
}
