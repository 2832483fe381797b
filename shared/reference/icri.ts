/**
 * Concrete surface profiles by method of preparation and by thickness of what follows. ICRI 310.2R-2013; the CSP columns are from memory
 * (thickness column read in a scan of 2020), so every use says "verify". The edition's chips are the standard, not these words.
 */
export const icriEdition = 'ICRI 310.2R-2013 (verify against the standard)'

export interface ProfileRange {
  from: number
  to: number
}

/** CSP that a method reaches. */
export const profileOfMethod: Record<string, ProfileRange> = {
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

/** CSP that a total thickness asks for; `above` and `upTo` in mil, upTo included. Bands overlap where the standard's do. */
export const profileForThickness: readonly { what: string; above: number; upTo: number; profile: ProfileRange }[] = [
  { what: 'sealer', above: 0, upTo: 3, profile: { from: 1, to: 2 } },
  { what: 'thin film', above: 3, upTo: 10, profile: { from: 1, to: 3 } },
  { what: 'high-build coating', above: 10, upTo: 40, profile: { from: 3, to: 5 } },
  { what: 'self-levelling topping', above: 40, upTo: 125, profile: { from: 4, to: 6 } },
  { what: 'polymer overlay', above: 125, upTo: 250, profile: { from: 5, to: 9 } },
  { what: 'overlay or repair material', above: 250, upTo: Infinity, profile: { from: 5, to: 10 } },
]
