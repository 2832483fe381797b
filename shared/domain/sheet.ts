import * as z from 'zod'

export const sheetKinds = ['data', 'safety'] as const
export const sheetKindSchema = z.enum(sheetKinds)
export type SheetKind = z.infer<typeof sheetKindSchema>

/** A sheet as a check sees it: which revision is in force and how old it is. */
export const sheetSummarySchema = z.object({
  id: z.string(),
  kind: sheetKindSchema,
  title: z.string(),
  revisionId: z.string(),
  /** ISO date as far as stated (`2024-03`), or null when the revision states none. */
  revisionDate: z.string().nullable(),
  pages: z.int(),
  /** True when a newer revision of the sheet is loaded. */
  superseded: z.boolean(),
})
export type SheetSummary = z.infer<typeof sheetSummarySchema>
