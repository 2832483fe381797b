import { type Quantity, valueIn } from './units.ts'

/**
 * Rule of thumb: pot life halves for every 10 °C. t₀ × 0.5^((T − T₀) ÷ 10). For cross-checking a sheet's own table; never shown as a pot life,
 * which comes from `valueAt` of the sheet's table and nowhere beyond it.
 * Source: UFGS 09 97 (US government guide specification). Holds for small masses at constant temperature: a full pail is shorter still.
 */
export function halvedPotLife<Q extends Quantity>(known: Q, { from, to }: { from: Quantity; to: Quantity }): Q {
  return { ...known, value: known.value * 0.5 ** ((valueIn(to, '°C') - valueIn(from, '°C')) / 10) }
}
