import { stageNames } from '../domain/course.ts'
import { formatNumber } from '../domain/format.ts'
import { valueIn } from '../domain/units.ts'
import type { SectionScale } from './scale.ts'
import { type SectionLayer, laysFilm } from './section-layer.ts'

export type DrawingUnit = 'mil' | 'in' | 'µm' | 'mm'

/** A dimension as it is written: 10.7, 125, 1,000. */
export function lengthText(micrometres: number, unit: DrawingUnit): string {
  return formatNumber(valueIn({ value: micrometres, unit: 'µm' }, unit))
}

/** Courses as a person counts them: from the slab, from 1. */
interface Numbered {
  layer: SectionLayer
  number: number
}

/** One course in words. */
export function layerWords({ layer, number }: Numbered, unit: DrawingUnit): string {
  const parts = [`Course ${number}`, layer.title]
  if (layer.detail) parts.push(layer.detail)
  if (layer.profile !== null) parts.push(`surface profile CSP ${layer.profile}`)
  if (laysFilm(layer.stage))
    parts.push(
      layer.thickness === null
        ? 'thickness not known'
        : `${lengthText(layer.thickness, unit)} ${unit}${layer.typical ? ', typical, verify' : ''}`,
    )
  if (layer.filler) parts.push('filled with sand')
  if (layer.broadcast) parts.push(layer.broadcast.toRefusal ? 'sand broadcast to refusal' : 'sand broadcast')
  if (layer.status === 'stop') parts.push('stopped by a check')
  return parts.join(', ')
}

/** The section for those who do not see it: the courses from the top down to the slab. */
export function alternativeText(layers: readonly SectionLayer[], unit: DrawingUnit): string {
  if (layers.length === 0) return 'Section through the floor: a concrete slab without courses yet.'
  const words = layers.map((layer, index) => layerWords({ layer, number: index + 1 }, unit)).reverse()
  return `Section through the floor, from the top down. ${words.join('. ')}. Concrete slab.`
}

const same = <T>(values: readonly T[]) => new Set(values).size === 1

/** What the drawing is true to and what it is not. */
export function sectionNotes(layers: readonly SectionLayer[], scale: SectionScale, unit: DrawingUnit): string[] {
  const films = layers.filter((layer) => laysFilm(layer.stage))
  const known = films.filter((layer) => layer.thickness !== null)
  const thick = known.filter((layer) => (layer.thickness ?? 0) > scale.filmLimit)
  const whose =
    thick.length > 0 && same(thick.map((layer) => layer.stage))
      ? `${stageNames[thick[0]?.stage ?? 'body'].name.toLowerCase()}’s scale`
      : 'scale of the thicker courses'
  const thin = films.length > thick.length ? lengthText(scale.filmLimit, unit) : ''
  const grains = layers.flatMap((layer) => [layer.filler, layer.broadcast]).filter((sand) => sand !== null)
  const standIns = layers.some((layer) => layer.stage === 'fill' || layer.stage === 'slurry')
  return [
    known.length > 0 && `Dimensions in ${unit}, wet.`,
    known.length > 1 &&
      (scale.filmFactor === 1 ? 'Courses drawn to one scale.' : `Films up to ${thin} ${unit} drawn ${scale.filmFactor} × the ${whose}.`),
    known.length < films.length && 'Dashed: thickness not known.',
    films.some((layer) => layer.typical) && 'Some thicknesses rest on typical values: verify.',
    layers.some((layer) => layer.status === 'stop') && 'Hatched: a check stops this course.',
    grains.some((sand) => sand.grain === null) && 'Grain size not stated: sand drawn as a stand-in.',
    standIns && 'Spalls and joints not surveyed: drawn as a stand-in.',
    layers.length > 0 ? 'Slab and profile not to scale.' : 'Slab not to scale.',
  ].filter((note) => note !== false)
}
