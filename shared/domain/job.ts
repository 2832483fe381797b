import * as z from 'zod'
import { conditionsSchema } from './build-up.ts'
import { quantitySchema } from './property.ts'

export const jobStatusSchema = z.enum(['open', 'closed'])

/** A part of the floor that is poured in one go. */
export const baySchema = z.strictObject({
  id: z.string().min(1).max(40),
  name: z.string().trim().min(1).max(80),
  area: z.strictObject({ value: z.number().positive().max(10_000_000), unit: z.enum(['ft²', 'm²']) }),
  joints: z.array(z.strictObject({ length: quantitySchema, width: quantitySchema, depth: quantitySchema })).max(200),
  spalls: z.strictObject({ area: quantitySchema, meanDepth: quantitySchema }).nullable(),
})
export type Bay = z.infer<typeof baySchema>

export const jobConditionsSchema = conditionsSchema.extend({
  /** Mean texture depth of the prepared slab (sand patch); null: not measured. */
  texture: quantitySchema.nullable(),
})
export type JobConditions = z.infer<typeof jobConditionsSchema>

/** How loss is meant: a fraction lost (divide by 1 − loss) is not an addition (multiply by 1 + loss). */
export const lossSchema = z.strictObject({ percent: z.number().min(0).max(60), convention: z.enum(['lost', 'added']) })
export type Loss = z.infer<typeof lossSchema>
