import type { Placing, PlacedLayer } from './section-place.ts'
import { type DrawingUnit, lengthText } from './section-words.ts'
import { type Point, type Shape, ink, pathOf, spread, textWidth } from './shapes.ts'

const size = 12
const gap = 13.5

/** The oblique stroke that ends a dimension. */
const tick = (x: number, y: number) => `M${x - 3.5} ${y + 3.5}L${x + 3.5} ${y - 3.5}`
const fixed = (value: number) => Math.round(value * 10) / 10

/** Dimension lines left of the floor: each film by its true figure, and the whole. */
export function dimensions({ placed, top, ground }: Placing, unit: DrawingUnit): Shape[] {
  const films = placed.filter((one) => one.kind === 'film')
  if (films.length === 0) return []
  const chain = ground.left - 13
  const edges = [...films.map((film) => film.bottom), top].map(fixed)
  const falling = [...films].reverse()
  const labels = spread(
    falling.map((film) => (film.top + film.bottom) / 2),
    { gap, from: 8, to: ground.end },
  )
  return [
    { kind: 'path', d: edges.map((y) => `M${ground.left - 3} ${y}H${chain - 5}`).join(''), stroke: ink.pencil, strokeWidth: 0.5 },
    { kind: 'path', d: `M${chain} ${fixed(top)}V${fixed(ground.surface)}`, stroke: ink.ink, strokeWidth: 0.7 },
    { kind: 'path', d: edges.map((y) => tick(chain, y)).join(''), stroke: ink.ink, strokeWidth: 1.1 },
    ...falling.flatMap((film, index) => dimensionText(film, { chain, y: labels[index] ?? film.top, unit })),
    ...overall({ placed, top, ground } as Placing, unit),
  ]
}

function dimensionText({ layer, top, bottom }: PlacedLayer, { chain, y, unit }: { chain: number; y: number; unit: DrawingUnit }): Shape[] {
  const middle = (top + bottom) / 2
  const text = layer.thickness === null ? '?' : `${lengthText(layer.thickness, unit)}${layer.typical ? '*' : ''}`
  const moved = Math.abs(middle - y) > 3
  const lead: Shape[] = moved
    ? [
        {
          kind: 'path',
          d: pathOf([
            [chain - 1, middle],
            [chain - 7, y],
          ]),
          stroke: ink.pencil,
          strokeWidth: 0.5,
        },
      ]
    : []
  return [...lead, { kind: 'text', x: chain - 9, y: y + 4, text, size, fill: ink.ink, anchor: 'end', course: layer.id }]
}

/** The whole build, on a line of its own, written along it. */
function overall({ placed, top, ground }: Placing, unit: DrawingUnit): Shape[] {
  const films = placed.filter((one) => one.kind === 'film')
  if (films.length < 2) return []
  const widest = Math.max(...films.map(({ layer }) => (layer.thickness === null ? 8 : textWidth(lengthText(layer.thickness, unit), size))))
  const x = fixed(ground.left - 13 - 9 - widest - 9)
  const known = films.every(({ layer }) => layer.thickness !== null)
  const text = known
    ? `${lengthText(
        films.reduce((sum, { layer }) => sum + (layer.thickness ?? 0), 0),
        unit,
      )} ${unit}`
    : 'not known'
  const middle = (top + ground.surface) / 2
  const tall = ground.surface - top
  return [
    {
      kind: 'path',
      d: `M${x} ${fixed(top)}V${fixed(ground.surface)}M${x + 4} ${fixed(top)}H${x - 4}M${x + 4} ${fixed(ground.surface)}H${x - 4}`,
      stroke: ink.ink,
      strokeWidth: 0.7,
      ...(known ? {} : { dash: '3 3' }),
    },
    { kind: 'path', d: `${tick(x, fixed(top))}${tick(x, fixed(ground.surface))}`, stroke: ink.ink, strokeWidth: 1.1 },
    tall > textWidth(text, size)
      ? { kind: 'text', x: x - 5, y: middle, text, size, fill: ink.ink, anchor: 'middle', rotate: -90 }
      : { kind: 'text', x, y: fixed(top) - 7, text, size, fill: ink.ink, anchor: 'middle' },
  ]
}

/** Where each course is pointed at, from the top down: leaders never cross. */
function origins({ placed, ground }: Placing): { one: PlacedLayer; from: Point; exit: number }[] {
  const { right, surface, contour } = ground
  const edge = contour.at(-1)?.[1] ?? surface
  let below = Math.max(edge, surface + 9)
  const list = placed.map((one) => {
    if (one.kind === 'film') return { one, from: [right - 8, (one.top + one.bottom) / 2] as Point, exit: (one.top + one.bottom) / 2 }
    if (one.kind === 'fill') {
      const joint = ground.joints.find(({ layer }) => layer.id === one.layer.id)
      const y = surface + 5
      return { one, from: [joint?.x ?? right, y] as Point, exit: y }
    }
    if (one.kind === 'cove') return { one, from: [ground.left + 12, one.top - 12] as Point, exit: one.top - 12 }
    if (one.bottom < surface) return { one, from: [right, one.bottom] as Point, exit: one.bottom }
    return { one, from: [right, edge] as Point, exit: (below += 7) - 7 }
  })
  return list.reverse()
}

interface Ends {
  /** Where leaders end, to the right. */
  x: number
  /** By course; a course without one has no leader. */
  y: Readonly<Record<string, number>>
}

/** Leaders from each course to its row. */
export function leaders(placing: Placing, { x, y }: Ends): Shape[] {
  const elbow = placing.ground.right + 12
  return origins(placing).flatMap(({ one, from, exit }): Shape[] => {
    const end = y[one.layer.id]
    if (end === undefined) return []
    const line: Point[] = [from, [elbow, exit], [Math.max(x - 14, elbow), end], [x, end]]
    return [
      { kind: 'path', d: pathOf(line), stroke: ink.pencil, strokeWidth: 0.7, course: one.layer.id, role: 'leader' },
      {
        kind: 'path',
        d: `M${fixed(from[0]) - 1.6} ${fixed(from[1])}a1.6 1.6 0 1 0 3.2 0a1.6 1.6 0 1 0 -3.2 0Z`,
        fill: ink.ink,
        course: one.layer.id,
      },
    ]
  })
}

/** Numbers of the courses at short leaders, where no rows stand beside the figure. */
export function numbers(placing: Placing): { shapes: Shape[]; y: Record<string, number> } {
  const list = origins(placing)
  const places = spread(
    list.map(({ exit }) => exit),
    { gap: 15, from: 8, to: placing.ground.end + 20 },
  )
  const y = Object.fromEntries(list.map(({ one }, index) => [one.layer.id, places[index] ?? 0]))
  const shapes = list.map(({ one: { layer, number } }): Shape => ({
    kind: 'text',
    x: placing.ground.right + 36,
    y: (y[layer.id] ?? 0) + 4,
    text: String(number),
    size,
    fill: ink.ink,
    course: layer.id,
  }))
  return { shapes, y }
}

/** Titles at the ends of the leaders, for a figure that stands by itself. Returns the places they took. */
export function titles(
  placing: Placing,
  { x, from, to, unit }: { x: number; from: number; to: number; unit: DrawingUnit },
): { shapes: Shape[]; y: Record<string, number> } {
  const list = origins(placing)
  const places = spread(
    list.map(({ exit }) => exit),
    { gap: Math.min(31, (to - from) / Math.max(1, list.length)), from, to },
  )
  const y = Object.fromEntries(list.map(({ one }, index) => [one.layer.id, places[index] ?? 0]))
  const shapes = list.flatMap(({ one: { layer, number } }): Shape[] => {
    const at = y[layer.id] ?? 0
    const second = [
      layer.detail,
      layer.profile === null ? '' : `CSP ${layer.profile}`,
      layer.thickness === null ? '' : `${lengthText(layer.thickness, unit)} ${unit}`,
    ]
    return [
      { kind: 'text', x: x + 6, y: at + 1, text: `${number}  ${layer.title}`, size: 13, fill: ink.ink, weight: 600, course: layer.id },
      { kind: 'text', x: x + 19, y: at + 14, text: second.filter(Boolean).join(', '), size: 11.5, fill: ink.pencil, course: layer.id },
    ]
  })
  return { shapes, y }
}
