import type { Figure } from './figure.ts'
import { workingFacts, type MixFacts } from './mix.ts'
import { valueAt } from './sheet-table.ts'
import { type Quantity, valueIn } from './units.ts'

/**
 * Pot life of a mix at a temperature, from its own sheet and nowhere beyond it. It holds for the mass that the sheet states: a full pail is
 * shorter by an amount that no sheet gives.
 */
export function potLifeAt(mix: MixFacts, temperature: Quantity): Figure {
  return valueAt(workingFacts(mix), { property: 'potLife', temperature, mix })
}

/**
 * Rule of thumb: pot life halves for every 10 °C. t₀ × 0.5^((T − T₀) ÷ 10). For cross-checking a sheet's table only; never shown as a pot life.
 * Source: UFGS 09 97 (US government guide specification). Holds for small masses at constant temperature.
 */
export function halvedPotLife<Q extends Quantity>(known: Q, { from, to }: { from: Quantity; to: Quantity }): Q {
  return { ...known, value: known.value * 0.5 ** ((valueIn(to, '°C') - valueIn(from, '°C')) / 10) }
}
