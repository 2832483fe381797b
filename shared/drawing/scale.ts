/** Scale of a section: pixels per micrometre of the thick courses, and how many times larger films are drawn. */
export interface SectionScale {
  perMicrometre: number
  filmFactor: number
  /** Courses no thicker than this (µm) are drawn as films; 0 when all share one scale. */
  filmLimit: number
}

/** Factors a person can read off: films are drawn one of these many times larger. */
const factors = [1, 2, 3, 4, 5, 6, 8, 10, 12, 15, 20, 25, 30, 40, 50, 60, 80, 100, 150, 200, 300, 400, 500, 800, 1000]

interface Room {
  /** Pixels for all courses together. */
  height: number
  /** Pixels that the thinnest course should have. */
  least: number
  /** Pixels that no course needs more than. */
  most: number
}

const sum = (values: readonly number[]) => values.reduce((total, one) => total + one, 0)

/**
 * The scale that shows every course with the smallest exaggeration of films. A film is never drawn thicker than a course that is truly thicker.
 * Where the room does not allow `least`, less is accepted rather than more than two scales.
 * @param thicknesses in micrometres, known ones only
 */
export function fitScale(thicknesses: readonly number[], room: Room): SectionScale {
  if (thicknesses.length === 0) return { perMicrometre: room.most / 3000, filmFactor: 1, filmLimit: 0 }
  const rising = [...thicknesses].sort((a, b) => a - b)
  for (let least = room.least; least > 1; least *= 0.85) {
    const found = smallestFactor(rising, { ...room, least })
    if (found) return found
  }
  return bestOf(rising, { split: 0, factor: 1, room })
}

function smallestFactor(rising: readonly number[], room: Room): SectionScale | undefined {
  for (const factor of factors) {
    for (let split = 0; split < rising.length; split += 1) {
      if ((factor === 1) !== (split === 0)) continue
      const films = rising.slice(0, split)
      const thick = rising.slice(split)
      if (factor * (films.at(-1) ?? 0) > (thick[0] ?? Infinity)) continue
      const scale = bestOf(rising, { split, factor, room })
      const thinnest = Math.min((films[0] ?? Infinity) * factor, thick[0] ?? Infinity) * scale.perMicrometre
      if (thinnest >= room.least) return scale
    }
  }
  return undefined
}

/** The largest scale at which all fit the room and none is taller than needed. */
function bestOf(rising: readonly number[], { split, factor, room }: { split: number; factor: number; room: Room }): SectionScale {
  const films = rising.slice(0, split)
  const thick = rising.slice(split)
  const all = sum(thick) + factor * sum(films)
  const tallest = Math.max(rising.at(-1) ?? 1, factor * (films.at(-1) ?? 0))
  return { perMicrometre: Math.min(room.height / all, room.most / tallest), filmFactor: factor, filmLimit: films.at(-1) ?? 0 }
}

/** Pixels a thickness is drawn with. */
export function drawnHeight(micrometres: number, scale: SectionScale): number {
  return micrometres * scaleFor(micrometres, scale)
}

/** Pixels per micrometre within the band a thickness belongs to. */
export function scaleFor(micrometres: number, { perMicrometre, filmFactor, filmLimit }: SectionScale): number {
  return perMicrometre * (micrometres <= filmLimit ? filmFactor : 1)
}
