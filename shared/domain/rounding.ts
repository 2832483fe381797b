/**
 * Rounds half to even at a number of decimals: the rounding of every figure that is shown.
 * A tie is judged within one part in 10¹², so that 2.675, which a computer keeps as 2.67499…, is a tie too.
 */
export function roundHalfEven(value: number, decimals: number): number {
  const scale = 10 ** decimals
  const scaled = value * scale
  const floor = Math.floor(scaled)
  const rest = scaled - floor
  const tolerance = 1e-12 * Math.max(1, Math.abs(scaled))
  if (Math.abs(rest - 0.5) <= tolerance) return (floor % 2 === 0 ? floor : floor + 1) / scale
  return Math.round(scaled) / scale
}

/**
 * Rounds up to whole pieces: the rounding of everything that is ordered.
 * What is above a whole number by less than 10⁻⁹ is that number, so that exactly 60.000 gal is 20 kits of 3 gal and not 21.
 */
export function wholeUp(value: number): number {
  return Math.ceil(value - 1e-9) + 0
}

/** Decimals that show a positive number to at least three significant digits, at most four decimals, none from 100 on. */
export function decimalsFor(value: number): number {
  const size = Math.abs(value)
  if (size === 0) return 0
  return Math.min(4, Math.max(0, 2 - Math.floor(Math.log10(size))))
}
