import { type Quantity, convert, quantity, valueIn } from './units.ts'

/**
 * Tensile stress of a pull-off: force over the area of the disc, F ÷ (π d² ÷ 4). A mean over one disc; the plane that failed is told beside it.
 * Source: definition of stress; ASTM D7234, ISO 4624, from memory.
 */
export function pullOffStress<U extends 'psi' | 'MPa'>({ force, disc }: { force: Quantity; disc: Quantity }, unit: U): Quantity<U> {
  const area = (Math.PI * valueIn(disc, 'm') ** 2) / 4
  return convert(quantity(valueIn(force, 'N') / area / 1e6, 'MPa'), unit)
}

/** Force that puts a stress on a disc: the inverse of `pullOffStress`. */
export function pullOffForce<U extends 'lbf' | 'N'>({ stress, disc }: { stress: Quantity; disc: Quantity }, unit: U): Quantity<U> {
  const area = (Math.PI * valueIn(disc, 'm') ** 2) / 4
  return convert(quantity(valueIn(stress, 'MPa') * 1e6 * area, 'N'), unit)
}
