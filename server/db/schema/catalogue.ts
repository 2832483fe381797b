import { sql } from 'drizzle-orm'
import { boolean, check, index, integer, jsonb, pgTable, primaryKey, text, timestamp, uniqueIndex, uuid } from 'drizzle-orm/pg-core'
import type { Box } from '../../../shared/domain/fact.ts'
import type { PropertyValue, ValueConditions } from '../../../shared/domain/property.ts'
import { people } from './people.ts'
import { sheetRevisions, sheets } from './sheets.ts'

const instant = (name: string) => timestamp(name, { withTimezone: true, mode: 'string' })
const key = () =>
  uuid('id')
    .primaryKey()
    .default(sql`gen_random_uuid()`)

export const products = pgTable(
  'products',
  {
    id: key(),
    name: text('name').notNull(),
    maker: text('maker').notNull(),
    kind: text('kind', { enum: ['resin', 'hardener', 'primer', 'aggregate', 'filler', 'additive'] }).notNull(),
    chemistry: text('chemistry').notNull(),
    note: text('note').notNull().default(''),
    status: text('status', { enum: ['active', 'withdrawn'] })
      .notNull()
      .default('active'),
    version: integer('version').notNull().default(1),
    createdAt: instant('created_at').notNull().defaultNow(),
    updatedAt: instant('updated_at').notNull().defaultNow(),
    /** Name, maker, kind, chemistry, CAS numbers and hazard codes in lower case, kept by the write functions for typo-tolerant search. */
    searchText: text('search_text').notNull().default(''),
  },
  (table) => [
    uniqueIndex('products_maker_name').on(sql`lower(${table.maker})`, sql`lower(${table.name})`),
    index('products_search').using('gin', sql`${table.searchText} gin_trgm_ops`),
    index('products_name').on(sql`lower(${table.name})`, table.id),
  ],
)

export const mixes = pgTable(
  'mixes',
  {
    id: key(),
    name: text('name').notNull(),
    maker: text('maker').notNull(),
    chemistry: text('chemistry').notNull(),
    color: text('color').notNull(),
    note: text('note').notNull().default(''),
    status: text('status', { enum: ['active', 'withdrawn'] })
      .notNull()
      .default('active'),
    version: integer('version').notNull().default(1),
    createdAt: instant('created_at').notNull().defaultNow(),
    updatedAt: instant('updated_at').notNull().defaultNow(),
    searchText: text('search_text').notNull().default(''),
  },
  (table) => [
    uniqueIndex('mixes_maker_name').on(sql`lower(${table.maker})`, sql`lower(${table.name})`),
    index('mixes_search').using('gin', sql`${table.searchText} gin_trgm_ops`),
    index('mixes_name').on(sql`lower(${table.name})`, table.id),
  ],
)

export const mixParts = pgTable(
  'mix_parts',
  {
    mixId: uuid('mix_id')
      .notNull()
      .references(() => mixes.id),
    part: text('part', { enum: ['A', 'B', 'C'] }).notNull(),
    productId: uuid('product_id')
      .notNull()
      .references(() => products.id),
  },
  (table) => [primaryKey({ columns: [table.mixId, table.part] }), index('mix_parts_product').on(table.productId)],
)

/** A value of the catalogue with how it is known. A replaced or removed value stays, with `endedAt`. */
export const propertyValues = pgTable(
  'property_values',
  {
    id: key(),
    productId: uuid('product_id').references(() => products.id),
    mixId: uuid('mix_id').references(() => mixes.id),
    property: text('property').notNull(),
    part: text('part', { enum: ['mixed', 'A', 'B', 'C'] })
      .notNull()
      .default('mixed'),
    value: jsonb('value').$type<PropertyValue>().notNull(),
    at: jsonb('at').$type<ValueConditions>(),
    film: text('film', { enum: ['wet', 'dry'] }),
    of: text('of', { enum: ['air', 'slab', 'material'] }),
    thinned: boolean('thinned'),
    kind: text('kind', { enum: ['stated', 'entered'] }).notNull(),
    reason: text('reason'),
    revisionId: uuid('revision_id').references(() => sheetRevisions.id),
    page: integer('page'),
    box: jsonb('box').$type<Box>(),
    quote: text('quote'),
    position: integer('position').notNull().default(0),
    byPersonId: uuid('by_person_id').references(() => people.id),
    byName: text('by_name').notNull(),
    madeAt: instant('made_at').notNull().defaultNow(),
    endedAt: instant('ended_at'),
  },
  (table) => [
    index('property_values_product').on(table.productId),
    index('property_values_mix').on(table.mixId),
    index('property_values_revision').on(table.revisionId),
    check('property_values_one_subject', sql`(${table.productId} is null) <> (${table.mixId} is null)`),
    check(
      'property_values_known_how',
      sql`(${table.kind} = 'stated' and ${table.revisionId} is not null and ${table.page} is not null) or (${table.kind} = 'entered' and ${table.reason} is not null)`,
    ),
  ],
)

/** Which products and mixes a sheet speaks of. */
export const sheetSubjects = pgTable(
  'sheet_subjects',
  {
    id: key(),
    sheetId: uuid('sheet_id')
      .notNull()
      .references(() => sheets.id),
    productId: uuid('product_id').references(() => products.id),
    mixId: uuid('mix_id').references(() => mixes.id),
  },
  (table) => [
    uniqueIndex('sheet_subjects_product').on(table.sheetId, table.productId),
    uniqueIndex('sheet_subjects_mix').on(table.sheetId, table.mixId),
    index('sheet_subjects_by_product').on(table.productId),
    index('sheet_subjects_by_mix').on(table.mixId),
    check('sheet_subjects_one', sql`(${table.productId} is null) <> (${table.mixId} is null)`),
  ],
)
