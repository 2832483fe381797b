import { scatter, seeded, stone } from './scatter.ts'
import { type Ground, heightAt } from './section-place.ts'
import { type Point, type Shape, ink, pathOf } from './shapes.ts'

const stones = ['#a9ada6', '#9da29b', '#b6b9b1', '#afaa9d']

/** The end of the slab as a draftsman breaks it off: straight, with one sharp kink. */
function breakLine({ left, right, end }: Ground, over: number): Point[] {
  const x = left + (right - left) * 0.42
  return [
    [left - over, end],
    [x - 9, end],
    [x - 3, end - 9],
    [x + 4, end + 9],
    [x + 10, end],
    [right + over, end],
  ]
}

/** Concrete in section, with its aggregate, what fills its joints, and the line that breaks it off. */
export function slabShapes(ground: Ground, compact: boolean): Shape[] {
  const { contour, left, right, end } = ground
  const outline: Point[] = [...contour, ...(compact ? [[right, end] as const, [left, end] as const] : breakLine(ground, 0).reverse())]
  return [
    { kind: 'path', d: pathOf(outline, true), fill: ink.slab },
    ...aggregate(ground, compact),
    ...ground.joints.map(({ x, width, depth, layer }): Shape => {
      const top = Math.min(heightAt(contour, x - width / 2), heightAt(contour, x + width / 2))
      const corners: Point[] = [
        [x - width / 2, top],
        [x + width / 2, top],
        [x + width / 2, ground.surface + depth],
        [x - width / 2, ground.surface + depth],
      ]
      return {
        kind: 'path',
        d: pathOf(corners, true),
        fill: layer.color ?? ink.unknown,
        stroke: ink.ink,
        strokeWidth: 0.6,
        course: layer.id,
        ...(layer.color ? {} : { dash: '3 2' }),
      }
    }),
    ...(compact
      ? []
      : [{ kind: 'path' as const, d: pathOf(breakLine({ ...ground, left, right, end }, 7)), stroke: ink.ink, strokeWidth: 0.8 }]),
  ]
}

/** Broken stone of two sizes and sand, never across the surface, the joints or the break. One path a colour. */
function aggregate(ground: Ground, compact: boolean): Shape[] {
  const { left, right, surface, end, contour, joints } = ground
  const random = seeded('aggregate')
  const byColor = new Map<string, string[]>(stones.map((color) => [color, []]))
  const keep = ([x, y]: Point, radius: number) => {
    const free = joints.every((joint) => Math.abs(x - joint.x) > radius + joint.width / 2 + 1 || y > surface + joint.depth + radius)
    if (x - radius < left || x + radius > right || y - radius < heightAt(contour, x) + 2 || y + radius > end - 10 || !free) return
    byColor.get(stones[Math.floor(random() * stones.length)] ?? '')?.push(stone([x, y], radius, random))
  }
  const field = { left, right, top: surface, bottom: end }
  for (const at of scatter({ ...field, pitch: compact ? 11 : 24 }, random, 120))
    keep(at, (compact ? 1.6 : 3.4) + random() * (compact ? 1.2 : 4))
  if (!compact) for (const at of scatter({ ...field, pitch: 12 }, random, 260)) if (random() > 0.45) keep(at, 0.7 + random() * 0.9)
  return [...byColor].flatMap(([fill, d]) => (d.length > 0 ? [{ kind: 'path' as const, d: d.join(''), fill }] : []))
}

/** A spall taken by the joint filler where no slurry will level it: the pocket between the plane and the chipped concrete. */
export function filledSpalls(ground: Ground): Shape[] {
  const layer = ground.joints[0]?.layer
  if (!layer) return []
  return ground.spalls.flatMap(({ from, to }): Shape[] => {
    const floor = ground.contour.filter(([x]) => x >= from && x <= to)
    const [first, last] = [floor[0], floor.at(-1)]
    if (!first || !last) return []
    const outline: Point[] = [[first[0], ground.surface], ...floor, [last[0], ground.surface]]
    return [{ kind: 'path', d: pathOf(outline, true), fill: layer.color ?? ink.unknown, course: layer.id }]
  })
}
