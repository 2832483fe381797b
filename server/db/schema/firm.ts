import { sql } from 'drizzle-orm'
import { bigserial, boolean, check, doublePrecision, index, integer, jsonb, pgTable, text, timestamp, uuid } from 'drizzle-orm/pg-core'

/** One row: the firm's own details and limits. */
export const firm = pgTable(
  'firm',
  {
    id: integer('id').primaryKey().default(1),
    name: text('name').notNull(),
    address: text('address').notNull().default(''),
    phone: text('phone').notNull().default(''),
    sheetAgeLimitYears: doublePrecision('sheet_age_limit_years').notNull().default(3),
    isDemo: boolean('is_demo').notNull().default(false),
    version: integer('version').notNull().default(1),
  },
  (table) => [check('firm_single', sql`${table.id} = 1`)],
)

/** Who changed what, from what, to what. Written in the transaction of the change. */
export const auditTrail = pgTable(
  'audit_trail',
  {
    id: bigserial('id', { mode: 'number' }).primaryKey(),
    at: timestamp('at', { withTimezone: true, mode: 'string' }).notNull().defaultNow(),
    /** Null for what the system did by itself (demo, migration). */
    personId: uuid('person_id'),
    action: text('action').notNull(),
    subjectKind: text('subject_kind').notNull(),
    subjectId: text('subject_id').notNull(),
    from: jsonb('from'),
    to: jsonb('to'),
  },
  (table) => [index('audit_trail_subject').on(table.subjectKind, table.subjectId, table.id)],
)
