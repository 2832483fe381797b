import * as z from 'zod'
import { factSchema } from './fact.ts'
import { chemistrySchema, productFactsSchema, recordStatusSchema } from './product.ts'
import { sheetSummarySchema } from './sheet.ts'

export const componentPartSchema = z.enum(['A', 'B', 'C'])
export type ComponentPart = z.infer<typeof componentPartSchema>

/** What goes on the floor: one product alone, or parts A, B (C) at the ratio that its fact `mixRatio` gives. */
export const mixFactsSchema = z.object({
  id: z.string(),
  name: z.string(),
  maker: z.string(),
  chemistry: chemistrySchema,
  /** Colour it cures to, `#rrggbb`, for the drawing. */
  color: z.string(),
  status: recordStatusSchema,
  parts: z
    .array(z.object({ part: componentPartSchema, product: productFactsSchema }))
    .min(1)
    .max(3),
  facts: z.array(factSchema),
  sheets: z.array(sheetSummarySchema),
})
export type MixFacts = z.infer<typeof mixFactsSchema>
