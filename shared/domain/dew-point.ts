import { type Quantity, convert, quantity, valueIn } from './units.ts'

/**
 * Magnus constants over water and over ice. Source: WMO No. 8, Annex 4.B (Sonntag 1990), from memory.
 * Against psychrolib (ASHRAE 2017) within 0.04 °C from 1 to 45 °C: tests/reference/dew-point.test.ts.
 */
const overWater = { a: 17.62, b: 243.12 }
const overIce = { a: 22.46, b: 272.62 }

interface Air {
  temperature: Quantity
  /** Per cent. */
  relativeHumidity: number
}

/** ln of the vapour pressure over that at 0 °C over water: the quantity both points share. */
function vapour({ temperature, relativeHumidity }: Air): number {
  const t = valueIn(temperature, '°C')
  return Math.log(relativeHumidity / 100) + (overWater.a * t) / (overWater.b + t)
}

/** Dew point over water, °C: Td = b γ ÷ (a − γ), γ = ln(RH/100) + a T ÷ (b + T). Below 0 °C this is not the frost point. */
export function dewPoint(air: Air): Quantity<'°C'> {
  const gamma = vapour(air)
  return quantity((overWater.b * gamma) / (overWater.a - gamma), '°C')
}

/** Frost point over ice, °C, of air whose dew point is below 0 °C: half a kelvin above the dew point at 5 °C and 50 %. */
export function frostPoint(air: Air): Quantity<'°C'> {
  const gamma = vapour(air)
  return quantity((overIce.b * gamma) / (overIce.a - gamma), '°C')
}

/** Where water first settles on a cooling surface: as dew, or below 0 °C as frost, which comes half a kelvin before dew would. */
export function condensationPoint(air: Air): { at: Quantity<'°C'>; name: 'dew point' | 'frost point' } {
  const dew = dewPoint(air)
  return dew.value >= 0 ? { at: dew, name: 'dew point' } : { at: frostPoint(air), name: 'frost point' }
}

/**
 * Magnus constants of other sources move the dew point by up to 0.06 °C (reference values in tests/reference/dew-point.test.ts): a margin within this
 * of its limit is neither kept nor missed, whatever the last digit says. The instruments' error is larger still; see `marginBounds`.
 */
export const greyBand = quantity(0.1, 'Δ°C')

/** Slab above the dew point (below 0 °C: above the frost point), as a difference in the unit asked for: 5 Δ°F is 2.78 Δ°C. */
export function dewPointMargin<U extends 'Δ°F' | 'Δ°C'>(slab: Quantity, air: Air, unit: U): Quantity<U> {
  return convert(quantity(valueIn(slab, '°C') - condensationPoint(air).at.value, 'Δ°C'), unit)
}

/** Highest humidity of the air that still leaves a margin between slab and dew (or frost) point, per cent. Above 100: any humidity does. */
export function highestHumidity({
  slab,
  air,
  margin,
}: {
  slab: Quantity
  air: Quantity
  margin: Quantity<'Δ°F'> | Quantity<'Δ°C'>
}): number {
  const t = valueIn(air, '°C')
  const td = valueIn(slab, '°C') - valueIn(margin, 'Δ°C')
  const over = td >= 0 ? overWater : overIce
  return 100 * Math.exp((over.a * td) / (over.b + td) - (overWater.a * t) / (overWater.b + t))
}

/** Common instruments: ±0.5 °C on either thermometer, ±3 % RH. Common practice; the instrument's own sheet decides. */
const commonInstruments = { temperature: quantity(0.5, 'Δ°C'), relativeHumidity: 3 }

/**
 * The least and the greatest margin that the readings allow, given the instruments' errors: slab low and air warm and moist, and the reverse.
 * Difference in Δ°C.
 */
export function marginBounds(
  slab: Quantity,
  air: Air,
  instruments = commonInstruments,
): { least: Quantity<'Δ°C'>; greatest: Quantity<'Δ°C'> } {
  const error = instruments.temperature.value
  const shifted = (sign: 1 | -1) => {
    const humidity = Math.min(100, Math.max(1, air.relativeHumidity - sign * instruments.relativeHumidity))
    const airAt = quantity(valueIn(air.temperature, '°C') - sign * error, '°C')
    return dewPointMargin(quantity(valueIn(slab, '°C') + sign * error, '°C'), { temperature: airAt, relativeHumidity: humidity }, 'Δ°C')
  }
  return { least: shifted(-1), greatest: shifted(1) }
}
