import * as z from 'zod'
import { originSchema, type Fact } from './fact.ts'
import { type Property, partSchema, propertySchema, rangeSchema } from './property.ts'

/** The formula behind a computed figure, with its numbers put in: "1,604.17 × 100 % ÷ 150 ft²/gal = 10.7 mil". */
export interface Working {
  readonly formula: string
  readonly sum: string
  readonly source: string
}
export const workingSchema = z.object({ formula: z.string(), sum: z.string(), source: z.string() })

/** What no sheet says, and who could. */
export const missingSchema = z.object({
  property: propertySchema,
  part: partSchema,
  /** The mix, product or measurement that lacks it, by name. */
  of: z.string(),
  /** The record to open, when there is one. */
  subject: z.object({ kind: z.enum(['mix', 'product', 'conditions']), id: z.string() }).nullable(),
  ask: z.string(),
  /** Where the sheet stops: "the sheet stops at 50 °F". */
  because: z.string().optional(),
})
export type Missing = z.infer<typeof missingSchema>

/**
 * A figure is a range with its unit and how it is known, or it is missing. Every number on a screen, in a document or on a phone is one of these.
 * `stated` and `entered` come straight from a fact; `computed` carries its working and the facts it was worked out from.
 */
export const figureSchema = z.discriminatedUnion('kind', [
  z.object({ kind: z.literal('fact'), value: rangeSchema, factId: z.string(), origin: originSchema, condition: z.string().optional() }),
  z.object({
    kind: z.literal('computed'),
    value: rangeSchema,
    working: workingSchema,
    from: z.array(z.object({ label: z.string(), factId: z.string().optional(), origin: originSchema.optional() })),
  }),
  z.object({ kind: z.literal('not-stated'), missing: missingSchema }),
])
export type Figure = z.infer<typeof figureSchema>
export type KnownFigure = Exclude<Figure, { kind: 'not-stated' }>

/** Why a figure is absent, without inventing it. */
export function notStated(property: Property, of: Omit<Missing, 'property' | 'part'> & { part?: Missing['part'] }): Figure {
  return { kind: 'not-stated', missing: { property, ...of, part: of.part ?? 'mixed' } }
}

/** True when a figure rests on a typical value anywhere: such a figure never makes a check met. */
export function isTypical(figure: Figure): boolean {
  if (figure.kind === 'fact') return figure.origin.kind === 'typical'
  return figure.kind === 'computed' && figure.from.some((source) => source.origin?.kind === 'typical')
}

/** A fact of range form as a figure. */
export function figureOfFact(fact: Fact, condition?: string): Figure {
  const value = rangeSchema.parse(fact.value)
  return { kind: 'fact', value, factId: fact.id, origin: fact.origin, ...(condition ? { condition } : {}) }
}
