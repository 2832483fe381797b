import { describe, expect, it } from 'vitest'
import type { Course, EvaluationInput } from '../../shared/domain/build-up.ts'
import { newCourse } from '../../shared/domain/course.ts'
import { evaluate } from '../../shared/domain/evaluate.ts'
import type { Fact } from '../../shared/domain/fact.ts'
import type { Figure } from '../../shared/domain/figure.ts'
import type { Bay, Loss } from '../../shared/domain/job.ts'
import { grooveVolume } from '../../shared/domain/joint.ts'
import { orderList } from '../../shared/domain/order-list.ts'
import type { MixFacts } from '../../shared/domain/mix.ts'
import { moistureTestsNeeded } from '../../shared/domain/moisture.ts'
import type { PropertyValue } from '../../shared/domain/property.ts'
import { type CourseQuantity, jobQuantities } from '../../shared/domain/quantities.ts'
import { holesVolume } from '../../shared/domain/spall.ts'
import { quantity, valueIn } from '../../shared/domain/units.ts'

/**
 * A whole floor taken off, computed from exact constants: 2,400 ft², 320 ft of 1/4 × 1.5 in joints, 14 spalls of 8 × 5 × 0.75 in (shape 0.7),
 * 60 ft of 1/4 × 1/4 in V cracks; primer 10 mil, slurry 125 mil with 13.8 lb of quartz a gallon, broadcast 0.5 lb/ft², grout coat 12 mil, top coat 3 mil dry.
 */
let count = 0
const fact = (property: Fact['property'], value: PropertyValue): Fact => ({
  id: `t${++count}`,
  property,
  part: 'mixed',
  value,
  origin: { kind: 'entered', reason: 'take-off', by: 'test', at: '2026-01-01' },
})
const exactly = (value: number, unit: 'gal' | '%' | 'g/cm³' | 'lb') => ({ min: value, max: value, unit })
const pail = {
  id: 'p',
  name: 'Ostrel',
  maker: 'Ostrel',
  kind: 'resin' as const,
  chemistry: 'epoxy' as const,
  status: 'active' as const,
  facts: [],
  sheets: [],
}
const mixOf = (id: string, facts: Fact[]): MixFacts => ({
  id,
  name: id,
  maker: 'Ostrel',
  chemistry: 'epoxy',
  color: '#a8571a',
  status: 'active',
  parts: [{ part: 'A', product: pail }],
  facts,
  sheets: [],
})
const resin = mixOf('resin', [fact('volumeSolids', exactly(100, '%')), fact('packSize', exactly(3, 'gal'))])
const topResin = mixOf('top resin', [fact('volumeSolids', exactly(70, '%'))])
const sand = {
  ...pail,
  id: 'sand',
  name: 'Teasel quartz',
  maker: 'Teasel',
  kind: 'aggregate' as const,
  chemistry: 'silica' as const,
  facts: [fact('density', exactly(2.65, 'g/cm³')), fact('packSize', exactly(50, 'lb'))],
}

const course = (stage: Course['stage'], id: string, given: Partial<Course>): Course => ({
  ...newCourse(stage, id),
  mixId: 'resin',
  ...given,
})
const mil = (value: number, film: 'wet' | 'dry' = 'wet') => ({ value, unit: 'mil' as const, film })
const loading = { productId: 'sand', loading: quantity(13.8, 'lb/gal') }
const input: EvaluationInput = {
  courses: [
    course('fill', 'fill', {}),
    course('prime', 'prime', { thickness: mil(10) }),
    course('slurry', 'slurry', {
      thickness: mil(125),
      filler: loading,
      broadcast: { productId: 'sand', rate: quantity(0.5, 'lb/ft²'), toRefusal: true },
    }),
    course('seal', 'grout', { thickness: mil(12) }),
    course('top', 'top', { mixId: 'top resin', thickness: mil(3, 'dry') }),
  ],
  mixes: { resin, 'top resin': topResin },
  products: { sand },
  conditions: {
    slabTemperature: quantity(68, '°F'),
    airTemperature: quantity(68, '°F'),
    relativeHumidity: 45,
    substrateRelativeHumidity: null,
    moistureEmission: null,
    vocPlace: null,
  },
  onDate: '2026-12-01',
  sheetAgeLimitYears: 3,
}
const inch = (value: number) => quantity(value, 'in')
const joints = [{ length: quantity(320, 'ft'), width: inch(1 / 4), depth: inch(1.5) }]
/** A dish of shape 0.7 is surveyed as its area with 0.7 of the depth as the mean. */
const spalls = { area: quantity((14 * 8 * 5) / 144, 'ft²'), meanDepth: inch(0.75 * 0.7) }
const bay: Bay = { id: 'b1', name: 'Hall', area: { value: 2400, unit: 'ft²' }, joints, spalls }
const evaluation = evaluate(input)
const quantitiesAt = (percent: number, convention: Loss['convention'] = 'lost') =>
  jobQuantities({ floor: input, results: evaluation.courses, bays: [bay], texture: null, loss: { percent, convention } })
const takeOff = (percent: number, convention?: Loss['convention']) => {
  const courses = quantitiesAt(percent, convention)
  return (id: string): CourseQuantity => {
    const found = courses.find(({ courseId }) => courseId === id)
    if (!found) throw new Error(`no course ${id}`)
    return found
  }
}
const amount = (figure: Figure | undefined | null) =>
  figure && figure.kind !== 'not-stated' ? (figure.value.max ?? Number.NaN) : Number.NaN
const kits = ({ packing }: CourseQuantity) => packing.plan?.lines.map((line) => line.count)

describe('a floor of 2,400 ft² taken off', () => {
  it('wants 5 moisture tests', () => expect(moistureTestsNeeded(quantity(2400, 'ft²'))).toBe(5))

  it('takes 15.748 gal (59.614 L) of primer with 5 % lost: 6 kits of 3 gal', () => {
    const primer = takeOff(5)('prime')
    expect(amount(primer.total)).toBeCloseTo(15.748, 3)
    expect(valueIn(quantity(amount(primer.total), 'gal'), 'L')).toBeCloseTo(59.614, 2)
    expect(kits(primer)).toEqual([6])
    expect(primer.packing.plan?.leftover.value).toBeCloseTo(18 - 15.748, 3)
  })

  it('takes 18.898 gal of grout coat with 5 % lost: 7 kits of 3 gal', () => {
    expect(amount(takeOff(5)('grout').total)).toBeCloseTo(18.898, 3)
    expect(kits(takeOff(5)('grout'))).toEqual([7])
  })

  it('takes 125.169 gal of resin and 1,727.3 lb of sand in 203.275 gal of slurry with 8 % lost', () => {
    const slurry = takeOff(8)('slurry')
    expect((2400 * 125) / 1604.1667 / 0.92, 'the filled volume').toBeCloseTo(203.275, 2)
    expect(amount(slurry.total)).toBeCloseTo(125.169, 2)
    expect(amount(slurry.aggregates.find(({ use }) => use === 'filler')?.mass)).toBeCloseTo(1727.3, 0)
  })

  it('throws 1,200 lb of sand, in 24 bags of 50 lb, whatever is lost of the resin', () => {
    const broadcast = takeOff(8)('slurry').aggregates.find(({ use }) => use === 'broadcast')
    expect(amount(broadcast?.mass)).toBeCloseTo(1200, 6)
    expect(broadcast?.plan?.lines[0]?.count).toBe(24)
  })

  it('takes 7.124 gal (26.968 L) of top coat, 4.286 mil wet, with 10 % lost', () => {
    expect(amount(evaluation.courses.at(-1)?.wetFilm)).toBeCloseTo(4.286, 3)
    expect(amount(takeOff(10)('top').total)).toBeCloseTo(7.124, 3)
    expect(valueIn(quantity(amount(takeOff(10)('top').total), 'gal'), 'L')).toBeCloseTo(26.968, 2)
  })

  it('fills joints with 6.234 gal, 6.926 gal with 10 % lost, and spalls with 1.273 gal', () => {
    const [fill] = takeOff(0)('fill').bays
    expect(amount(fill?.joints)).toBeCloseTo(6.234, 3)
    expect(amount(fill?.joints) / 0.9).toBeCloseTo(6.926, 3)
    expect(amount(fill?.spalls)).toBeCloseTo(1.273, 3)
    expect(amount(takeOff(10)('fill').total)).toBeCloseTo((6.234 + 1.273) / 0.9, 2)
    const holes = holesVolume({ count: 14, length: inch(8), width: inch(5), depth: inch(0.75), shape: 0.7 })
    expect(valueIn(holes, 'gal'), 'hole by hole').toBeCloseTo(1.273, 3)
  })

  it('fills cracks with 0.097 gal', () => {
    expect(valueIn(grooveVolume({ length: quantity(60, 'ft'), width: inch(1 / 4), depth: inch(1 / 4) }), 'gal')).toBeCloseTo(0.097, 3)
  })

  it('is 150 mil thick, the stones of the broadcast not counted', () => {
    expect(amount(evaluation.totals.thickness)).toBeCloseTo(150, 6)
  })

  it('orders whole kits by maker, and names what no sheet gives a pack size of', () => {
    const order = orderList(quantitiesAt(5))
    expect(order.makers.map(({ maker }) => maker)).toEqual(['Ostrel', 'Teasel'])
    expect(order.open).toEqual(['top resin'])
    expect(order.makers[0]?.lines.map(({ item, count: packs }) => [item.name, packs])).toEqual([['resin', 3 + 6 + 41 + 7]])
    expect(order.cost, 'no prices are entered').toBeNull()
  })
})
