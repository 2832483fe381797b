import type { Loss } from './job.ts'
import { type Quantity, convert, quantity, valueIn } from './units.ts'

/**
 * Film and spread. A volume over an area is a thickness: 1 gal over 1 ft² is 231 in³ ÷ 144 in² = 1604.17 mil.
 * Source: definitions of gallon, foot and mil; check values in tests/reference/film.test.ts.
 */

export type Film = Quantity<'mil'> | Quantity<'µm'> | Quantity<'mm'> | Quantity<'in'>
export type Spread = Quantity<'ft²/gal'> | Quantity<'m²/L'>

const fraction = (percent: Quantity<'%'>) => percent.value / 100

/** Wet film of a spread rate: 1604.17 ÷ ft²/gal in mil; 1000 ÷ m²/L in µm. */
export function wetFilmOfSpread(spread: Spread): Quantity<'mil' | 'µm'> {
  const metres = 1 / (valueIn(spread, 'm²/L') * 1000)
  return convert(quantity(metres, 'm'), spread.unit === 'ft²/gal' ? 'mil' : 'µm')
}

/** Spread rate that leaves a wet film: the inverse of `wetFilmOfSpread`. */
export function spreadOfWetFilm(film: Film): Spread {
  const perLitre = quantity(1 / (valueIn(film, 'm') * 1000), 'm²/L')
  return film.unit === 'mil' || film.unit === 'in' ? convert(perLitre, 'ft²/gal') : perLitre
}

/** Dry film left by a wet one: wet × volume solids. */
export function dryFilmOfWet<F extends Film>(wet: F, volumeSolids: Quantity<'%'>): F {
  return { ...wet, value: wet.value * fraction(volumeSolids) }
}

/** Wet film that leaves a dry one: dry × (1 + thinner by volume) ÷ volume solids. `thinning` is volume of thinner per volume of coating. */
export function wetFilmOfDry<F extends Film>(
  dry: F,
  { volumeSolids, thinning = 0 }: { volumeSolids: Quantity<'%'>; thinning?: number },
): F {
  return { ...dry, value: (dry.value * (1 + thinning)) / fraction(volumeSolids) }
}

/** Theoretical spread rate of a dry film: 1604.17 × volume solids ÷ mil in ft²/gal; 1000 × volume solids ÷ µm in m²/L. Thinner counts into the volume. */
export function spreadOfDryFilm(dry: Film, given: { volumeSolids: Quantity<'%'>; thinning?: number }): Spread {
  return spreadOfWetFilm(wetFilmOfDry(dry, given))
}

/** Practical spread rate: what the floor gets per volume ordered. `lost`: theoretical × (1 − loss); `added`: theoretical ÷ (1 + loss). */
export function practicalSpread<S extends Spread>(theoretical: S, loss: Loss): S {
  return { ...theoretical, value: theoretical.value / withLoss(1, loss) }
}

/** Dry film reached: volume used × volume solids ÷ area. */
export function dryFilmUsed({
  volume,
  area,
  volumeSolids,
}: {
  volume: Quantity
  area: Quantity
  volumeSolids: Quantity<'%'>
}): Quantity<'µm'> {
  return quantity((valueIn(volume, 'm³') * fraction(volumeSolids) * 1e6) / valueIn(area, 'm²'), 'µm')
}

/** Volume that fills an area to a wet thickness, before loss. */
export function volumeOfFilm({ area, film }: { area: Quantity; film: Quantity }): Quantity<'m³'> {
  return quantity(valueIn(area, 'm²') * valueIn(film, 'm'), 'm³')
}

/**
 * Volume to order for a volume on the floor. `lost`: a fraction of what is ordered never reaches the floor, so divide by 1 − loss;
 * `added`: an addition on top, so multiply by 1 + loss. 20 % lost is × 1.25, 20 % added is × 1.20.
 */
export function withLoss(net: number, loss: Loss): number {
  const share = loss.percent / 100
  return loss.convention === 'lost' ? net / (1 - share) : net * (1 + share)
}
