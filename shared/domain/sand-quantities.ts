import type { Figure } from './figure.ts'
import { formatRange } from './format.ts'
import type { Bay } from './job.ts'
import { type Quantity, quantity, valueIn } from './units.ts'
import { computed, mapRange, point, sourcesOf } from './working.ts'

/** Sand in the pail: liquid resin × loading; what is lost with the resin is counted with it. */
export function fillerMass(loading: Quantity, liquid: Figure): Figure {
  if (liquid.kind === 'not-stated') return liquid
  const unit = liquid.value.unit === 'gal' ? 'lb' : 'kg'
  const value = mapRange(liquid.value, unit, (amount) =>
    valueIn(quantity(valueIn(quantity(amount, liquid.value.unit), 'L') * valueIn(loading, 'kg/L'), 'kg'), unit),
  )
  const sum = `${formatRange(liquid.value)} × ${formatRange(point(loading))} = ${formatRange(value)}`
  return computed(
    value,
    { formula: 'sand in the mix = liquid resin × loading', sum, source: 'the build-up' },
    sourcesOf('liquid resin', liquid),
  )
}

/** Sand thrown: area × rate. The rate is what is thrown; what is swept off afterwards is not taken off, and no loss is added. */
export function broadcastMass(rate: Quantity, bays: readonly Pick<Bay, 'area'>[]): Figure {
  const unit = rate.unit === 'lb/ft²' ? 'lb' : 'kg'
  const areaUnit = unit === 'lb' ? 'ft²' : 'm²'
  const area = quantity(
    bays.reduce((sum, bay) => sum + valueIn(bay.area, areaUnit), 0),
    areaUnit,
  )
  const mass = quantity(valueIn(quantity(valueIn(area, 'm²') * valueIn(rate, 'kg/m²'), 'kg'), unit), unit)
  const sum = `${formatRange(point(area))} × ${formatRange(point(rate))} = ${formatRange(point(mass))}`
  return computed(mass, { formula: 'sand thrown = area × rate', sum, source: 'the build-up; sweepings not taken off' })
}
