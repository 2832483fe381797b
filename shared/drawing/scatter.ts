import { type Point, pathOf } from './shapes.ts'

/** A row of numbers from 0 to 1 that is always the same for the same text: a drawing redrawn is the same drawing. */
export function seeded(text: string): () => number {
  let state = 2166136261
  for (let index = 0; index < text.length; index += 1) state = Math.imul(state ^ text.charCodeAt(index), 16777619)
  return () => {
    state = (state + 0x6d2b79f5) | 0
    let mixed = Math.imul(state ^ (state >>> 15), 1 | state)
    mixed = (mixed + Math.imul(mixed ^ (mixed >>> 7), 61 | mixed)) ^ mixed
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4294967296
  }
}

/** A broken stone: five to seven corners about a centre. */
export function stone([x, y]: Point, radius: number, random: () => number): string {
  const corners = radius < 1.4 ? 4 : 5 + Math.floor(random() * 3)
  const turn = random() * Math.PI
  const points = Array.from({ length: corners }, (_, index): Point => {
    const angle = turn + (index / corners) * 2 * Math.PI
    const reach = radius * (0.78 + random() * 0.36)
    return [x + Math.cos(angle) * reach, y + Math.sin(angle) * reach]
  })
  return pathOf(points, true)
}

interface Field {
  left: number
  right: number
  top: number
  bottom: number
  /** Distance between the middles of grains. */
  pitch: number
}

/** Places on a shaken grid of staggered rows, at most about `most` of them. */
export function scatter({ left, right, top, bottom, pitch }: Field, random: () => number, most = 420): Point[] {
  const wide = Math.max(0, right - left)
  const high = Math.max(0, bottom - top)
  const step = Math.max(pitch, Math.sqrt((wide * high) / most))
  const places: Point[] = []
  for (let row = 0, y = top + step / 2; y < bottom; row += 1, y += step * 0.87) {
    for (let x = left + (row % 2 === 0 ? step / 2 : 0); x < right; x += step) {
      places.push([x + (random() - 0.5) * step * 0.5, y + (random() - 0.5) * step * 0.45])
    }
  }
  return places
}
