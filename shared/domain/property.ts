import * as z from 'zod'
import { type Dimension, dimensionOf, units } from './units.ts'

/** How a property's value is written down. See the value schemas below. */
export type ValueForm = 'quantity' | 'ratio' | 'window' | 'codes' | 'substance' | 'text' | 'date' | 'flag'

interface PropertyDefinition {
  readonly label: string
  readonly form: ValueForm
  /** Which sheet states it; `firm` is never on a sheet: the firm enters it. */
  readonly source: 'data' | 'safety' | 'both' | 'firm'
  readonly dimensions?: readonly Dimension[]
  /** Several facts may stand side by side (table cells, packs, ingredients). */
  readonly repeats?: true
  /** Stated of one component (A, B, C) as well as of the mix. */
  readonly byPart?: true
}

/** Every property a sheet may state or a person may enter, in the order shown on a record page. */
export const properties = {
  productName: { label: 'Product name', form: 'text', source: 'both' },
  revisionDate: { label: 'Revision date', form: 'date', source: 'both' },
  mixRatio: { label: 'Mix ratio', form: 'ratio', source: 'data', repeats: true },
  splitKit: { label: 'Part kits allowed', form: 'flag', source: 'data' },
  packSize: { label: 'Pack size', form: 'quantity', source: 'data', dimensions: ['volume', 'mass'], repeats: true, byPart: true },
  density: { label: 'Density', form: 'quantity', source: 'both', dimensions: ['density'], byPart: true },
  viscosity: { label: 'Viscosity', form: 'quantity', source: 'data', dimensions: ['viscosity'], repeats: true, byPart: true },
  volumeSolids: { label: 'Solids by volume', form: 'quantity', source: 'data', dimensions: ['fraction'], byPart: true },
  weightSolids: { label: 'Solids by weight', form: 'quantity', source: 'data', dimensions: ['fraction'], byPart: true },
  voc: { label: 'VOC', form: 'quantity', source: 'both', dimensions: ['density'], repeats: true, byPart: true },
  inductionTime: { label: 'Induction time', form: 'quantity', source: 'data', dimensions: ['time'], repeats: true },
  potLife: { label: 'Pot life', form: 'quantity', source: 'data', dimensions: ['time'], repeats: true },
  workingTime: { label: 'Working time on the floor', form: 'quantity', source: 'data', dimensions: ['time'], repeats: true },
  recoatWindow: { label: 'Recoat window', form: 'window', source: 'data', dimensions: ['time'], repeats: true },
  tackFree: { label: 'Tack-free', form: 'quantity', source: 'data', dimensions: ['time'], repeats: true },
  footTraffic: { label: 'Foot traffic', form: 'quantity', source: 'data', dimensions: ['time'], repeats: true },
  vehicleTraffic: { label: 'Vehicle traffic', form: 'quantity', source: 'data', dimensions: ['time'], repeats: true },
  fullCure: { label: 'Full cure', form: 'quantity', source: 'data', dimensions: ['time'], repeats: true },
  filmThickness: { label: 'Film thickness per coat', form: 'quantity', source: 'data', dimensions: ['length'], repeats: true },
  spreadRate: { label: 'Spread rate', form: 'quantity', source: 'data', dimensions: ['spread'], repeats: true },
  consumption: { label: 'Consumption', form: 'quantity', source: 'data', dimensions: ['consumption'], repeats: true },
  applicationTemperature: {
    label: 'Application temperature',
    form: 'quantity',
    source: 'data',
    dimensions: ['temperature'],
    repeats: true,
  },
  maxRelativeHumidity: { label: 'Relative humidity of the air', form: 'quantity', source: 'data', dimensions: ['fraction'] },
  dewPointMargin: { label: 'Slab above dew point', form: 'quantity', source: 'data', dimensions: ['temperatureDifference'] },
  substrateRelativeHumidity: {
    label: 'Relative humidity in the slab',
    form: 'quantity',
    source: 'data',
    dimensions: ['fraction'],
    repeats: true,
  },
  moistureEmission: { label: 'Moisture emission rate', form: 'quantity', source: 'data', dimensions: ['emission'], repeats: true },
  surfaceProfile: { label: 'Surface profile', form: 'quantity', source: 'data', dimensions: ['profile'] },
  pullOffStrength: { label: 'Pull-off strength', form: 'quantity', source: 'data', dimensions: ['pressure'] },
  shelfLife: { label: 'Shelf life', form: 'quantity', source: 'data', dimensions: ['calendar', 'time'], byPart: true },
  storageTemperature: { label: 'Storage temperature', form: 'quantity', source: 'data', dimensions: ['temperature'] },
  emergencyPhone: { label: 'Emergency telephone', form: 'text', source: 'safety' },
  signalWord: { label: 'Signal word', form: 'text', source: 'safety', byPart: true },
  hazardStatements: { label: 'Hazard statements', form: 'codes', source: 'safety', byPart: true },
  supplementalStatements: { label: 'Supplemental statements', form: 'codes', source: 'safety', byPart: true },
  precautionaryStatements: { label: 'Precautionary statements', form: 'codes', source: 'safety', byPart: true },
  ingredient: { label: 'Ingredient', form: 'substance', source: 'safety', repeats: true, byPart: true },
  flashPoint: { label: 'Flash point', form: 'quantity', source: 'safety', dimensions: ['temperature'], byPart: true },
  gloves: { label: 'Gloves', form: 'text', source: 'safety', byPart: true },
  eyeProtection: { label: 'Eye protection', form: 'text', source: 'safety', byPart: true },
  respiratoryProtection: { label: 'Respiratory protection', form: 'text', source: 'safety', byPart: true },
  unNumber: { label: 'UN number', form: 'text', source: 'safety' },
  properShippingName: { label: 'Proper shipping name', form: 'text', source: 'safety' },
  transportClass: { label: 'Transport class', form: 'text', source: 'safety' },
  packingGroup: { label: 'Packing group', form: 'text', source: 'safety' },
  packPrice: { label: 'Price per pack', form: 'quantity', source: 'firm', dimensions: ['money'], repeats: true },
} as const satisfies Record<string, PropertyDefinition>

export type Property = keyof typeof properties
export const propertyNames = Object.keys(properties) as [Property, ...Property[]]
export const propertySchema = z.enum(propertyNames)

/** The definition of a property, with its optional fields present in the type. */
export function definitionOf(property: Property): PropertyDefinition {
  return properties[property]
}

export const unitSchema = z.enum(units)
const finite = z.number('This is not a number.').min(-1e9, 'This is too small.').max(1e9, 'This is too large.')
/** Words of a sheet or a person: line breaks, but no other control characters and no broken characters. */
const words = (most: number) =>
  z
    .string('Write this as text.')
    .trim()
    .max(most, `At most ${most.toLocaleString('en-US')} characters.`)
    // eslint-disable-next-line no-control-regex -- control characters are what this refuses
    .regex(/^[^\u0000-\u0008\u000b\u000c\u000e-\u001f\u007f\p{Cs}]*$/u, 'Control characters are not accepted.')
const someWords = (most: number) => words(most).min(1, 'This cannot be empty.')

/** A quantity as written: both ends equal for a single figure, one end alone for a bound. */
export const rangeSchema = z
  .strictObject({ min: finite.optional(), max: finite.optional(), unit: unitSchema })
  .refine((range) => range.min !== undefined || range.max !== undefined, { error: 'Write a figure.' })
  .refine((range) => range.min === undefined || range.max === undefined || range.min <= range.max, {
    error: 'The least value is above the greatest.',
  })
export type Range = z.infer<typeof rangeSchema>

export const quantitySchema = z.strictObject({ value: finite, unit: unitSchema })

export const ratioSchema = z.strictObject({
  /** Parts in the order A, B, C. */
  parts: z
    .array(z.number('This is not a number.').positive('Parts of a ratio are above 0.').max(10_000, 'This is too large.'))
    .min(2, 'Write the ratio as 2 : 1, or 4 : 1 : 6.')
    .max(3, 'A ratio has at most three parts.'),
  basis: z.enum(['volume', 'weight']).optional(),
})
export type Ratio = z.infer<typeof ratioSchema>

const codeSchema = z.string().regex(/^(EU)?[HP]\d{3}[A-Za-z]{0,2}(\+[HP]\d{3})*$/, 'Codes look like H315, EUH208 or P305+P351+P338.')
const codesSchema = z.strictObject({ codes: z.array(codeSchema).min(1, 'Write at least one code.').max(60, 'At most 60 codes.') })
const percent = z.number('This is not a number.').min(0, 'A share is not below 0 %.').max(100, 'A share is not above 100 %.')
const substanceSchema = z.strictObject({
  name: someWords(200),
  cas: z
    .string()
    .regex(/^\d{2,7}-\d{2}-\d$/, 'A CAS number looks like 100-51-6.')
    .optional(),
  min: percent.optional(),
  max: percent.optional(),
  unit: z.literal('%'),
})
export type Substance = z.infer<typeof substanceSchema>
const textSchema = z.strictObject({ text: someWords(2000) })
const dateSchema = z.strictObject({
  date: z.string().regex(/^\d{4}(-(0[1-9]|1[0-2])(-(0[1-9]|[12]\d|3[01]))?)?$/, 'Write the date as 2024-03-18, 2024-03 or 2024.'),
})
const flagSchema = z.strictObject({ is: z.boolean() })

export const valueSchema = z.union([rangeSchema, ratioSchema, codesSchema, substanceSchema, textSchema, dateSchema, flagSchema])
export type PropertyValue = z.infer<typeof valueSchema>

/** The schema of a value by its form. */
export const valueSchemas: Record<ValueForm, z.ZodType<PropertyValue>> = {
  quantity: rangeSchema,
  window: rangeSchema,
  ratio: ratioSchema,
  codes: codesSchema,
  substance: substanceSchema,
  text: textSchema,
  date: dateSchema,
  flag: flagSchema,
}

/** The conditions a value holds at: a table cell's temperature, a pot life's mass, the film a spread rate belongs to. */
export const conditionsSchema = z.strictObject({
  temperature: quantitySchema.optional(),
  mass: quantitySchema.optional(),
  volume: quantitySchema.optional(),
  relativeHumidity: quantitySchema.optional(),
  film: quantitySchema.optional(),
  next: words(200).optional(),
})
export type ValueConditions = z.infer<typeof conditionsSchema>

export const partSchema = z.enum(['mixed', 'A', 'B', 'C'])

/** What is said, before where it was said: the property, of which part, its value and conditions. */
export const statementSchema = z.strictObject({
  property: propertySchema,
  part: partSchema.default('mixed'),
  value: valueSchema,
  at: conditionsSchema.optional(),
  /** Of a film thickness: measured wet or dry. */
  film: z.enum(['wet', 'dry']).optional(),
  /** Of an application temperature: what it is asked of. */
  of: z.enum(['air', 'slab', 'material']).optional(),
  /** Of a VOC content: with the thinner that the sheet allows. */
  thinned: z.boolean().optional(),
})
export type Statement = z.infer<typeof statementSchema>

/** What is wrong with a value for its property, or undefined. Units must measure what the property is. */
export function valueProblem(property: Property, value: unknown): string | undefined {
  const { form, dimensions } = definitionOf(property)
  const parsed = valueSchemas[form].safeParse(value)
  if (!parsed.success) return parsed.error.issues[0]?.message ?? 'The value is not of the right form.'
  if (!dimensions) return undefined
  const unit = (parsed.data as Range).unit
  return dimensions.includes(dimensionOf(unit)) ? undefined : `${unit} is not a unit of ${properties[property].label.toLowerCase()}.`
}
