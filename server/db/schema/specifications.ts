import { sql } from 'drizzle-orm'
import { index, integer, jsonb, pgTable, text, timestamp, uniqueIndex, uuid } from 'drizzle-orm/pg-core'
import { jobs } from './jobs.ts'
import { people } from './people.ts'

const instant = (name: string) => timestamp(name, { withTimezone: true, mode: 'string' })
const key = () =>
  uuid('id')
    .primaryKey()
    .default(sql`gen_random_uuid()`)

export const specifications = pgTable(
  'specifications',
  {
    id: key(),
    jobId: uuid('job_id')
      .notNull()
      .references(() => jobs.id),
    title: text('title').notNull(),
    /** `09 67 23` unless chosen otherwise. */
    sectionNumber: text('section_number').notNull(),
    version: integer('version').notNull().default(1),
    createdAt: instant('created_at').notNull().defaultNow(),
    updatedAt: instant('updated_at').notNull().defaultNow(),
  },
  (table) => [index('specifications_job').on(table.jobId)],
)

/** A numbered, frozen release: its tree and the hashes of its files. Never updated. */
export const specificationIssues = pgTable(
  'specification_issues',
  {
    id: key(),
    specificationId: uuid('specification_id')
      .notNull()
      .references(() => specifications.id),
    number: integer('number').notNull(),
    issuedAt: instant('issued_at').notNull(),
    issuedBy: uuid('issued_by').references(() => people.id),
    issuedByName: text('issued_by_name').notNull(),
    /** The SpecDocument as JSON text, byte for byte as hashed. */
    tree: text('tree').notNull(),
    treeSha256: text('tree_sha256').notNull(),
    docxSha256: text('docx_sha256').notNull(),
    pdfSha256: text('pdf_sha256').notNull(),
    facts: jsonb('facts').notNull(),
  },
  (table) => [uniqueIndex('specification_issues_number').on(table.specificationId, table.number)],
)
