import * as z from 'zod'
import { type EvaluationInput, dryStages, stageSchema } from '../domain/build-up.ts'
import type { Evaluation } from '../domain/evaluation.ts'
import { type Figure, isTypical } from '../domain/figure.ts'
import { type FindingStatus, findingStatusSchema } from '../domain/finding.ts'
import { dimensionOf, valueIn } from '../domain/units.ts'
import { grainSize } from './grain.ts'

/** What the drawing needs to know of one course. Lengths in micrometres. */
export const sectionLayerSchema = z.object({
  id: z.string(),
  stage: stageSchema,
  title: z.string(),
  /** The mix by name, or the method of preparation. */
  detail: z.string(),
  /** `#rrggbb` the mix cures to; null where no mix is chosen. */
  color: z.string().nullable(),
  /** Wet film; null when it cannot be known. */
  thickness: z.number().positive().nullable(),
  /** Rests on a typical value: drawn as unknown, labelled. */
  typical: z.boolean(),
  /** Concrete surface profile asked for. */
  profile: z.number().nullable(),
  /** Sand in the pail; `grain` null where no size is stated. */
  filler: z.object({ grain: z.number().nullable() }).nullable(),
  broadcast: z.object({ grain: z.number().nullable(), toRefusal: z.boolean() }).nullable(),
  /** The worst that a check says of it. */
  status: findingStatusSchema.nullable(),
})
export type SectionLayer = z.infer<typeof sectionLayerSchema>

const severity: FindingStatus[] = ['met', 'unknown', 'caution', 'stop']

/** The middle of a length figure in micrometres; null when it is not known. */
function micrometresOf(figure: Figure | undefined): number | null {
  if (!figure || figure.kind === 'not-stated' || dimensionOf(figure.value.unit) !== 'length') return null
  const { min, max, unit } = figure.value
  const middle = min !== undefined && max !== undefined ? (min + max) / 2 : (min ?? max ?? 0)
  return middle > 0 ? valueIn({ value: middle, unit }, 'µm') : null
}

/** True for courses that lay down a film; preparation and grinding only work the surface, fills and coves stand apart. */
export function laysFilm(stage: SectionLayer['stage']): boolean {
  return !(dryStages as readonly string[]).includes(stage) && stage !== 'fill' && stage !== 'cove'
}

/** The courses of a build-up, bottom up, as the section draws them. */
export function sectionLayers(input: EvaluationInput, evaluation: Evaluation): SectionLayer[] {
  return input.courses.map((course) => {
    const result = evaluation.courses.find((one) => one.courseId === course.id)
    const mix = course.mixId ? input.mixes[course.mixId] : undefined
    const statuses = evaluation.findings.filter((finding) => finding.courseId === course.id).map((finding) => finding.status)
    const grainOf = (productId: string) => grainSize(input.products[productId])
    return {
      id: course.id,
      stage: course.stage,
      title: course.title,
      detail: mix?.name ?? course.preparation?.method ?? '',
      color: mix?.color ?? null,
      thickness: laysFilm(course.stage) ? micrometresOf(result?.wetFilm) : null,
      typical: result ? isTypical(result.wetFilm) : false,
      profile: course.preparation?.profile ?? null,
      filler: course.filler && { grain: grainOf(course.filler.productId) },
      broadcast: course.broadcast && { grain: grainOf(course.broadcast.productId), toRefusal: course.broadcast.toRefusal },
      status: statuses.sort((a, b) => severity.indexOf(b) - severity.indexOf(a))[0] ?? null,
    }
  })
}
