import { sql } from 'drizzle-orm'
import { index, integer, jsonb, pgTable, text, timestamp, uniqueIndex, uuid } from 'drizzle-orm/pg-core'
import type { Conditions, Course, EvaluationInput } from '../../../shared/domain/build-up.ts'
import type { Evaluation } from '../../../shared/domain/evaluation.ts'
import { people } from './people.ts'

const instant = (name: string) => timestamp(name, { withTimezone: true, mode: 'string' })
const key = () =>
  uuid('id')
    .primaryKey()
    .default(sql`gen_random_uuid()`)

export const buildUps = pgTable(
  'build_ups',
  {
    id: key(),
    /** Shown as BU-014. */
    number: integer('number').notNull().unique().generatedAlwaysAsIdentity(),
    name: text('name').notNull(),
    note: text('note').notNull().default(''),
    /** Edit counter of the name and note. */
    version: integer('version').notNull().default(1),
    createdAt: instant('created_at').notNull().defaultNow(),
    searchText: text('search_text').notNull().default(''),
  },
  (table) => [
    index('build_ups_name').on(table.name, table.id),
    index('build_ups_search').using('gin', sql`${table.searchText} gin_trgm_ops`),
  ],
)

export const buildUpVersions = pgTable(
  'build_up_versions',
  {
    id: key(),
    buildUpId: uuid('build_up_id')
      .notNull()
      .references(() => buildUps.id),
    number: integer('number').notNull(),
    status: text('status', { enum: ['draft', 'released', 'superseded', 'withdrawn'] })
      .notNull()
      .default('draft'),
    conditions: jsonb('conditions').$type<Conditions>().notNull(),
    /** Edit counter of the draft; a save with another number is a conflict. */
    version: integer('version').notNull().default(1),
    updatedAt: instant('updated_at').notNull().defaultNow(),
    updatedBy: uuid('updated_by').references(() => people.id),
    releasedAt: instant('released_at'),
    releasedBy: uuid('released_by').references(() => people.id),
    releasedByName: text('released_by_name'),
    /** Why cautions and unknowns were accepted: `checkId:courseId` to the reason. */
    releaseReasons: jsonb('release_reasons').$type<Record<string, string>>(),
    /** The facts and the result at release, kept for ever. */
    frozenInput: jsonb('frozen_input').$type<EvaluationInput>(),
    frozenEvaluation: jsonb('frozen_evaluation').$type<Evaluation>(),
  },
  (table) => [
    uniqueIndex('build_up_versions_number').on(table.buildUpId, table.number),
    index('build_up_versions_status').on(table.status),
  ],
)

/** One row a course, bottom up by position. */
export const courses = pgTable(
  'courses',
  {
    id: key(),
    versionId: uuid('version_id')
      .notNull()
      .references(() => buildUpVersions.id, { onDelete: 'cascade' }),
    /** The course's own id within its version, stable across saves. */
    courseId: text('course_id').notNull(),
    position: integer('position').notNull(),
    stage: text('stage').notNull(),
    mixId: uuid('mix_id'),
    course: jsonb('course').$type<Course>().notNull(),
  },
  (table) => [uniqueIndex('courses_position').on(table.versionId, table.position), index('courses_mix').on(table.mixId)],
)
