import * as z from 'zod'
import { isCasNumber } from './cas.ts'
import { unitText } from './format.ts'
import {
  type Property,
  type PropertyValue,
  type Range,
  type Statement,
  type Substance,
  type ValueConditions,
  definitionOf,
  statementSchema,
  valueSchemas,
} from './property.ts'
import { type Dimension, type Quantity, dimensionOf, unitsOf, valueIn } from './units.ts'

/** A statement whose value has not been held against its property's form yet. */
export const looseStatementSchema = statementSchema.extend({
  value: z.unknown().describe('By the form of the property: quantity, window, ratio, codes, substance, text, date or flag.'),
})
export type LooseStatement = z.output<typeof looseStatementSchema>

/** What is wrong with a statement and at which of its fields. */
export interface StatementProblem {
  path: (string | number)[]
  message: string
}

/** What each condition is measured in. */
export const conditionDimensions = {
  temperature: 'temperature',
  mass: 'mass',
  volume: 'volume',
  relativeHumidity: 'fraction',
  film: 'length',
} as const satisfies Record<Exclude<keyof ValueConditions, 'next'>, Dimension>

/** Properties that nothing of this world has none of. */
const aboveNothing = new Set<Property>(['density', 'packSize', 'spreadRate', 'consumption', 'shelfLife', 'potLife', 'filmThickness'])
/** −273.15 °C, exact by definition of the kelvin scale (SI Brochure, 9th edition, 2.3.1). */
const absoluteZero = -273.15

/** Why a quantity cannot be: below nothing, above the whole, outside the classes of profile, colder than cold can be. */
function impossible(quantity: Quantity, property?: Property): string | undefined {
  const { value, unit } = quantity
  switch (dimensionOf(unit)) {
    case 'temperature':
      return valueIn(quantity, '°C') > absoluteZero ? undefined : 'Nothing is as cold as that.'
    case 'fraction':
      return value >= 0 && value <= 100 ? undefined : 'A share lies between 0 % and 100 %.'
    case 'profile':
      return value >= 1 && value <= 10 ? undefined : 'Profiles run from CSP 1 to CSP 10.'
    default:
      if (value < 0) return 'This cannot be below 0.'
      return value === 0 && property && aboveNothing.has(property) ? 'This cannot be 0. What is not known is left out.' : undefined
  }
}

function rangeProblems(property: Property, range: Range): StatementProblem[] {
  const { dimensions = [], label } = definitionOf(property)
  if (!dimensions.includes(dimensionOf(range.unit))) {
    return [{ path: ['value', 'unit'], message: `${unitText(range.unit)} is not a unit of ${label.toLowerCase()}.` }]
  }
  return (['min', 'max'] as const).flatMap((end) => {
    const value = range[end]
    const message = value === undefined ? undefined : impossible({ value, unit: range.unit }, property)
    return message ? [{ path: ['value', end], message }] : []
  })
}

function substanceProblems({ cas, min, max }: Substance): StatementProblem[] {
  return [
    ...(cas !== undefined && !isCasNumber(cas)
      ? [{ path: ['value', 'cas'], message: 'This CAS number is not right: its check digit does not fit.' }]
      : []),
    ...(min !== undefined && max !== undefined && min > max
      ? [{ path: ['value', 'min'], message: 'The least value is above the greatest.' }]
      : []),
  ]
}

/** The family of codes that a property holds. */
const families: Partial<Record<Property, { of: RegExp; message: string }>> = {
  hazardStatements: { of: /^H/, message: 'Hazard statements begin with H; EUH and P codes have properties of their own.' },
  supplementalStatements: { of: /^EUH/, message: 'Supplemental statements begin with EUH.' },
  precautionaryStatements: { of: /^P/, message: 'Precautionary statements begin with P.' },
}

function codeProblems(property: Property, codes: readonly string[]): StatementProblem[] {
  const family = families[property]
  const stray = codes.find((code) => family && !family.of.test(code))
  const twice = codes.find((code, index) => codes.indexOf(code) !== index)
  if (stray) return [{ path: ['value', 'codes'], message: `${stray}: ${family?.message ?? ''}` }]
  return twice ? [{ path: ['value', 'codes'], message: `${twice} stands here twice.` }] : []
}

/** Words that a standard sets. Source: UN GHS 1.4.10.5.2 (signal words), UN Model Regulations 2.0.1.3 (packing groups), 2.0.2.1 (UN numbers). */
const setWords: Partial<Record<Property, { of: RegExp; message: string }>> = {
  signalWord: { of: /^(Danger|Warning)$/, message: 'A signal word is Danger or Warning.' },
  unNumber: { of: /^UN\d{4}$/, message: 'A UN number looks like UN2735.' },
  packingGroup: { of: /^I{1,3}$/, message: 'A packing group is I, II or III.' },
}

/** True when the calendar has such a day. */
function isDay(date: string): boolean {
  if (date.length < 10) return true
  const [year = 0, month = 0, day = 0] = date.split('-').map(Number)
  const leap = (year % 4 === 0 && year % 100 !== 0) || year % 400 === 0
  return day <= ([31, leap ? 29 : 28, 31, 30, 31, 30, 31, 31, 30, 31, 30, 31][month - 1] ?? 0)
}

function valueProblems(property: Property, value: PropertyValue): StatementProblem[] {
  if ('codes' in value) return codeProblems(property, value.codes)
  if ('name' in value) return substanceProblems(value)
  if ('unit' in value) return rangeProblems(property, value)
  if ('date' in value) return isDay(value.date) ? [] : [{ path: ['value', 'date'], message: 'There is no such day.' }]
  const wanted = 'text' in value ? setWords[property] : undefined
  return wanted && 'text' in value && !wanted.of.test(value.text) ? [{ path: ['value', 'text'], message: wanted.message }] : []
}

function conditionProblems(at: ValueConditions): StatementProblem[] {
  return Object.entries(conditionDimensions).flatMap(([name, dimension]) => {
    const given = at[name as keyof typeof conditionDimensions]
    if (!given) return []
    const message =
      dimensionOf(given.unit) === dimension ? impossible(given) : `Give this in ${unitsOf(dimension).map(unitText).join(', ')}.`
    return message ? [{ path: ['at', name, 'value'], message }] : []
  })
}

/** What only some properties may say beside their value. */
function besideProblems({ property, part, film, of, thinned }: LooseStatement): StatementProblem[] {
  const { byPart, label } = definitionOf(property)
  return [
    ...(part !== 'mixed' && !byPart ? [{ path: ['part'], message: `${label} is said of the whole, not of one part.` }] : []),
    ...(film && property !== 'filmThickness' ? [{ path: ['film'], message: 'Only a film thickness is wet or dry.' }] : []),
    ...(of && property !== 'applicationTemperature'
      ? [{ path: ['of'], message: 'Only an application temperature is asked of air, slab or material.' }]
      : []),
    ...(thinned !== undefined && property !== 'voc' ? [{ path: ['thinned'], message: 'Only a VOC content is told as thinned.' }] : []),
  ]
}

/** Everything that is wrong with a statement, each with the field it is wrong at: form, units, what can be, conditions, part. */
export function statementProblems(statement: LooseStatement): StatementProblem[] {
  const parsed = valueSchemas[definitionOf(statement.property).form].safeParse(statement.value)
  const ofValue = parsed.success
    ? valueProblems(statement.property, parsed.data)
    : parsed.error.issues.map(({ path, message }) => ({ path: ['value', ...(path as (string | number)[])], message }))
  return [...ofValue, ...(statement.at ? conditionProblems(statement.at) : []), ...besideProblems(statement)]
}

/** The statement with its value as its form keeps it. Call it on a statement without problems. */
export function soundStatement(statement: LooseStatement): Statement {
  return { ...statement, value: valueSchemas[definitionOf(statement.property).form].parse(statement.value) }
}
