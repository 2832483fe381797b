import { describe, expect, it } from 'vitest'
import { type Example, courseOf, exampleFloor, fact, findingOf } from '../../../tests/setup/example-floor.ts'
import type { ProductFacts } from '../product.ts'
import type { SheetSummary } from '../sheet.ts'

const partsOf = ({ mix }: Example): ProductFacts[] => mix.parts.map(({ product }) => product)
/** Safety sheets of all parts, dated. */
function dated(date: string | null, onDate = '2026-12-01'): Example {
  const floor = exampleFloor()
  floor.input.onDate = onDate
  for (const product of partsOf(floor)) product.sheets = product.sheets.map((sheet) => ({ ...sheet, revisionDate: date }))
  return floor
}
const current = (floor: Example) => findingOf(floor, 'sheet-current', 'top')
const present = (floor: Example) => findingOf(floor, 'sheet-present', 'top')

describe('sheets current (three years allowed)', () => {
  it.each([
    ['2023-12-01', 'met'],
    ['2023-11-30', 'caution'],
    ['2023-12', 'met'],
    ['2023-11', 'caution'],
    ['2024', 'met'],
    ['2023', 'caution'], // it may be of January
    [null, 'unknown'],
    ['yesterday', 'unknown'],
  ] as const)('a safety sheet of %s on 1 December 2026: %s', (date, status) => {
    expect(current(dated(date)).status).toBe(status)
  })

  it('a day of reckoning that is none leaves it unknown', () => {
    expect(current(dated('2025-06-01', 'today')).status).toBe('unknown')
  })

  it('names the sheet and its date', () => {
    const floor = dated('2021-05-18')
    expect(current(floor).says).toBe(
      'The safety sheet of Part A is from 18 May 2021, older than 3 years. The safety sheet of Part B is from 18 May 2021, older than 3 years.',
    )
  })

  it('a data sheet may be older: only safety sheets age', () => {
    const floor = exampleFloor()
    floor.mix.sheets = floor.mix.sheets.map((sheet) => ({ ...sheet, revisionDate: '2015-01-01' }))
    expect(current(floor).status).toBe('met')
  })

  it('figures that cite a revision which a newer one superseded are a caution', () => {
    const floor = exampleFloor()
    const citation = {
      sheetId: 'data-sheet',
      revisionId: 'older',
      sheetTitle: 'Example epoxy',
      revisionDate: '2022-03-01',
      page: 1,
      box: null,
      quote: null,
    }
    floor.mix.facts = [
      ...floor.mix.facts,
      fact('shelfLife', { min: 24, max: 24, unit: 'month' }, { origin: { kind: 'stated', citation, by: 'lead', at: '2026-01-01' } }),
    ]
    expect(current(floor)).toMatchObject({
      status: 'caution',
      says: 'Figures rest on a superseded revision: Example epoxy of 1 March 2022.',
    })
  })

  it('a mix or part that the catalogue has withdrawn is a caution', () => {
    const floor = exampleFloor()
    floor.mix.status = 'withdrawn'
    expect(current(floor)).toMatchObject({ status: 'caution', says: expect.stringContaining('Example epoxy is withdrawn') as string })
  })
})

describe('sheets present', () => {
  it('a superseded sheet is none', () => {
    const floor = exampleFloor()
    for (const product of partsOf(floor)) product.sheets = product.sheets.map((sheet) => ({ ...sheet, superseded: true }))
    expect(present(floor)).toMatchObject({ status: 'stop', missing: [{ of: 'Part A', ask: 'the maker' }, { of: 'Part B' }] })
  })

  it('the sand in the mix wants its safety sheet too', () => {
    const floor = exampleFloor()
    const [sheet] = partsOf(floor)[0]?.sheets ?? []
    const sand: ProductFacts = {
      id: 'sand',
      name: 'Quartz',
      maker: 'Corbel',
      kind: 'aggregate',
      chemistry: 'silica',
      status: 'active',
      facts: [],
      sheets: [],
    }
    floor.input.products['sand'] = sand
    courseOf(floor, 'top').broadcast = { productId: 'sand', rate: { value: 0.5, unit: 'lb/ft²' }, toRefusal: true }
    expect(present(floor)).toMatchObject({ status: 'stop', says: 'Quartz has no safety sheet.' })
    if (sheet) sand.sheets = [sheet]
    expect(present(floor)).toMatchObject({ status: 'met', says: 'The data sheet and the safety sheets of all 3 components are loaded.' })
  })

  it('one safety sheet of the whole mix counts for its parts', () => {
    const floor = exampleFloor()
    for (const product of partsOf(floor)) product.sheets = []
    const kit: SheetSummary = {
      id: 'kit',
      kind: 'safety',
      title: 'Kit',
      revisionId: 'kit-1',
      revisionDate: '2025-01-01',
      pages: 9,
      superseded: false,
    }
    floor.mix.sheets = [...floor.mix.sheets, kit]
    expect(present(floor).status).toBe('met')
  })

  it('the data sheet of a lone product is that of its mix', () => {
    const floor = exampleFloor()
    const [alone] = floor.mix.parts
    if (!alone) throw new Error('no part')
    alone.product.sheets = [...alone.product.sheets, ...floor.mix.sheets]
    floor.mix.parts = [alone]
    floor.mix.sheets = []
    expect(present(floor)).toMatchObject({ status: 'met', says: 'The data sheet and the safety sheet are loaded.' })
  })
})
