import { type Quantity, quantity, valueIn } from './units.ts'

/** Volume of spalls surveyed by area and mean depth: area × mean depth. */
export function spallVolume({ area, meanDepth }: { area: Quantity; meanDepth: Quantity }): Quantity<'m³'> {
  return quantity(valueIn(area, 'm²') * valueIn(meanDepth, 'm'), 'm³')
}

/**
 * Volume of holes measured one by one: count × length × width × depth × shape. `shape` is 1 for square sides and a true mean depth;
 * about 0.7 for a dish with feathered edges (common practice).
 */
export function holesVolume({
  count,
  length,
  width,
  depth,
  shape,
}: {
  count: number
  length: Quantity
  width: Quantity
  depth: Quantity
  shape: number
}): Quantity<'m³'> {
  return quantity(count * valueIn(length, 'm') * valueIn(width, 'm') * valueIn(depth, 'm') * shape, 'm³')
}
