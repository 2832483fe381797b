import { sql } from 'drizzle-orm'
import { index, integer, jsonb, pgTable, primaryKey, text, timestamp, uniqueIndex, uuid } from 'drizzle-orm/pg-core'
import type { Bay, JobConditions, Loss } from '../../../shared/domain/job.ts'
import { buildUpVersions } from './build-ups.ts'
import { people } from './people.ts'

const instant = (name: string) => timestamp(name, { withTimezone: true, mode: 'string' })
const key = () =>
  uuid('id')
    .primaryKey()
    .default(sql`gen_random_uuid()`)

export const jobs = pgTable(
  'jobs',
  {
    id: key(),
    /** Shown as J-003. */
    number: integer('number').notNull().unique().generatedAlwaysAsIdentity(),
    name: text('name').notNull(),
    client: text('client').notNull().default(''),
    site: text('site').notNull().default(''),
    status: text('status', { enum: ['open', 'closed'] })
      .notNull()
      .default('open'),
    buildUpVersionId: uuid('build_up_version_id').references(() => buildUpVersions.id),
    conditions: jsonb('conditions').$type<JobConditions>().notNull(),
    loss: jsonb('loss').$type<Loss>().notNull(),
    /** Planned start of the first course, UTC; null: not planned. */
    startsAt: instant('starts_at'),
    timeZone: text('time_zone').notNull(),
    version: integer('version').notNull().default(1),
    updatedAt: instant('updated_at').notNull().defaultNow(),
    searchText: text('search_text').notNull().default(''),
  },
  (table) => [index('jobs_name').on(table.name, table.id)],
)

export const bays = pgTable(
  'bays',
  {
    id: key(),
    jobId: uuid('job_id')
      .notNull()
      .references(() => jobs.id),
    bayId: text('bay_id').notNull(),
    position: integer('position').notNull(),
    bay: jsonb('bay').$type<Bay>().notNull(),
  },
  (table) => [uniqueIndex('bays_position').on(table.jobId, table.position)],
)

/** Which crew members are on the job: they see its site card and no other. */
export const jobPeople = pgTable(
  'job_people',
  {
    jobId: uuid('job_id')
      .notNull()
      .references(() => jobs.id),
    personId: uuid('person_id')
      .notNull()
      .references(() => people.id),
  },
  (table) => [primaryKey({ columns: [table.jobId, table.personId] }), index('job_people_person').on(table.personId)],
)

/** What a crew records. The id is made on the phone, so that a repeated delivery is one entry. Corrected, never erased. */
export const logEntries = pgTable(
  'log_entries',
  {
    id: uuid('id').primaryKey(),
    jobId: uuid('job_id')
      .notNull()
      .references(() => jobs.id),
    bayId: text('bay_id'),
    courseId: text('course_id'),
    kind: text('kind').notNull(),
    entry: jsonb('entry').notNull(),
    deviceAt: instant('device_at').notNull(),
    receivedAt: instant('received_at').notNull().defaultNow(),
    personId: uuid('person_id')
      .notNull()
      .references(() => people.id),
    correctsId: uuid('corrects_id'),
  },
  (table) => [index('log_entries_job').on(table.jobId, table.receivedAt)],
)
