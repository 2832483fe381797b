import * as z from 'zod'
import { figureSchema, missingSchema } from './figure.ts'

export const findingStatuses = ['stop', 'caution', 'unknown', 'met'] as const
export const findingStatusSchema = z.enum(findingStatuses)
export type FindingStatus = z.infer<typeof findingStatusSchema>

/** What one check says of one course (or of the whole floor when `courseId` is null). */
export const findingSchema = z.object({
  checkId: z.string(),
  title: z.string(),
  status: findingStatusSchema,
  courseId: z.string().nullable(),
  /** One sentence with the numbers in it. */
  says: z.string(),
  /** What to do about it; empty when met. */
  todo: z.string(),
  /** The figures compared, each with its kind. */
  figures: z.array(z.object({ label: z.string(), figure: figureSchema })),
  /** What would settle an unknown. */
  missing: z.array(missingSchema),
  /** The standard or rule compared with. */
  source: z.string(),
})
export type Finding = z.infer<typeof findingSchema>
