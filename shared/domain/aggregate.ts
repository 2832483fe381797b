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

/**
 * Volume that a mortar takes on the floor: the greater of its absolute volume (resin + grains) and its sand packed by itself. Where the sand governs,
 * the resin does not fill the voids and air stays in. Source: absolute volumes; ASTM C29 terms.
 */
export function mortarVolume({
  resin,
  sand,
  grainDensity,
  bulkDensity,
}: {
  resin: Quantity
  sand: Quantity
  grainDensity: Quantity
  bulkDensity: Quantity
}) {
  const absolute = valueIn(resin, 'm³') + absoluteVolume(sand, grainDensity).value
  const packed = valueIn(sand, 'kg') / valueIn(bulkDensity, 'g/L')
  return { volume: quantity(Math.max(absolute, packed), 'm³'), sandGoverns: packed > absolute }
}

/** Mass of sand on an area covered to a height by a heap's density: what a broadcast of that height holds, packed. */
export function packedOnArea(height: Quantity, bulkDensity: Quantity): Quantity<'kg/m²'> {
  return quantity(valueIn(height, 'm') * valueIn(bulkDensity, 'g/L'), 'kg/m²')
}
