/**
 * Concrete surface profiles by method of preparation and by thickness of what follows: ICRI 310.2R-2013. The thickness column was read in a scan of
 * 2020, "abrasive blasting 2–7" in an article on the standard; all other CSP figures are from memory, surface retarder, flame blasting and concrete
 * breaker uncertainly. So every use says "verify". The edition's rubber chips are the standard, not these words; a sheet's own profile goes first.
 */
export const icriEdition = 'ICRI 310.2R-2013, verify against the standard'

export interface ProfileRange {
  from: number
  to: number
}

/** CSP that a method reaches. The editions of 1997 to 2008 differ in several of these. */
export const profileOfMethod: Readonly<Record<string, ProfileRange>> = {
  'detergent scrubbing': { from: 1, to: 1 },
  'low-pressure water cleaning': { from: 1, to: 1 },
  'acid etching': { from: 1, to: 3 },
  grinding: { from: 1, to: 3 },
  'abrasive blasting': { from: 2, to: 7 },
  'steel shot blasting': { from: 2, to: 9 },
  scarifying: { from: 4, to: 7 },
  'needle scaling': { from: 5, to: 8 },
  'high-pressure water jetting': { from: 6, to: 10 },
  scabbling: { from: 7, to: 10 },
  'surface retarder': { from: 3, to: 9 },
  'flame blasting': { from: 8, to: 10 },
  milling: { from: 9, to: 10 },
  'handheld concrete breaker': { from: 7, to: 10 },
}

export interface ProfileBand {
  what: string
  /** The standard prints both systems side by side; neither is a conversion of the other. Both ends belong to the band. */
  mil: { from: number; to: number }
  mm: { from: number; to: number }
  profile: ProfileRange
}

/** CSP that a total thickness asks for, thinnest first. */
export const profileForThickness: readonly ProfileBand[] = [
  { what: 'sealer', mil: { from: 0, to: 3 }, mm: { from: 0, to: 0.075 }, profile: { from: 1, to: 2 } },
  { what: 'thin film', mil: { from: 4, to: 10 }, mm: { from: 0.1, to: 0.25 }, profile: { from: 1, to: 3 } },
  { what: 'high-build coating', mil: { from: 10, to: 40 }, mm: { from: 0.25, to: 1 }, profile: { from: 3, to: 5 } },
  { what: 'self-levelling topping', mil: { from: 50, to: 125 }, mm: { from: 1.25, to: 3 }, profile: { from: 4, to: 6 } },
  { what: 'polymer overlay', mil: { from: 125, to: 250 }, mm: { from: 3, to: 6 }, profile: { from: 5, to: 9 } },
  {
    what: 'concrete overlay, repair material',
    mil: { from: 250, to: Infinity },
    mm: { from: 6, to: Infinity },
    profile: { from: 5, to: 10 },
  },
]
