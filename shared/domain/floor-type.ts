import { type FloorFinish, type FloorType, floorTypes } from '../reference/floor-types.ts'
import { type Quantity, valueIn } from './units.ts'

/** Type of a resin floor by BS 8204-6 from its thickness and how it is laid; undefined where the standard has none (1 to 2 mm, 3 to 4 mm flowed). */
export function floorTypeOf(thickness: Quantity, finish: FloorFinish): FloorType | undefined {
  const micrometres = valueIn(thickness, 'µm')
  const slack = micrometres * 1e-9
  return floorTypes.find(
    ({ from = -Infinity, over = -Infinity, below = Infinity, to = Infinity, finishes }) =>
      finishes.includes(finish) &&
      micrometres >= from - slack &&
      micrometres > over + slack &&
      micrometres < below - slack &&
      micrometres <= to + slack,
  )
}
