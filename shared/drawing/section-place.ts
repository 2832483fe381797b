import { type SectionScale, drawnHeight, fitScale } from './scale.ts'
import { seeded } from './scatter.ts'
import { type SectionLayer, laysFilm } from './section-layer.ts'
import type { Point } from './shapes.ts'

/** Where a course lies in the drawing. Deviations count downward from its nominal plane. */
export interface PlacedLayer {
  layer: SectionLayer
  /** Counted from the slab, from 1. */
  number: number
  kind: 'film' | 'surface' | 'fill' | 'cove'
  top: number
  bottom: number
  upper: readonly Point[]
  lower: readonly Point[]
}

export interface Ground {
  left: number
  right: number
  /** Nominal plane of the prepared slab. */
  surface: number
  /** Where the slab is broken off. */
  end: number
  contour: readonly Point[]
  spalls: readonly Spall[]
  joints: readonly { x: number; width: number; depth: number; layer: SectionLayer }[]
}
interface Spall {
  from: number
  to: number
  depth: number
}

export interface Placing {
  placed: PlacedLayer[]
  ground: Ground
  scale: SectionScale
  /** Top of the highest course. */
  top: number
}

interface Frame {
  left: number
  right: number
  /** Room from top to bottom of the drawing proper. */
  top: number
  bottom: number
  compact: boolean
  /** Rows that leaders run to, if any. */
  anchors: readonly number[]
}

/** How much of the unevenness beneath shows on top of a course: a slurry levels, a coat follows. */
const follows: Partial<Record<SectionLayer['stage'], number>> = { slurry: 0, body: 0.05, broadcast: 0.35, prime: 0.8, seal: 0.5, top: 0.3 }
/** Height of a course whose thickness is not known. */
const unknownHeight = { full: 22, compact: 6 }

/** Pixels that the thickest course may take: a lone thin coat is not drawn like a screed. Full height from 125 mil. */
function tallest(films: readonly SectionLayer[], most: number): number {
  const thickest = Math.max(0, ...films.map((layer) => layer.thickness ?? 0))
  return most * Math.min(1, 0.2 + (0.8 * thickest) / 3175)
}

/** The middle of the rows as if none were open, so that the floor stays where it is when one opens. */
function middleOfRows(anchors: readonly number[]): number {
  const rising = [...anchors].sort((a, b) => a - b)
  let at = rising[0] ?? 0
  const closed = rising.map((y, index) => (at += index === 0 ? 0 : Math.min(y - (rising[index - 1] ?? y), 96)))
  return closed.reduce((sum, one) => sum + one, 0) / closed.length
}

const within = (value: number, low: number, high: number) => Math.min(Math.max(value, low), Math.max(low, high))

/** Lays the courses out on the slab: scale, planes and contours. */
export function place(layers: readonly SectionLayer[], frame: Frame): Placing {
  const { compact } = frame
  // more room than the courses need does not change their scale: the figure does not jump when a row opens
  const room = Math.min(frame.bottom - frame.top, compact ? Infinity : 190 + layers.length * 64)
  const films = layers.filter((layer) => laysFilm(layer.stage))
  const unknown = films.filter((layer) => layer.thickness === null).length * unknownHeight[compact ? 'compact' : 'full']
  const share = room * (compact ? 0.58 : 0.5)
  const scale = fitScale(
    films.flatMap((layer) => layer.thickness ?? []),
    { height: Math.max(share - unknown, 24), least: compact ? 4 : 17, most: tallest(films, compact ? room * 0.4 : 118) },
  )
  const heightOf = (layer: SectionLayer) =>
    layer.thickness === null ? unknownHeight[compact ? 'compact' : 'full'] : drawnHeight(layer.thickness, scale)
  const stack = films.reduce((sum, layer) => sum + heightOf(layer), 0)
  const slab = compact ? room - stack : within(room * 0.4, 96, 210)
  const free = frame.bottom - frame.top - stack - slab
  const top =
    frame.anchors.length === 0
      ? frame.top + Math.max(0, free) / 2
      : within(middleOfRows(frame.anchors) - stack * 0.6, frame.top, frame.top + free)
  const ground = groundOf(layers, { ...frame, surface: top + stack, end: Math.min(frame.bottom, top + stack + slab) })
  return { placed: stackUp(layers, ground, heightOf), ground, scale, top }
}

function stackUp(layers: readonly SectionLayer[], ground: Ground, heightOf: (layer: SectionLayer) => number): PlacedLayer[] {
  let plane = ground.surface
  let contour: readonly Point[] = ground.contour.map(([x, y]): Point => [x, y - ground.surface])
  return layers.map((layer, index) => {
    const lower = contour.map(([x, deviation]): Point => [x, plane + deviation])
    const base = { layer, number: index + 1, bottom: plane, lower }
    if (layer.stage === 'fill' || layer.stage === 'cove') return { ...base, kind: layer.stage, top: plane, upper: lower }
    if (!laysFilm(layer.stage)) {
      if (layer.stage === 'grind' && plane !== ground.surface) contour = contour.map(([x]): Point => [x, 0])
      return { ...base, kind: 'surface', top: plane, upper: contour.map(([x, deviation]): Point => [x, plane + deviation]) }
    }
    plane -= heightOf(layer)
    contour = contour.map(([x, deviation]): Point => [x, deviation * (follows[layer.stage] ?? 0.5)])
    return { ...base, kind: 'film', top: plane, upper: contour.map(([x, deviation]): Point => [x, plane + deviation]) }
  })
}

/** The slab with its profile; joints and spalls stand in for a survey where a fill or a slurry will take them. */
function groundOf(
  layers: readonly SectionLayer[],
  at: { left: number; right: number; surface: number; end: number; compact: boolean },
): Ground {
  const { left, right, surface, end, compact } = at
  const fills = layers.filter((layer) => layer.stage === 'fill')
  const levels = layers.some((layer) => layer.stage === 'slurry')
  const wide = right - left
  const deep = (end - surface) * (compact ? 0.3 : 0.24)
  const spalls: Spall[] =
    fills.length > 0 || levels
      ? [
          { from: left + wide * 0.07, to: left + wide * 0.25, depth: deep },
          { from: left + wide * 0.44, to: left + wide * 0.55, depth: deep * 0.55 },
          { from: left + wide * 0.86, to: right + wide * 0.06, depth: deep * 0.62 },
        ]
      : []
  const joints = fills.map((layer, index) => ({
    x: left + wide * (0.68 - index * 0.34),
    width: compact ? 2 : 5,
    depth: (end - surface) * 0.58,
    layer,
  }))
  const asked = layers.find((layer) => layer.stage === 'prep' && layer.profile !== null)?.profile ?? 0
  const roughness = (asked === 0 ? 0.6 : 0.5 + asked * 0.5) * (compact ? 0.35 : 1)
  return { left, right, surface, end, spalls, joints, contour: contourOf({ left, right, surface, roughness, spalls }) }
}

function contourOf({
  left,
  right,
  surface,
  roughness,
  spalls,
}: {
  left: number
  right: number
  surface: number
  roughness: number
  spalls: readonly Spall[]
}): Point[] {
  const random = seeded('prepared slab')
  const steps = Math.max(16, Math.round((right - left) / 4.5))
  return Array.from({ length: steps + 1 }, (_, index): Point => {
    const x = left + ((right - left) * index) / steps
    const spall = spalls.find(({ from, to }) => x > from && x < to)
    const bowl = spall ? spall.depth * Math.sin((Math.PI * (x - spall.from)) / (spall.to - spall.from)) ** 0.55 : 0
    const chipped = spall ? bowl * (0.82 + random() * 0.3) : 0
    return [x, surface + chipped + (random() - 0.4) * roughness * 1.5]
  })
}

/** Height of a contour at a place between its points. */
export function heightAt(contour: readonly Point[], x: number): number {
  const after = contour.findIndex(([at]) => at >= x)
  const [x1, y1] = contour[after] ?? contour.at(-1) ?? [x, 0]
  const [x0, y0] = contour[Math.max(0, after - 1)] ?? [x1, y1]
  return x1 === x0 ? y1 : y0 + ((y1 - y0) * (x - x0)) / (x1 - x0)
}
