import * as z from 'zod'
import { figureSchema } from './figure.ts'
import { findingSchema } from './finding.ts'
import { componentPartSchema } from './mix.ts'

/** The hazards of a mix or phase: the union of its components', as their safety sheets state them. */
export const hazardSummarySchema = z.object({
  signalWord: z.enum(['Danger', 'Warning']).nullable(),
  /** GHS pictogram codes after precedence, `GHS05`. */
  pictograms: z.array(z.string()),
  statements: z.array(z.object({ code: z.string(), text: z.string(), from: z.array(z.string()) })),
  precautions: z.array(z.object({ code: z.string(), text: z.string(), from: z.array(z.string()) })),
  gloves: z.array(z.object({ text: z.string(), from: z.string() })),
  eyes: z.array(z.object({ text: z.string(), from: z.string() })),
  breathing: z.array(z.object({ text: z.string(), from: z.string() })),
  emergencyPhones: z.array(z.object({ text: z.string(), from: z.string() })),
  /** Components with no hazard statements on any loaded safety sheet, by name. Their hazards are not known, not absent. */
  notStated: z.array(z.string()),
})
export type HazardSummary = z.infer<typeof hazardSummarySchema>

/** The mix of one course by part, per 1 unit of mixed liquid: by volume and by weight, with how each is known. */
export const proportionSchema = z.object({
  part: componentPartSchema,
  productId: z.string(),
  name: z.string(),
  /** Share of the mixed liquid's volume, 0 to 1; null when it cannot be known. */
  volumeShare: z.number().nullable(),
  /** Share of the mixed liquid's mass, 0 to 1; null when it cannot be known. */
  massShare: z.number().nullable(),
  density: figureSchema,
})
export type Proportion = z.infer<typeof proportionSchema>

export const courseResultSchema = z.object({
  courseId: z.string(),
  wetFilm: figureSchema,
  dryFilm: figureSchema,
  spreadRate: figureSchema,
  /** Mixed liquid resin per area, in the unit system of the course (gal/ft² is shown per 1,000 ft²: `gal`). */
  resinPerArea: figureSchema,
  /** Filler and broadcast aggregate per area. */
  aggregatePerArea: figureSchema.nullable(),
  proportions: z.array(proportionSchema),
  ratioByVolume: z.string().nullable(),
  ratioByWeight: z.string().nullable(),
  potLife: figureSchema,
  workingTime: figureSchema,
  window: figureSchema,
  footTraffic: figureSchema,
  vehicleTraffic: figureSchema,
  fullCure: figureSchema,
  voc: figureSchema,
  hazards: hazardSummarySchema.nullable(),
})
export type CourseResult = z.infer<typeof courseResultSchema>

/** Hours count from the start of the first course. */
export const timelineEntrySchema = z.object({
  courseId: z.string(),
  start: z.number().nullable(),
  workingUntil: z.number().nullable(),
  windowOpens: z.number().nullable(),
  windowCloses: z.number().nullable(),
  foot: z.number().nullable(),
  vehicles: z.number().nullable(),
  fullCure: z.number().nullable(),
})
export type TimelineEntry = z.infer<typeof timelineEntrySchema>

export const evaluationSchema = z.object({
  courses: z.array(courseResultSchema),
  totals: z.object({
    thickness: figureSchema,
    vocWorst: figureSchema,
    hoursToFoot: figureSchema,
    hoursToVehicles: figureSchema,
    dewPoint: figureSchema,
  }),
  timeline: z.array(timelineEntrySchema),
  findings: z.array(findingSchema),
  hazards: hazardSummarySchema,
})
export type Evaluation = z.infer<typeof evaluationSchema>
