import * as z from 'zod'
import { boxSchema, factSchema } from '../domain/fact.ts'
import { componentPartSchema, mixFactsSchema } from '../domain/mix.ts'
import { chemistrySchema, productFactsSchema, productKindSchema, recordStatusSchema } from '../domain/product.ts'
import { type Statement, definitionOf, ratioSchema } from '../domain/property.ts'
import { looseStatementSchema, soundStatement, statementProblems } from '../domain/statement.ts'
import { endpoint } from './endpoint.ts'
import { idSchema, line, listOf, listQuery, paragraph, versionSchema } from './list.ts'

const productId = z.object({ productId: idSchema })
const mixId = z.object({ mixId: idSchema })

/** How a value is known, as a person says it: on a page of a sheet, or by their own word with a reason. */
export const knownHowSchema = z.discriminatedUnion('kind', [
  z.strictObject({
    kind: z.literal('stated'),
    revisionId: idSchema,
    page: z.int().min(1).max(1000),
    box: boxSchema.nullable(),
    quote: paragraph(1000).nullable(),
  }),
  z.strictObject({ kind: z.literal('entered'), reason: line(500) }),
])
export type KnownHow = z.infer<typeof knownHowSchema>

/** A value with how it is known. The value must be of the property's form, measure what the property is, and be possible. */
export interface FactBody {
  statement: Statement
  how: KnownHow
}
export const factBody = z
  .strictObject({ statement: looseStatementSchema, how: knownHowSchema })
  .superRefine(({ statement, how }, context) => {
    for (const { path, message } of statementProblems(statement))
      context.addIssue({ code: 'custom', path: ['statement', ...path], message })
    if (definitionOf(statement.property).source === 'firm' && how.kind === 'stated') {
      context.addIssue({ code: 'custom', path: ['how', 'kind'], message: 'A price is the firm’s own: enter it with a reason.' })
    }
  })
  .transform(({ statement, how }): FactBody => ({ statement: soundStatement(statement), how }))

const usedIn = z.array(
  z.object({ kind: z.enum(['mix', 'build-up', 'job', 'specification']), id: idSchema, name: z.string(), version: z.int().nullable() }),
)
const recordParts = { note: z.string(), version: versionSchema, updatedAt: z.string(), usedIn }
export const productRecordSchema = productFactsSchema.extend(recordParts)
export type ProductRecord = z.infer<typeof productRecordSchema>
export const mixRecordSchema = mixFactsSchema.extend(recordParts)
export type MixRecord = z.infer<typeof mixRecordSchema>

export const productRowSchema = z.object({
  id: idSchema,
  name: z.string(),
  maker: z.string(),
  kind: productKindSchema,
  chemistry: z.string(),
  status: recordStatusSchema,
  facts: z.int(),
  sheets: z.int(),
  updatedAt: z.string(),
})
export type ProductRow = z.infer<typeof productRowSchema>
export const mixRowSchema = z.object({
  id: idSchema,
  name: z.string(),
  maker: z.string(),
  chemistry: z.string(),
  color: z.string(),
  status: recordStatusSchema,
  /** Names of the parts, A first. */
  parts: z.array(z.string()),
  facts: z.int(),
  sheets: z.int(),
  updatedAt: z.string(),
})
export type MixRow = z.infer<typeof mixRowSchema>

export const productBody = z.strictObject({
  name: line(160),
  maker: line(120),
  kind: productKindSchema,
  chemistry: chemistrySchema,
  note: paragraph(2000),
})
const colorSchema = z.string().regex(/^#[0-9a-f]{6}$/, 'Choose a colour.')
const partsSchema = z
  .array(z.strictObject({ part: componentPartSchema, productId: idSchema }))
  .min(1, 'A mix has at least one part.')
  .max(3, 'A mix has at most three parts.')
  .refine((parts) => parts.every(({ part }, index) => part === 'ABC'[index]), 'Parts are named A, B, C in this order.')
  .superRefine((parts, context) => {
    const first = (id: string) => parts.findIndex(({ productId }) => productId === id)
    parts.forEach(({ productId }, index) => {
      if (first(productId) < index)
        context.addIssue({
          code: 'custom',
          path: [index, 'productId'],
          message: `This product is part ${'ABC'[first(productId)]} already.`,
        })
    })
  })
export const mixBody = z.strictObject({
  name: line(160),
  maker: line(120),
  chemistry: chemistrySchema,
  color: colorSchema,
  note: paragraph(2000),
  parts: partsSchema,
})
/** A new mix says its ratio with it, or says that nobody knows it yet. */
export const newMixBody = mixBody
  .extend({ ratio: z.strictObject({ value: ratioSchema, reason: line(500) }).nullable() })
  .superRefine(({ parts, ratio }, context) => {
    if (parts.length > 1 && ratio && ratio.value.parts.length !== parts.length) {
      context.addIssue({
        code: 'custom',
        path: ['ratio', 'value', 'parts'],
        message: 'The ratio has another number of parts than the mix.',
      })
    }
    if (parts.length === 1 && ratio) context.addIssue({ code: 'custom', path: ['ratio'], message: 'One part alone has no ratio.' })
  })

const csv = { file: 'text/csv; charset=utf-8' } as const
const filters = {
  chemistry: chemistrySchema.optional(),
  status: recordStatusSchema.optional(),
  maker: z.string().trim().max(120).optional(),
}

const productQuery = listQuery(['name', 'maker', 'kind', 'chemistry', 'updatedAt']).extend({
  ...filters,
  kind: productKindSchema.optional(),
})
const mixQuery = listQuery(['name', 'maker', 'chemistry', 'updatedAt']).extend(filters)

export const catalogueEndpoints = {
  listProducts: endpoint({
    method: 'get',
    path: '/api/products',
    access: 'catalogue:read',
    summary: 'List products by name, maker, kind, chemistry, CAS number or hazard code',
    query: productQuery,
    response: listOf(productRowSchema),
  }),
  exportProducts: endpoint({
    method: 'get',
    path: '/api/products.csv',
    access: 'catalogue:read',
    summary: 'The list of products as CSV, with the same search and filters, all of it',
    query: productQuery.omit({ limit: true, cursor: true }),
    response: csv,
  }),
  addProduct: endpoint({
    method: 'post',
    path: '/api/products',
    access: 'catalogue:write',
    summary: 'Add a product',
    status: 201,
    body: productBody,
    response: productRecordSchema,
  }),
  readProduct: endpoint({
    method: 'get',
    path: '/api/products/:productId',
    access: 'catalogue:read',
    summary: 'Read a product with all that is known of it',
    params: productId,
    response: productRecordSchema,
  }),
  changeProduct: endpoint({
    method: 'patch',
    path: '/api/products/:productId',
    access: 'catalogue:write',
    summary: 'Change, withdraw or restore a product',
    params: productId,
    body: productBody.partial().extend({ version: versionSchema, status: recordStatusSchema.optional() }),
    response: productRecordSchema,
  }),
  addProductFact: endpoint({
    method: 'post',
    path: '/api/products/:productId/facts',
    access: 'catalogue:write',
    summary: 'Add a value to a product',
    params: productId,
    status: 201,
    body: factBody,
    response: factSchema,
  }),
  listMixes: endpoint({
    method: 'get',
    path: '/api/mixes',
    access: 'catalogue:read',
    summary: 'List mixes by name, maker, chemistry, or by the name, CAS numbers and hazard codes of their parts',
    query: mixQuery,
    response: listOf(mixRowSchema),
  }),
  exportMixes: endpoint({
    method: 'get',
    path: '/api/mixes.csv',
    access: 'catalogue:read',
    summary: 'The list of mixes as CSV, with the same search and filters, all of it',
    query: mixQuery.omit({ limit: true, cursor: true }),
    response: csv,
  }),
  addMix: endpoint({
    method: 'post',
    path: '/api/mixes',
    access: 'catalogue:write',
    summary: 'Add a mix of one to three parts with its ratio',
    status: 201,
    body: newMixBody,
    response: mixRecordSchema,
  }),
  readMix: endpoint({
    method: 'get',
    path: '/api/mixes/:mixId',
    access: 'catalogue:read',
    summary: 'Read a mix with all that is known of it',
    params: mixId,
    response: mixRecordSchema,
  }),
  changeMix: endpoint({
    method: 'patch',
    path: '/api/mixes/:mixId',
    access: 'catalogue:write',
    summary: 'Change, withdraw or restore a mix',
    params: mixId,
    body: mixBody.partial().extend({ version: versionSchema, status: recordStatusSchema.optional() }),
    response: mixRecordSchema,
  }),
  addMixFact: endpoint({
    method: 'post',
    path: '/api/mixes/:mixId/facts',
    access: 'catalogue:write',
    summary: 'Add a value to a mix',
    params: mixId,
    status: 201,
    body: factBody,
    response: factSchema,
  }),
  amendFact: endpoint({
    method: 'put',
    path: '/api/facts/:factId',
    access: 'catalogue:write',
    summary: 'Put another value in the place of one; the old one is kept in the history',
    params: z.object({ factId: idSchema }),
    body: factBody,
    response: factSchema,
  }),
  endFact: endpoint({
    method: 'delete',
    path: '/api/facts/:factId',
    access: 'catalogue:write',
    summary: 'Take a value out; it is kept in the history',
    params: z.object({ factId: idSchema }),
    response: 'nothing',
    status: 204,
  }),
  listMakers: endpoint({
    method: 'get',
    path: '/api/makers',
    access: 'catalogue:read',
    summary: 'Makers of the catalogue',
    response: z.object({ items: z.array(z.string()) }),
  }),
}
