import { type SectionScale } from './scale.ts'
import { broadcastGrains, fillerGrains } from './section-grains.ts'
import type { SectionLayer } from './section-layer.ts'
import { dimensions, leaders, numbers, titles } from './section-marks.ts'
import { type Ground, type PlacedLayer, type Placing, place } from './section-place.ts'
import { filledSpalls, slabShapes } from './section-slab.ts'
import { type DrawingUnit, alternativeText, layerWords, sectionNotes } from './section-words.ts'
import { type Point, type Shape, ink, pathOf, svgOf, wrap } from './shapes.ts'

export interface SectionOptions {
  width: number
  height: number
  /** Unit of the dimension lines. */
  unit: DrawingUnit
  /** Small, for lists: no dimensions, leaders or notes. */
  compact?: boolean
  /** Heights of the rows that the leaders run to, by course. */
  anchors?: Readonly<Record<string, number>>
  /** Titles at the ends of the leaders, and the notes beneath: for a figure that stands by itself. */
  standalone?: boolean
}

/** A course as the figure shows it. */
interface DrawnLayer {
  id: string
  number: number
  /** In words, for those who do not see it. */
  says: string
  /** The outline to point at and to light. */
  outline: string
  top: number
  bottom: number
  /** Micrometres; null when not known. */
  thickness: number | null
}

export interface SectionModel {
  width: number
  height: number
  shapes: Shape[]
  layers: DrawnLayer[]
  notes: string[]
  alternative: string
  scale: SectionScale
}

const note = { size: 11.5, line: 15 }
/** Room for dimensions left of the floor and leaders right of it. */
const margins = { left: 92, right: 64 }

/** The floor cut through, as geometry. The same courses give the same figure, wherever it is drawn. */
export function sectionOf(layers: readonly SectionLayer[], options: SectionOptions): SectionModel {
  const { width, height, unit, compact = false, standalone = false, anchors } = options
  const floor = standalone ? Math.min(width * 0.58, 400) : width
  const noteWidth = width - 16
  const frameOf = (noteRows: number) => ({
    left: compact ? 0 : margins.left,
    right: compact ? width : floor - margins.right + (anchors || standalone ? 0 : 10),
    top: compact ? 4 : 30,
    bottom: height - (compact ? 0 : 16 + noteRows * note.line),
    compact,
    anchors: anchors ? Object.values(anchors) : [],
  })
  const draft = place(layers, frameOf(standalone ? 4 : 0))
  const notes = compact ? [] : sectionNotes(layers, draft.scale, unit)
  const lines = standalone ? wrap(notes.join(' '), { width: noteWidth, size: note.size }) : []
  const placing = standalone ? place(layers, frameOf(lines.length)) : draft
  const shapes = [
    ...courseShapes(placing, compact),
    ...(compact ? [] : dimensions(placing, unit)),
    ...(compact ? [] : pointers(placing, options, floor)),
    ...lines.map((text, index): Shape => ({
      kind: 'text',
      x: 8,
      y: height - 6 - (lines.length - 1 - index) * note.line,
      text,
      size: note.size,
      fill: ink.pencil,
    })),
  ]
  return {
    width,
    height,
    shapes,
    notes,
    scale: placing.scale,
    layers: placing.placed.map((one) => drawn(one, placing, unit)),
    alternative: alternativeText(layers, unit),
  }
}

/** A height that shows so many courses well in a standalone figure. */
export function standaloneHeight(courses: number): number {
  return Math.max(360, 150 + courses * 34)
}

/** The figure as SVG text, for documents. */
export function sectionSvg(model: SectionModel, options: { fontFamily?: string } = {}): string {
  return svgOf(model, options)
}

function pointers(placing: Placing, { unit, anchors, standalone, width, height }: SectionOptions, floor: number): Shape[] {
  if (standalone) {
    const { shapes, y } = titles(placing, { x: floor, from: 16, to: Math.max(height - 90, placing.ground.end), unit })
    return [...leaders(placing, { x: floor, y }), ...shapes]
  }
  if (anchors) return leaders(placing, { x: width, y: anchors })
  const { shapes, y } = numbers(placing)
  return [...leaders(placing, { x: placing.ground.right + 32, y }), ...shapes]
}

/** Slab first, then the courses as they are laid; grains that stand out of a film are covered by the next. */
function courseShapes(placing: Placing, compact: boolean): Shape[] {
  const { placed, ground, scale } = placing
  const levelled = placed.some(({ layer }) => layer.stage === 'slurry')
  const shapes = [...slabShapes(ground, compact), ...(levelled ? [] : filledSpalls(ground))]
  let standing: Shape[] = []
  for (const one of placed) {
    if (one.kind === 'cove') shapes.push(...coveShapes(one))
    if (one.kind !== 'film') continue
    shapes.push(body(one), ...standing, ...fillerGrains(one, scale))
    standing = broadcastGrains(one, scale)
    shapes.push(...edges(one, compact))
  }
  return [...shapes, ...standing, ...surfaceLines(placing, compact), ...stopped(placing)]
}

const outlineOf = ({ upper, lower }: PlacedLayer): Point[] => [...upper, ...[...lower].reverse()]

function body(one: PlacedLayer): Shape {
  const unknown = one.layer.thickness === null
  return {
    kind: 'path',
    d: pathOf(outlineOf(one), true),
    fill: one.layer.color ?? ink.unknown,
    course: one.layer.id,
    ...(unknown ? { opacity: 0.45 } : {}),
  }
}

function edges(one: PlacedLayer, compact: boolean): Shape[] {
  const width = compact ? 0.5 : 0.8
  if (one.layer.thickness !== null)
    return [{ kind: 'path', d: pathOf(one.upper), stroke: ink.ink, strokeWidth: width, course: one.layer.id }]
  return [
    {
      kind: 'path',
      d: pathOf(outlineOf(one), true),
      stroke: ink.pencil,
      strokeWidth: width + 0.2,
      dash: compact ? '2 2' : '5 3',
      course: one.layer.id,
    },
  ]
}

/** The prepared surface as the heaviest line, a ground one as a line with strokes across it. */
function surfaceLines({ placed, ground }: Placing, compact: boolean): Shape[] {
  const ground1: Shape = { kind: 'path', d: pathOf(ground.contour), stroke: ink.ink, strokeWidth: compact ? 0.6 : 1.2 }
  if (compact) return [ground1]
  const worked = placed.filter((one) => one.kind === 'surface' && one.bottom < ground.surface)
  return [
    ground1,
    ...worked.map(({ upper, bottom, layer }): Shape => {
      const marks = upper.filter((_, index) => index % 3 === 1).map(([x]) => `M${Math.round(x)} ${Math.round(bottom * 10) / 10}l-3.5 5`)
      return { kind: 'path', d: pathOf(upper) + marks.join(''), stroke: ink.ink, strokeWidth: 0.9, course: layer.id }
    }),
  ]
}

/** Strokes at 45° over every stopped course: over a film, under a worked surface, across a joint. */
function stopped(placing: Placing): Shape[] {
  return placing.placed.filter(({ layer }) => layer.status === 'stop').flatMap((one) => hatch(one, placing.ground))
}

function hatch(one: PlacedLayer, ground: Ground): Shape[] {
  const line = { stroke: ink.stop, strokeWidth: 1.4, course: one.layer.id }
  const whole = { left: ground.left, right: ground.right }
  if (one.kind === 'film') {
    return [
      { kind: 'path', d: strokes({ ...whole, top: one.top, bottom: one.bottom }), ...line },
      { kind: 'path', d: pathOf(outlineOf(one), true), ...line },
    ]
  }
  if (one.kind === 'surface') {
    const under = one.upper.map(([x, y]) => `M${Math.round(x)} ${Math.round(y * 10) / 10 + 7}l6 -6`)
    return [
      { kind: 'path', d: under.filter((_, index) => index % 2 === 0).join(''), ...line },
      { kind: 'path', d: pathOf(one.upper), ...line },
    ]
  }
  const joint = ground.joints.find(({ layer }) => layer.id === one.layer.id)
  if (!joint) return []
  const { x, width, depth } = joint
  return [
    {
      kind: 'path',
      d: strokes({ left: x - width / 2 - 3, right: x + width / 2 + 3, top: ground.surface, bottom: ground.surface + depth }),
      ...line,
    },
  ]
}

/** Parallel strokes rising to the right, cut to a box. */
function strokes({ left, right, top, bottom }: { left: number; right: number; top: number; bottom: number }): string {
  const tall = bottom - top
  const lines: string[] = []
  for (let x = left - tall; x < right; x += 7) {
    const cutLow = Math.max(0, left - x)
    const cutHigh = Math.max(0, x + tall - right)
    if (tall - cutLow - cutHigh > 0.5)
      lines.push(
        pathOf([
          [x + cutLow, bottom - cutLow],
          [x + tall - cutHigh, top + cutHigh],
        ]),
      )
  }
  return lines.join('')
}

/** A fillet against a stub of wall at the left end of the floor. */
function coveShapes({ layer, upper, top }: PlacedLayer): Shape[] {
  const x = upper[0]?.[0] ?? 0
  const wall = 7
  const high = Math.min(24, top - 4)
  return [
    { kind: 'path', d: `M${x - wall} ${top}V${top - high - 6}H${x}V${top}Z`, fill: ink.slab, stroke: ink.ink, strokeWidth: 0.7 },
    {
      kind: 'path',
      d: `M${x} ${top}V${top - high}Q${x} ${top - 2} ${x + high * 0.9} ${top}Z`,
      fill: layer.color ?? ink.unknown,
      stroke: ink.ink,
      strokeWidth: 0.8,
      course: layer.id,
    },
  ]
}

function drawn(one: PlacedLayer, { ground }: Placing, unit: DrawingUnit): DrawnLayer {
  const { layer, number, top, bottom } = one
  const says = layerWords({ layer, number }, unit)
  const base = { id: layer.id, number, says, top, bottom, thickness: layer.thickness }
  if (one.kind === 'film') return { ...base, outline: pathOf(outlineOf(one), true) }
  if (one.kind === 'fill') {
    const joint = ground.joints.find((each) => each.layer.id === layer.id)
    const { x, depth } = joint ?? { x: ground.left, depth: 0 }
    return {
      ...base,
      outline: pathOf(
        [
          [x - 6, ground.surface],
          [x + 6, ground.surface],
          [x + 6, ground.surface + depth],
          [x - 6, ground.surface + depth],
        ],
        true,
      ),
    }
  }
  if (one.kind === 'cove')
    return {
      ...base,
      outline: pathOf(
        [
          [ground.left, top - 24],
          [ground.left + 22, top],
          [ground.left, top],
        ],
        true,
      ),
    }
  const lower = one.upper.map(([x, y]): Point => [x, y + 7])
  return { ...base, outline: pathOf([...one.upper, ...lower.reverse()], true) }
}
