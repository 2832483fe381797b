/**
 * Mix ratios. `parts` are in the order A, B, C; densities in one unit, whichever, in the same order.
 * Source: conservation of mass; check values 5a–5d in tests/reference/ratio.test.ts.
 */

/** Shares that add up to 1. */
export function sharesOf(parts: readonly number[]): number[] {
  const total = parts.reduce((sum, part) => sum + part, 0)
  return parts.map((part) => part / total)
}

/** Parts by weight of a ratio by volume: each part times its density. */
export function weightOfVolume(parts: readonly number[], densities: readonly number[]): number[] {
  return parts.map((part, index) => part * (densities[index] ?? Number.NaN))
}

/** Parts by volume of a ratio by weight: each part over its density. */
export function volumeOfWeight(parts: readonly number[], densities: readonly number[]): number[] {
  return parts.map((part, index) => part / (densities[index] ?? Number.NaN))
}

/** Density of the mix from a ratio by volume: Σ part × density ÷ Σ part. Volumes are taken to add up. */
export function mixedDensity(volumeParts: readonly number[], densities: readonly number[]): number {
  const mass = weightOfVolume(volumeParts, densities).reduce((sum, part) => sum + part, 0)
  return mass / volumeParts.reduce((sum, part) => sum + part, 0)
}

/** The ratio scaled so that part A is 100: how a ratio by weight is quoted (100 : 43.4). */
export function perHundredOfA(parts: readonly number[]): number[] {
  const [a = 1] = parts
  return parts.map((part) => (part * 100) / a)
}

/** How far part B is off when it is measured as `given` instead of `wanted` (both per one of A), per cent of B. */
export function offRatioPercent(given: number, wanted: number): number {
  return (given / wanted - 1) * 100
}
