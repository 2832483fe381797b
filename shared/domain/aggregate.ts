import { type Quantity, quantity, valueIn } from './units.ts'

/** Absolute volume of grains: mass ÷ density of the grain itself, not of the heap. Source: ASTM C29 terms. */
export function absoluteVolume(mass: Quantity, grainDensity: Quantity): Quantity<'m³'> {
  return quantity(valueIn(mass, 'kg') / valueIn(grainDensity, 'g/L'), 'm³')
}

/** Voids between the grains, fraction of the heap: (S W − B) ÷ (S W), W = 998 kg/m³. Source: ASTM C29. */
export function voidsOf({ specificGravity, bulkDensity }: { specificGravity: number; bulkDensity: Quantity }): number {
  const solid = specificGravity * 998
  return (solid - valueIn(bulkDensity, 'g/L')) / solid
}

/**
 * Volume of filled mix per volume of liquid resin: 1 + loading ÷ grain density. `loading` is mass of sand per volume of liquid.
 * Holds while the resin fills the voids; see `voidsOf`.
 */
export function yieldPerLiquid(loading: Quantity, grainDensity: Quantity): number {
  return 1 + valueIn(loading, 'g/L') / valueIn(grainDensity, 'g/L')
}
