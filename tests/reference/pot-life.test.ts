import { describe, expect, it } from 'vitest'
import type { Fact } from '../../shared/domain/fact.ts'
import { halvedPotLife } from '../../shared/domain/pot-life.ts'
import { valueAt } from '../../shared/domain/sheet-table.ts'
import { quantity } from '../../shared/domain/units.ts'

/** "For every 10 °C (18 °F) rise pot life is reduced by approximately half": UFGS 09 97, US government guide specification. A cross-check only. */
const minutes = (value: number) => quantity(value, 'min')
const celsius = (value: number) => quantity(value, '°C')

describe('pot life halves for every 10 °C', () => {
  it.each([
    [13, 60],
    [18, 42.4],
    [28, 21.2],
    [33, 15],
    [35, 13.06],
  ])('30 min at 23 °C is at %d °C %d min', (at, expected) => {
    expect(halvedPotLife(minutes(30), { from: celsius(23), to: celsius(at) }).value).toBeCloseTo(expected, 1)
  })

  it.each([
    [60, 53],
    [90, 17],
    [95, 14],
  ])('30 min at 75 °F is at %d °F about %d min', (at, expected) => {
    expect(halvedPotLife(minutes(30), { from: quantity(75, '°F'), to: quantity(at, '°F') }).value).toBeCloseTo(expected, 0)
  })
})

describe('interpolation in a sheet’s table, against the rule', () => {
  const cell = (value: number, at: number): Fact => ({
    id: `at-${at}`,
    property: 'potLife',
    part: 'mixed',
    value: { min: value, max: value, unit: 'min' },
    at: { temperature: celsius(at) },
    origin: { kind: 'entered', reason: 'a table that halves every 10 °C', by: 'test', at: '2026-01-01' },
  })
  const table = [cell(60, 13), cell(30, 23), cell(15, 33)]
  const at = (temperature: number) =>
    valueAt(table, { property: 'potLife', temperature: celsius(temperature), mix: { id: 'm', name: 'Ostrel Body 20' } })

  it.each([
    [18, 42.4],
    [28, 21.2],
    [15, 52.2],
    [31, 17.2],
  ])('a table of 60, 30 and 15 min at 13, 23 and 33 °C gives at %d °C within 3 %% of %d min', (temperature, rule) => {
    const figure = at(temperature)
    expect(figure.kind).toBe('computed')
    if (figure.kind === 'computed') expect(Math.abs((figure.value.min ?? 0) / rule - 1)).toBeLessThan(0.03)
  })

  it('does not run on by the rule where the table ends', () => {
    expect(at(43)).toMatchObject({ kind: 'not-stated', missing: { because: 'the sheet stops at 33 °C' } })
  })
})
