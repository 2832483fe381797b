import * as z from 'zod'
import { type Property, type PropertyValue, type Range, type Ratio, type Statement, type Substance, statementSchema } from './property.ts'

/** Left, top, right, bottom in PDF points from the top-left corner of the page as shown. */
export const boxSchema = z.tuple([z.number(), z.number(), z.number(), z.number()])
export type Box = z.infer<typeof boxSchema>

/** Where a sheet says it: enough to open the page and to print a source tag. */
export const citationSchema = z.object({
  sheetId: z.string(),
  revisionId: z.string(),
  sheetTitle: z.string(),
  /** ISO date of the revision, as far as it is stated. */
  revisionDate: z.string().nullable(),
  page: z.int().min(1),
  box: boxSchema.nullable(),
  quote: z.string().nullable(),
})
export type Citation = z.infer<typeof citationSchema>

const person = { by: z.string(), at: z.string() }

/** How a value is known. Nothing else counts: what has none of these is not stated. */
export const originSchema = z.discriminatedUnion('kind', [
  z.object({ kind: z.literal('stated'), citation: citationSchema, ...person }),
  z.object({ kind: z.literal('entered'), reason: z.string(), ...person }),
  z.object({ kind: z.literal('typical'), source: z.string(), dated: z.string() }),
])
export type Origin = z.infer<typeof originSchema>

/** A value of the catalogue: what is said and how it is known. */
export const factSchema = statementSchema.extend({ id: z.string(), origin: originSchema })
export type Fact = Statement & { id: string; origin: Origin }

/** All facts of one property (of the mix as a whole unless a part is named). */
export function factsOf(facts: readonly Fact[], property: Property, part: Fact['part'] = 'mixed'): Fact[] {
  return facts.filter((fact) => fact.property === property && fact.part === part)
}

/** The first fact of a property that does not repeat. */
export function factOf(facts: readonly Fact[], property: Property, part: Fact['part'] = 'mixed'): Fact | undefined {
  return facts.find((fact) => fact.property === property && fact.part === part)
}

const has = <K extends string>(value: PropertyValue, key: K): value is PropertyValue & Record<K, unknown> => key in value

/** The value as a range with unit; undefined when the fact is of another form. */
export function rangeOf(fact: Fact | undefined): Range | undefined {
  return fact && has(fact.value, 'unit') && !has(fact.value, 'name') ? (fact.value as Range) : undefined
}

export function ratioOf(fact: Fact | undefined): Ratio | undefined {
  return fact && has(fact.value, 'parts') ? (fact.value as Ratio) : undefined
}

export function codesOf(fact: Fact | undefined): string[] {
  return fact && has(fact.value, 'codes') ? (fact.value as { codes: string[] }).codes : []
}

export function textOf(fact: Fact | undefined): string | undefined {
  return fact && has(fact.value, 'text') ? (fact.value as { text: string }).text : undefined
}

export function flagOf(fact: Fact | undefined): boolean | undefined {
  return fact && has(fact.value, 'is') ? (fact.value as { is: boolean }).is : undefined
}

export function substanceOf(fact: Fact | undefined): Substance | undefined {
  return fact && has(fact.value, 'name') ? (fact.value as Substance) : undefined
}
