import { sql } from 'drizzle-orm'
import {
  bigint,
  doublePrecision,
  index,
  integer,
  jsonb,
  pgTable,
  primaryKey,
  text,
  timestamp,
  uniqueIndex,
  uuid,
} from 'drizzle-orm/pg-core'
import { people } from './people.ts'

const instant = (name: string) => timestamp(name, { withTimezone: true, mode: 'string' })
const key = () =>
  uuid('id')
    .primaryKey()
    .default(sql`gen_random_uuid()`)

/** A stretch of text on a page: the words and left, top, right, bottom in points from the top-left corner as shown. */
export type PlacedText = [text: string, left: number, top: number, right: number, bottom: number]

export const sheets = pgTable(
  'sheets',
  {
    id: key(),
    kind: text('kind', { enum: ['data', 'safety'] }).notNull(),
    title: text('title').notNull(),
    maker: text('maker').notNull().default(''),
    version: integer('version').notNull().default(1),
    createdAt: instant('created_at').notNull().defaultNow(),
    searchText: text('search_text').notNull().default(''),
  },
  (table) => [index('sheets_search').using('gin', sql`${table.searchText} gin_trgm_ops`), index('sheets_title').on(table.title, table.id)],
)

/** Each dated PDF of a sheet. The file is kept by its SHA-256 and never altered. */
export const sheetRevisions = pgTable(
  'sheet_revisions',
  {
    id: key(),
    sheetId: uuid('sheet_id')
      .notNull()
      .references(() => sheets.id),
    sha256: text('sha256').notNull(),
    bytes: bigint('bytes', { mode: 'number' }).notNull(),
    fileName: text('file_name').notNull(),
    /** ISO, as far as stated: `2024`, `2024-03`, `2024-03-18`. */
    revisionDate: text('revision_date'),
    /** `ready`: text read; `no-text`: pages are pictures, kept and viewable, nothing can be read from them. */
    state: text('state', { enum: ['ready', 'no-text'] }).notNull(),
    pages: integer('pages').notNull(),
    /** Counts up within the sheet; the highest is in force. */
    sequence: integer('sequence').notNull(),
    uploadedBy: uuid('uploaded_by').references(() => people.id),
    uploadedAt: instant('uploaded_at').notNull().defaultNow(),
  },
  (table) => [
    uniqueIndex('sheet_revisions_sha256').on(table.sha256),
    uniqueIndex('sheet_revisions_sequence').on(table.sheetId, table.sequence),
  ],
)

export const sheetPages = pgTable(
  'sheet_pages',
  {
    revisionId: uuid('revision_id')
      .notNull()
      .references(() => sheetRevisions.id),
    page: integer('page').notNull(),
    width: doublePrecision('width').notNull(),
    height: doublePrecision('height').notNull(),
    rotation: integer('rotation').notNull().default(0),
    text: text('text').notNull(),
    words: jsonb('words').$type<PlacedText[]>().notNull(),
  },
  (table) => [primaryKey({ columns: [table.revisionId, table.page] })],
)
