import * as z from 'zod'
import { sectionLayerSchema } from '../../drawing/section-layer.ts'
import { citationSchema } from '../fact.ts'

/** How a figure of the document is known. `measured` is what the job itself says; `standard` is a number of a published standard or regulation. */
const knownSchema = z.enum(['stated', 'entered', 'computed', 'chosen', 'measured', 'typical', 'standard', 'not-stated'])
export type Known = z.infer<typeof knownSchema>

/**
 * A piece of a line. `text` is the document's own words and holds no number; `quoted` is taken as it stands from the records: names, reasons,
 * what a check says, words of a sheet; `figure` is a number or value with how it is known.
 */
export const runSchema = z.discriminatedUnion('kind', [
  z.object({ kind: z.literal('text'), text: z.string() }),
  z.object({ kind: z.literal('quoted'), text: z.string() }),
  z.object({
    kind: z.literal('figure'),
    text: z.string(),
    known: knownSchema,
    /** Tags of the tables at the end: S a sheet's page, E an entered value, T a typical value, W a working. */
    tags: z.array(z.string()),
    /** The place on the sheet, for what is stated. */
    citation: citationSchema.nullable(),
  }),
])
export type Run = z.infer<typeof runSchema>
export type Runs = Run[]

export interface Item {
  runs: Run[]
  items: Item[]
}
export const itemSchema: z.ZodType<Item> = z.object({
  runs: z.array(runSchema),
  get items() {
    return z.array(itemSchema)
  },
})

export const articleSchema = z.object({ id: z.string(), title: z.string(), items: z.array(itemSchema) })
export type Article = z.infer<typeof articleSchema>

export const partSchema = z.object({ number: z.int(), title: z.string(), articles: z.array(articleSchema) })
export type SpecPart = z.infer<typeof partSchema>

export const tableSchema = z.object({
  id: z.string(),
  title: z.string(),
  /** Widths in shares of the page. */
  columns: z.array(z.object({ label: z.string(), width: z.number().positive() })),
  rows: z.array(z.array(z.array(runSchema))),
  /** Said beneath the table; empty for nothing. */
  note: z.string(),
})
export type SpecTable = z.infer<typeof tableSchema>

export const sourceSchema = z.object({
  tag: z.string(),
  title: z.string(),
  /** ISO date as far as the sheet states one. */
  revisionDate: z.string().nullable(),
  revisionId: z.string(),
  page: z.int(),
  /** The sheet's own words that were read there. */
  quotes: z.array(z.string()),
})
export type SpecSource = z.infer<typeof sourceSchema>

export const headerSchema = z.object({
  firm: z.object({ name: z.string(), address: z.string(), phone: z.string() }),
  project: z.string(),
  jobNumber: z.int(),
  client: z.string(),
  site: z.string(),
  sectionNumber: z.string(),
  sectionTitle: z.string(),
  /** ISO day. */
  date: z.string(),
  buildUp: z.object({
    number: z.int(),
    name: z.string(),
    version: z.int(),
    status: z.string(),
    releasedAt: z.string().nullable(),
    releasedByName: z.string().nullable(),
  }),
  issue: z.object({ number: z.int(), by: z.string() }).nullable(),
})
export type SpecHeader = z.infer<typeof headerSchema>

/** The whole specification: one tree that the page, the DOCX and the PDF are drawn from. */
export const specDocumentSchema = z.object({
  header: headerSchema,
  /** What a reader has to know before the first part. */
  front: z.object({
    unknowns: z.array(itemSchema),
    overrides: z.array(itemSchema),
    typical: z.array(itemSchema),
    assumptions: z.array(itemSchema),
  }),
  parts: z.array(partSchema).length(3),
  section: z.object({ layers: z.array(sectionLayerSchema), unit: z.enum(['mil', 'µm']) }),
  schedules: z.array(tableSchema),
  workings: z.array(z.object({ tag: z.string(), formula: z.string(), sum: z.string(), source: z.string(), from: z.array(z.string()) })),
  entered: z.array(z.object({ tag: z.string(), reason: z.string(), by: z.string(), at: z.string() })),
  typicals: z.array(z.object({ tag: z.string(), source: z.string(), dated: z.string() })),
  sources: z.array(sourceSchema),
  closing: z.array(z.string()),
})
export type SpecDocument = z.infer<typeof specDocumentSchema>

/** Headings of the front matter, in its order. */
export const frontTitles = {
  unknowns: 'Not stated, not known',
  overrides: 'Checks not met, and what was accepted with a reason',
  typical: 'Typical values, to be verified',
  assumptions: 'Assumptions',
} as const satisfies Record<keyof SpecDocument['front'], string>

/** What a figure says beside itself: its tags, or how it is known where there is nothing to look up. */
export function tagText(run: Run): string {
  if (run.kind !== 'figure') return ''
  const words = run.known === 'typical' ? ['typical, verify', ...run.tags] : run.tags
  return words.length > 0 ? ` [${words.join(', ')}]` : ''
}

/** A line as plain text, tags included. */
export function plainText(runs: readonly Run[]): string {
  return runs.map((run) => run.text + tagText(run)).join('')
}

/** "Draft, not issued" or "Issue 2". */
export function issueWords({ issue }: Pick<SpecHeader, 'issue'>): string {
  return issue ? `Issue ${issue.number}` : 'Draft, not issued'
}
