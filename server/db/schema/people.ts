import { sql } from 'drizzle-orm'
import { check, index, integer, json, pgTable, text, timestamp, uuid, varchar } from 'drizzle-orm/pg-core'

const instant = (name: string) => timestamp(name, { withTimezone: true, mode: 'string' })

export const people = pgTable(
  'people',
  {
    id: uuid('id')
      .primaryKey()
      .default(sql`gen_random_uuid()`),
    name: text('name').notNull(),
    /** Lower case; one account an address. */
    email: text('email').notNull().unique(),
    role: text('role', { enum: ['lead', 'estimator', 'crew'] }).notNull(),
    status: text('status', { enum: ['invited', 'active', 'disabled'] }).notNull(),
    passwordHash: text('password_hash'),
    version: integer('version').notNull().default(1),
    createdAt: instant('created_at').notNull().defaultNow(),
  },
  (table) => [check('people_email_lower', sql`${table.email} = lower(${table.email})`)],
)

/** Single-use links of invitation and password reset; only the hash is kept. */
export const passwordLinks = pgTable(
  'password_links',
  {
    id: uuid('id')
      .primaryKey()
      .default(sql`gen_random_uuid()`),
    personId: uuid('person_id')
      .notNull()
      .references(() => people.id),
    purpose: text('purpose', { enum: ['invitation', 'reset'] }).notNull(),
    tokenHash: text('token_hash').notNull().unique(),
    expiresAt: instant('expires_at').notNull(),
    usedAt: instant('used_at'),
  },
  (table) => [index('password_links_person').on(table.personId)],
)

/** Failures counted on the address tried, known or not, so that the answer tells nothing. */
export const signInFailures = pgTable('sign_in_failures', {
  emailHash: text('email_hash').primaryKey(),
  failures: integer('failures').notNull(),
  lastAt: instant('last_at').notNull(),
})

/** The table of connect-pg-simple. */
export const session = pgTable(
  'session',
  { sid: varchar('sid').primaryKey(), sess: json('sess').notNull(), expire: timestamp('expire', { precision: 6 }).notNull() },
  (table) => [index('session_expire').on(table.expire)],
)
