import { type Quantity, quantity, valueIn } from './units.ts'

/** VOC of what is mixed, per part. Masses in grams, volumes in litres. */
export interface VocPart {
  /** Volatile organic compounds, g, without water and exempt compounds. */
  voc: number
  volume: number
  water: number
  exempt: number
}

const total = (parts: readonly VocPart[], key: keyof VocPart) => parts.reduce((sum, part) => sum + part[key], 0)

/**
 * VOC content, g/L, less water and exempt compounds: Σ VOC ÷ (Σ V − Σ water − Σ exempt). Undefined where nothing else than water and exempt compounds is left.
 * The content of a mix is worked out from its masses, never averaged from the contents of its parts: those leave out water unlike by unlike.
 * Source: 40 CFR 59.406(a)(1), from memory.
 */
export function vocLessWater(parts: readonly VocPart[]): number | undefined {
  const left = total(parts, 'volume') - total(parts, 'water') - total(parts, 'exempt')
  return left > 0 ? total(parts, 'voc') / left : undefined
}

/** VOC content, g/L, of the whole: Σ VOC ÷ Σ V. Undefined for no volume. */
export function vocActual(parts: readonly VocPart[]): number | undefined {
  const volume = total(parts, 'volume')
  return volume > 0 ? total(parts, 'voc') / volume : undefined
}

/**
 * A part from what is weighed: volatiles of a volume, of which water and exempt compounds are no VOC. `exemptDensity` is that of the exempt compounds.
 * Source: the terms of 40 CFR 59.406(a)(1), from memory.
 */
export function vocPartOf(given: {
  volume: Quantity
  volatiles: Quantity
  water: Quantity
  exempt: { mass: Quantity; density: Quantity } | null
}): VocPart {
  const [water, exempt] = [valueIn(given.water, 'g'), given.exempt ? valueIn(given.exempt.mass, 'g') : 0]
  return {
    voc: valueIn(given.volatiles, 'g') - water - exempt,
    volume: valueIn(given.volume, 'L'),
    water: water / 1000,
    exempt: given.exempt ? exempt / valueIn(given.exempt.density, 'g/L') : 0,
  }
}

/**
 * VOC content with thinner: (content + thinner × its density) ÷ (1 + thinner), by volume of thinner per volume of coating. For a coating without water
 * or exempt compounds, and a thinner that is VOC through and through: the greatest thinning that the maker allows is what a rule asks about.
 */
export function vocThinned(content: Quantity, { thinner, density }: { thinner: Quantity<'%'>; density: Quantity }): Quantity<'g/L'> {
  const share = thinner.value / 100
  return quantity((valueIn(content, 'g/L') + share * valueIn(density, 'g/L')) / (1 + share), 'g/L')
}
