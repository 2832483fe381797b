import { describe, expect, it } from 'vitest'
import type { Fact } from './fact.ts'
import { formatFigure } from './format.ts'
import { arrheniusWeight, tablesOf, valueAt } from './sheet-table.ts'
import { type Quantity, quantity } from './units.ts'

const citation = { sheetId: 's1', revisionId: 'r1', sheetTitle: 'Ostrel Body 20', revisionDate: '2026-01', page: 2, box: null, quote: null }
let count = 0
const fact = (given: Partial<Fact>): Fact => ({
  id: `f${++count}`,
  property: 'potLife',
  part: 'mixed',
  value: { min: 30, max: 30, unit: 'min' },
  origin: { kind: 'stated', citation, by: 'P. Ware', at: '2026-01-10' },
  ...given,
})
const minutes = (value: number, temperature?: Quantity, others: Fact['at'] = {}) =>
  fact({ value: { min: value, max: value, unit: 'min' }, at: { ...(temperature ? { temperature } : {}), ...others } })
const f = (value: number) => quantity(value, '°F')
const mix = { id: 'm1', name: 'Ostrel Body 20' }
const ask = (facts: Fact[], temperature: Quantity) => valueAt(facts, { property: 'potLife', temperature, mix })

describe('a value at a temperature, from the sheet’s own table', () => {
  const table = [minutes(60, f(50)), minutes(30, f(70)), minutes(16, f(90))]

  it('is the cell where the sheet has the temperature', () => {
    const figure = ask(table, f(70))
    expect(figure).toMatchObject({ kind: 'fact', value: { min: 30, max: 30, unit: 'min' }, condition: 'at 70 °F' })
  })

  it('takes 21 °C for the 70 °F column: half a kelvin is one column', () => {
    expect(ask(table, quantity(21, '°C'))).toMatchObject({ kind: 'fact', value: { min: 30, max: 30 } })
  })

  it('is interpolated straight in ln t over 1/T between two columns, with the sum shown', () => {
    // T 60 °F = 288.706 K between 283.15 K and 294.261 K: weight (1/283.15 − 1/288.706) ÷ (1/283.15 − 1/294.261) = 0.50962; 60 × (30/60)^0.50962 = 42.14
    const figure = ask(table, f(60))
    expect(figure.kind).toBe('computed')
    if (figure.kind !== 'computed') return
    expect(figure.value.min).toBeCloseTo(42.14, 2)
    expect(figure.working.sum).toBe('between 60 min at 50 °F and 30 min at 70 °F: 42.1 min at 60 °F')
    expect(figure.from.map(({ factId }) => factId)).toEqual([table[0]?.id, table[1]?.id])
  })

  it('stops where the sheet stops, at both ends', () => {
    expect(ask(table, f(45))).toMatchObject({
      kind: 'not-stated',
      missing: { because: 'the sheet stops at 50 °F', of: 'Ostrel Body 20', property: 'potLife' },
    })
    expect(ask(table, f(95))).toMatchObject({ kind: 'not-stated', missing: { because: 'the sheet stops at 90 °F' } })
  })

  it('holds at its one temperature only, when the sheet states one', () => {
    const single = [minutes(30, f(75))]
    expect(ask(single, f(75)).kind).toBe('fact')
    expect(ask(single, f(76)).kind, '0.56 °C off').toBe('not-stated')
    expect(ask(single, f(60))).toMatchObject({ kind: 'not-stated', missing: { because: 'the sheet states it at 75 °F only' } })
  })

  it('is given with that said, when the sheet states no temperature', () => {
    expect(ask([minutes(30)], f(60))).toMatchObject({ kind: 'fact', condition: 'no temperature stated' })
    expect(ask([minutes(30, undefined, { mass: quantity(150, 'g') })], f(60))).toMatchObject({
      condition: 'no temperature stated, at 150 g',
    })
  })

  it('does not fall back on a value without temperature outside a table', () => {
    expect(ask([minutes(25), minutes(30, f(70))], f(70))).toMatchObject({ condition: 'at 70 °F' })
  })

  it('is not stated when no sheet says anything, and names who could', () => {
    expect(ask([], f(70))).toMatchObject({
      kind: 'not-stated',
      missing: { ask: 'the maker, in writing', subject: { kind: 'mix', id: 'm1' } },
    })
    expect(formatFigure(ask([], f(70)))).toBe('not stated')
  })

  it('keeps a table of 150 g apart from one of a gallon', () => {
    const small = [minutes(60, f(50), { mass: quantity(150, 'g') }), minutes(30, f(70), { mass: quantity(150, 'g') })]
    const gallon = [minutes(20, f(70), { volume: quantity(1, 'gal') })]
    expect(tablesOf([...gallon, ...small], 'potLife').map(({ cells }) => cells.length)).toEqual([2, 1])
    expect(ask([...gallon, ...small], f(70)), 'the fuller table answers').toMatchObject({
      value: { min: 30 },
      condition: 'at 70 °F, 150 g',
    })
    const between = ask([...gallon, ...small], f(60))
    expect(between.kind === 'computed' && between.working.sum).toBe('between 60 min at 50 °F and 30 min at 70 °F: 42.1 min at 60 °F, 150 g')
  })

  it('lets a smaller table answer where the fuller one does not reach', () => {
    const small = [minutes(60, f(50), { mass: quantity(150, 'g') }), minutes(30, f(70), { mass: quantity(150, 'g') })]
    const gallon = [minutes(12, f(80), { volume: quantity(1, 'gal') })]
    expect(ask([...small, ...gallon], f(80))).toMatchObject({ kind: 'fact', value: { min: 12 }, condition: 'at 80 °F, 1 gal' })
  })

  it('prefers what a sheet states to what is typical', () => {
    const typical = [f(50), f(70), f(90)].map((at) => ({
      ...minutes(40, at),
      origin: { kind: 'typical' as const, source: 'common practice', dated: '2026' },
    }))
    expect(ask([...typical, minutes(30, f(70))], f(70))).toMatchObject({ value: { min: 30 }, origin: { kind: 'stated' } })
  })

  it('interpolates a range end by end, and leaves an end open that a column leaves open', () => {
    const range = (min: number | undefined, max: number | undefined, at: Quantity) =>
      fact({
        property: 'recoatWindow',
        value: { ...(min === undefined ? {} : { min }), ...(max === undefined ? {} : { max }), unit: 'h' },
        at: { temperature: at },
      })
    const both = valueAt([range(16, 48, f(50)), range(8, 24, f(70))], { property: 'recoatWindow', temperature: f(60), mix })
    expect(both.kind === 'computed' && [both.value.min, both.value.max].map((hours) => Number(hours?.toFixed(2)))).toEqual([11.24, 33.72])
    const open = valueAt([range(16, undefined, f(50)), range(8, 24, f(70))], { property: 'recoatWindow', temperature: f(60), mix })
    expect(open.kind === 'computed' && open.value).not.toHaveProperty('max')
    const neither = valueAt([range(16, undefined, f(50)), range(undefined, 24, f(70))], {
      property: 'recoatWindow',
      temperature: f(60),
      mix,
    })
    expect(neither).toMatchObject({ kind: 'not-stated', missing: { because: 'the columns on either side state different ends' } })
  })

  it('weighs the columns by 1/T, not by T', () => {
    // midway between 10 and 30 °C the colder column weighs a little less: (1/283.15 − 1/293.15) ÷ (1/283.15 − 1/303.15) = 0.5171
    expect(arrheniusWeight(20, { below: 10, above: 30 })).toBeCloseTo(0.5171, 4)
    expect(arrheniusWeight(10, { below: 10, above: 30 })).toBe(0)
    expect(arrheniusWeight(30, { below: 10, above: 30 })).toBe(1)
  })
})
