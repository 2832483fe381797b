import { describe, expect, it } from 'vitest'
import { floorTypeOf } from '../../shared/domain/floor-type.ts'
import { quantity } from '../../shared/domain/units.ts'
import { floorTypes, floorTypesEdition } from '../../shared/reference/floor-types.ts'
import { silicaRule, silicaTasks } from '../../shared/reference/silica.ts'

const type = (value: number, unit: 'µm' | 'mm', finish: Parameters<typeof floorTypeOf>[1]) =>
  floorTypeOf(quantity(value, unit), finish)?.number

describe('types of resin floors (BS 8204-6, section 6.2, read on two pages of the trade body)', () => {
  it.each([
    [100, 'µm', 'flowed', 1],
    [149.9, 'µm', 'flowed', 1],
    [150, 'µm', 'flowed', 2],
    [250, 'µm', 'flowed', 2],
    [300, 'µm', 'flowed', 3],
    [600, 'µm', 'flowed', 3],
    [1, 'mm', 'flowed', 3],
    [1.5, 'mm', 'flowed', undefined],
    [2, 'mm', 'broadcast', undefined],
    [2.5, 'mm', 'flowed', 5],
    [2.5, 'mm', 'broadcast', 4],
    [3, 'mm', 'flowed', 5],
    [3.5, 'mm', 'flowed', undefined],
    [5, 'mm', 'flowed', 7],
    [5, 'mm', 'trowelled', 6],
    [4, 'mm', 'trowelled', undefined],
    [7, 'mm', 'trowelled, impervious', 8],
    [6, 'mm', 'trowelled, impervious', undefined],
  ] as const)('%d %s %s: type %s', (value, unit, finish, number) => {
    expect(type(value, unit, finish)).toBe(number)
  })

  it('eight types, each with a duty; the thickness that ends type 2 begins type 3', () => {
    expect(floorTypes.map(({ number }) => number)).toEqual([1, 2, 3, 4, 5, 6, 7, 8])
    expect(floorTypes.every(({ duty }) => /^(LD|MD|HD|VHD)/.test(duty))).toBe(true)
    expect(floorTypesEdition).toMatch(/verify/)
  })
})

describe('silica (29 CFR 1926.1153, read in the rule and a trade magazine; rows (vii), (x) from memory)', () => {
  it('50 µg/m³ permitted over eight hours, action from 25', () => {
    expect([silicaRule.permissibleExposure, silicaRule.actionLevel]).toEqual([50, 25])
  })

  it('protection factors, up to four hours and over, outdoors and indoors', () => {
    const factors = Object.fromEntries(
      Object.values(silicaTasks).map(({ row, outdoors, indoors }) => [
        row,
        [outdoors.upTo4h, outdoors.over4h, indoors.upTo4h, indoors.over4h],
      ]),
    )
    expect(factors).toEqual({
      '(iv)': [null, null, 10, 10],
      '(vii)': [null, null, null, null],
      '(x)': [null, 10, 10, 10],
      '(xii)': [null, null, null, 10],
      '(xiii)': [null, null, null, null],
    })
  })

  it('25 cfm per inch of wheel stands in the words of the handheld grinder', () => {
    expect(silicaTasks['handheld grinder'].controls.join(' ')).toMatch(/25 cfm per inch/)
  })
})
