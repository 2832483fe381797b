import { type Quantity, convert, quantity, valueIn } from './units.ts'
import { wholeUp } from './rounding.ts'

/**
 * Moisture emission rate: mass gained ÷ (area × time); 52.911 × g ÷ (ft² × h) in lb/1000 ft²·24 h. The area is the one under the dome.
 * Source: ASTM F1869, formula from memory.
 */
export function moistureEmissionRate<U extends 'lb/1000 ft²·24 h' | 'g/m²·24 h'>(
  { gain, area, time }: { gain: Quantity; area: Quantity; time: Quantity },
  unit: U,
): Quantity<U> {
  const perDay = valueIn(gain, 'g') / (valueIn(area, 'm²') * valueIn(time, 'd'))
  return convert(quantity(perDay, 'g/m²·24 h'), unit)
}

/** Depth of a humidity probe: 40 % of the slab drying from one side, 20 % from both. Source: ASTM F2170. */
export function probeDepth<U extends 'in' | 'mm' | 'ft' | 'm'>(slab: Quantity<U>, drying: 'one side' | 'both sides'): Quantity<U> {
  return { ...slab, value: slab.value * (drying === 'one side' ? 0.4 : 0.2) }
}

/** Tests a floor needs: three for the first 1,000 ft² and one for each further 1,000 ft² begun. Source: ASTM F1869, F2170. */
export function moistureTestsNeeded(area: Quantity): number {
  return 3 + wholeUp(Math.max(0, valueIn(area, 'ft²') - 1000) / 1000)
}
