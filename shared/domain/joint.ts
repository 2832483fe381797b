import { type Quantity, quantity, valueIn } from './units.ts'

interface Joint {
  length: Quantity
  width: Quantity
  depth: Quantity
}

/** Volume of a rectangular joint: length × width × depth. 231 ÷ (12 w d) ft/gal with w, d in inches. */
export function jointVolume({ length, width, depth }: Joint): Quantity<'m³'> {
  return quantity(valueIn(length, 'm') * valueIn(width, 'm') * valueIn(depth, 'm'), 'm³')
}

/** Volume of a V-shaped groove: half of the rectangle about it. */
export function grooveVolume(groove: Joint): Quantity<'m³'> {
  return quantity(jointVolume(groove).value / 2, 'm³')
}
