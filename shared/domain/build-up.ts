import * as z from 'zod'
import { mixFactsSchema } from './mix.ts'
import { productFactsSchema } from './product.ts'
import { quantitySchema } from './property.ts'
import { type Dimension, type Quantity, dimensionOf, valueIn } from './units.ts'

/** Stages of a floor, from the slab upward. */
export const stages = ['prep', 'fill', 'slurry', 'grind', 'prime', 'body', 'broadcast', 'seal', 'top', 'cove'] as const
export const stageSchema = z.enum(stages)
export type Stage = z.infer<typeof stageSchema>
/** Stages that work the surface and lay down no resin. */
export const dryStages = ['prep', 'grind'] as const satisfies readonly Stage[]

/** Methods of ICRI 310.2R-2013. */
export const preparationMethods = [
  'detergent scrubbing',
  'low-pressure water cleaning',
  'acid etching',
  'grinding',
  'abrasive blasting',
  'steel shot blasting',
  'scarifying',
  'needle scaling',
  'high-pressure water jetting',
  'scabbling',
  'surface retarder',
  'flame blasting',
  'milling',
  'handheld concrete breaker',
] as const
export const preparationSchema = z.strictObject({
  method: z.enum(preparationMethods),
  /** Concrete surface profile asked for, 1 to 10. */
  profile: z.int().min(1).max(10).optional(),
})

const wrongUnit = { error: 'This unit measures something else.' }
const measured = (dimension: Dimension) => quantitySchema.refine(({ unit }) => dimensionOf(unit) === dimension, wrongUnit)
/** An amount above nothing, and not more than anybody could mean: what is worked out from it must be a number too. */
const amount = (dimension: Dimension, most: Quantity) =>
  measured(dimension)
    .refine(({ value }) => value >= 1e-6, { error: 'Give an amount above nothing.' })
    .refine((given) => dimensionOf(given.unit) !== dimension || valueIn(given, most.unit) <= most.value, { error: 'This is too much.' })
/** Slab and air: wider than any place a floor is laid in, and short of where the formulae of vapour end. */
const temperature = measured('temperature').refine(
  (given) => dimensionOf(given.unit) !== 'temperature' || (valueIn(given, '°C') >= -60 && valueIn(given, '°C') <= 100),
  { error: 'Give a temperature between −60 and 100 °C.' },
)

export const buildUpStatusSchema = z.enum(['draft', 'released', 'superseded', 'withdrawn'])
export type BuildUpStatus = z.infer<typeof buildUpStatusSchema>

/** One step of a build-up. Thickness and spread rate are two ways to say one thing: at most one is given, the other is computed. */
export const courseSchema = z.strictObject({
  id: z.string().min(1).max(40),
  stage: stageSchema,
  title: z.string().trim().min(1).max(120),
  mixId: z.string().nullable(),
  thickness: z
    .strictObject({
      value: z.number().positive().min(0.001).max(100_000),
      unit: z.enum(['mil', 'µm', 'mm', 'in']),
      film: z.enum(['wet', 'dry']),
    })
    .refine((thickness) => valueIn(thickness, 'm') <= 1, { path: ['value'], error: 'No course is a meter thick.' })
    .nullable(),
  spreadRate: z.strictObject({ value: z.number().positive().min(0.001).max(100_000), unit: z.enum(['ft²/gal', 'm²/L']) }).nullable(),
  /** Sand in the pail: mass per volume of mixed liquid resin. */
  filler: z.strictObject({ productId: z.string(), loading: amount('density', { value: 100, unit: 'kg/L' }) }).nullable(),
  /** Sand thrown on the wet film: mass per area. */
  broadcast: z
    .strictObject({ productId: z.string(), rate: amount('consumption', { value: 10_000, unit: 'kg/m²' }), toRefusal: z.boolean() })
    .nullable(),
  preparation: preparationSchema.nullable(),
  /** Hours from the start of the floor's first course to the start of this one; null: as soon as the course beneath allows. */
  startsAfter: z.number().min(0).max(8760).nullable(),
  note: z.string().trim().max(2000),
})
export type Course = z.infer<typeof courseSchema>

/** What the floor is laid under. */
export const conditionsSchema = z.strictObject({
  slabTemperature: temperature,
  airTemperature: temperature,
  /** Of the air, per cent. */
  relativeHumidity: z.number().min(1).max(100),
  /** Measured in the slab (ASTM F2170), per cent; null: not measured. */
  substrateRelativeHumidity: z.number().min(0).max(100).nullable(),
  /** Calcium-chloride rate (ASTM F1869); null: not measured. */
  moistureEmission: measured('emission')
    .refine(({ value }) => value >= 0, { error: 'Give the emission rate, not below nothing.' })
    .nullable(),
  /** Place whose VOC rules are asked for; null: none chosen. */
  vocPlace: z.string().nullable(),
})
export type Conditions = z.infer<typeof conditionsSchema>

/** Everything `evaluate` needs: the courses bottom up, the facts they rest on, the conditions and the day of reckoning. */
export const evaluationInputSchema = z.object({
  courses: z.array(courseSchema).max(60),
  mixes: z.record(z.string(), mixFactsSchema),
  /** Aggregates and fillers by id. */
  products: z.record(z.string(), productFactsSchema),
  conditions: conditionsSchema,
  /** ISO date on which ages and dated limits are judged. */
  onDate: z.string(),
  /** The firm's limit on the age of a safety sheet, years. */
  sheetAgeLimitYears: z.number().positive(),
})
export type EvaluationInput = z.infer<typeof evaluationInputSchema>
