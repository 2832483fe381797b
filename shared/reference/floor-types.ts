/**
 * Types of synthetic resin flooring: BS 8204-6, section 6.2, as the trade body FeRFA prints them too (read on two of its pages). Thickness in
 * micrometres, from included and up to excluded where two types meet; between 1 and 2 mm there is none. Duties: LD light, MD medium, HD heavy, VHD very heavy.
 */
export const floorTypesEdition = 'BS 8204-6, section 6.2 (verify against the standard)'

/** How the floor is laid, which tells types of one thickness apart. */
export type FloorFinish = 'flowed' | 'broadcast' | 'trowelled' | 'trowelled, impervious'

export interface FloorType {
  number: 1 | 2 | 3 | 4 | 5 | 6 | 7 | 8
  name: string
  /** µm; `over` itself does not belong, `from` does; `to` belongs only where no type begins at it. */
  from?: number
  over?: number
  below?: number
  to?: number
  finishes: readonly FloorFinish[]
  duty: string
}

export const floorTypes: readonly FloorType[] = [
  { number: 1, name: 'Floor seal', from: 0, below: 150, finishes: ['flowed', 'broadcast'], duty: 'LD' },
  { number: 2, name: 'Floor coating', from: 150, below: 300, finishes: ['flowed', 'broadcast'], duty: 'LD to MD' },
  { number: 3, name: 'High build floor coating', from: 300, to: 1000, finishes: ['flowed', 'broadcast'], duty: 'MD' },
  { number: 4, name: 'Multi-layer flooring', over: 2000, finishes: ['broadcast'], duty: 'MD to HD' },
  { number: 5, name: 'Flow-applied flooring', from: 2000, to: 3000, finishes: ['flowed'], duty: 'MD to HD' },
  { number: 6, name: 'Resin screed flooring', over: 4000, finishes: ['trowelled'], duty: 'MD to HD' },
  { number: 7, name: 'Heavy duty flowable flooring', from: 4000, to: 6000, finishes: ['flowed'], duty: 'HD to VHD' },
  { number: 8, name: 'Heavy duty resin flooring', over: 6000, finishes: ['trowelled, impervious'], duty: 'VHD' },
]
