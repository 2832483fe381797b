import type { EvaluationInput } from './build-up.ts'
import { type Fact, rangeOf } from './fact.ts'
import type { MixFacts } from './mix.ts'
import type { ProductFacts } from './product.ts'
import { type Property, type Range, type ValueConditions, type ValueForm, definitionOf } from './property.ts'
import { type Dimension, dimensionOf, valueIn } from './units.ts'

/** The one key that tells a value's form from the others. */
const keyOf: Record<ValueForm, string> = {
  quantity: 'unit',
  window: 'unit',
  ratio: 'parts',
  codes: 'codes',
  substance: 'name',
  text: 'text',
  date: 'date',
  flag: 'is',
}

const conditionDimensions: Record<Exclude<keyof ValueConditions, 'next'>, Dimension> = {
  temperature: 'temperature',
  mass: 'mass',
  volume: 'volume',
  relativeHumidity: 'fraction',
  film: 'length',
}

const conditionEntries = Object.entries(conditionDimensions) as [keyof typeof conditionDimensions, Dimension][]

/** What no thing of this world has, by property and in a unit: solids of nothing, a density beyond that of metals. From memory. */
const possible: Partial<Record<Property, Range>> = {
  density: { min: 0.01, max: 23, unit: 'kg/L' },
  voc: { min: 0, max: 23, unit: 'kg/L' },
  volumeSolids: { min: 0.1, max: 100, unit: '%' },
  weightSolids: { min: 0, max: 100, unit: '%' },
  substrateRelativeHumidity: { min: 0, max: 100, unit: '%' },
  maxRelativeHumidity: { min: 0, max: 100, unit: '%' },
  surfaceProfile: { min: 1, max: 10, unit: 'CSP' },
  spreadRate: { min: 1e-6, unit: 'm²/L' },
}

/** Hours: a century and more, longer than any floor. */
const longest = 1e6

/** True when every end of a range lies where the property can lie; only temperatures go below nothing. */
function isPossible(property: Property, range: Range): boolean {
  const limits = possible[property]
  const signed = dimensionOf(range.unit) === 'temperature'
  return [range.min, range.max].every((end) => {
    if (end === undefined) return true
    if (signed) return valueIn({ value: end, unit: range.unit }, '°C') > -273.15
    if (dimensionOf(range.unit) === 'time' && valueIn({ value: end, unit: range.unit }, 'h') > longest) return false
    if (!limits) return end >= 0
    const value = valueIn({ value: end, unit: range.unit }, limits.unit)
    return value >= (limits.min ?? -Infinity) * (1 - 1e-12) && value <= (limits.max ?? Infinity) * (1 + 1e-12)
  })
}

function holdsAtSoundConditions(at: ValueConditions | undefined): boolean {
  if (!at) return true
  return conditionEntries.every(([key, dimension]) => {
    const given = at[key]
    if (!given) return true
    if (dimensionOf(given.unit) !== dimension) return false
    return dimension === 'temperature' ? valueIn(given, '°C') > -273.15 : given.value >= 0
  })
}

/** True when a fact can be read as what it claims to be: value of the property's form, in its units, within what is possible. */
function isSound(fact: Fact): boolean {
  const { form, dimensions } = definitionOf(fact.property)
  if (!(keyOf[form] in fact.value) || (form !== 'substance' && 'name' in fact.value)) return false
  if (!holdsAtSoundConditions(fact.at)) return false
  const range = form === 'quantity' || form === 'window' ? rangeOf(fact) : undefined
  if (!range) return true
  return (dimensions ?? []).includes(dimensionOf(range.unit)) && isPossible(fact.property, range)
}

function withSoundFacts<T extends { facts: Fact[] }>(of: T): T {
  return of.facts.every(isSound) ? of : { ...of, facts: of.facts.filter(isSound) }
}

function soundMix(mix: MixFacts): MixFacts {
  return { ...withSoundFacts(mix), parts: mix.parts.map(({ part, product }) => ({ part, product: withSoundFacts(product) })) }
}

/** Without a prototype, so that an id like "constructor" finds nothing. */
function mapped<T>(record: Readonly<Record<string, T>>, make: (one: T) => T): Record<string, T> {
  const made = Object.create(null) as Record<string, T>
  for (const [id, one] of Object.entries(record)) made[id] = make(one)
  return made
}

/**
 * The same floor without facts that cannot be what they claim (a film in hours, solids of 140 %): what they say of the property is not known.
 * Such facts are refused when they are written down; this holds for whatever came in some other way.
 */
export function withoutUnsoundFacts(input: EvaluationInput): EvaluationInput {
  return { ...input, mixes: mapped(input.mixes, soundMix), products: mapped(input.products, withSoundFacts<ProductFacts>) }
}
