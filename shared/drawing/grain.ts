import type { ProductFacts } from '../domain/product.ts'
import { factOf, textOf } from '../domain/fact.ts'

/** Openings of U.S. standard sieves in micrometres by number. Source: ASTM E11 nominal openings (from memory, to be checked against a copy). */
const openings: Record<number, number> = {
  4: 4750,
  5: 4000,
  6: 3350,
  7: 2800,
  8: 2360,
  10: 2000,
  12: 1700,
  14: 1400,
  16: 1180,
  18: 1000,
  20: 850,
  25: 710,
  30: 600,
  35: 500,
  40: 425,
  45: 355,
  50: 300,
  60: 250,
  70: 212,
  80: 180,
  100: 150,
  120: 125,
  140: 106,
  170: 90,
  200: 75,
  230: 63,
  270: 53,
  325: 45,
  400: 38,
}

/** The opening of a sieve by number, between the standard ones by proportion of size × number. */
function openingOf(mesh: number): number | null {
  const known = openings[mesh]
  if (known !== undefined) return known
  const numbers = Object.keys(openings).map(Number)
  const below = numbers.filter((one) => one < mesh).at(-1)
  const above = numbers.find((one) => one > mesh)
  if (below === undefined || above === undefined) return null
  const share = Math.log(mesh / below) / Math.log(above / below)
  return (openings[below] ?? 0) * ((openings[above] ?? 0) / (openings[below] ?? 1)) ** share
}

/**
 * Grain size in micrometres as a name tells it: "40-mesh silica", "20/40 mesh", "0.3–0.8 mm". The middle of two sieves; null where no size is named.
 */
export function grainSizeIn(name: string): number | null {
  const range = /(\d+(?:\.\d+)?)\s*(?:-|–|to)\s*(\d+(?:\.\d+)?)\s*mm\b/i.exec(name)
  if (range) return ((Number(range[1]) + Number(range[2])) / 2) * 1000
  const single = /(\d+(?:\.\d+)?)\s*mm\b/i.exec(name)
  if (single) return Number(single[1]) * 1000
  const mesh = /#?(\d{1,3})(?:\s*(?:[-–/×x]|to)\s*#?(\d{1,3}))?[\s-]*mesh\b/i.exec(name)
  if (!mesh) return null
  const sizes = [mesh[1], mesh[2]].filter((one) => one !== undefined).map((one) => openingOf(Number(one)))
  return sizes.includes(null) ? null : (sizes as number[]).reduce((sum, one) => sum + one, 0) / sizes.length
}

/** Grain size of an aggregate from the name on its sheet or its name in the catalogue. */
export function grainSize(product: ProductFacts | undefined): number | null {
  if (!product) return null
  return grainSizeIn(textOf(factOf(product.facts, 'productName')) ?? '') ?? grainSizeIn(product.name)
}
