import * as z from 'zod'
import { factSchema } from './fact.ts'
import { sheetSummarySchema } from './sheet.ts'

export const productKinds = ['resin', 'hardener', 'primer', 'aggregate', 'filler', 'additive'] as const
export const productKindSchema = z.enum(productKinds)
export type ProductKind = z.infer<typeof productKindSchema>

export const chemistries = [
  'epoxy',
  'polyurethane',
  'polyurea',
  'polyaspartic',
  'urethane cement',
  'methacrylate',
  'silica',
  'other mineral',
  'other',
] as const
export const chemistrySchema = z.enum(chemistries)

export const recordStatusSchema = z.enum(['active', 'withdrawn'])

/** One thing in a pail or bag, with what is known of it. */
export const productFactsSchema = z.object({
  id: z.string(),
  name: z.string(),
  maker: z.string(),
  kind: productKindSchema,
  chemistry: chemistrySchema,
  status: recordStatusSchema,
  facts: z.array(factSchema),
  sheets: z.array(sheetSummarySchema),
})
export type ProductFacts = z.infer<typeof productFactsSchema>
