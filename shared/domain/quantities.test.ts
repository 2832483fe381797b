import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { Course, EvaluationInput } from './build-up.ts'
import { newCourse } from './course.ts'
import { evaluate } from './evaluate.ts'
import type { Fact } from './fact.ts'
import { formatFigure } from './format.ts'
import type { Bay, Loss } from './job.ts'
import type { MixFacts } from './mix.ts'
import { orderList } from './order-list.ts'
import type { ProductFacts } from './product.ts'
import type { Range } from './property.ts'
import { type CourseQuantity, jobQuantities } from './quantities.ts'
import { type Quantity, quantity } from './units.ts'
import { greatestOf } from './working.ts'

let count = 0
const fact = (property: Fact['property'], value: Fact['value'], others: Partial<Fact> = {}): Fact => ({
  id: `q${++count}`,
  property,
  part: 'mixed',
  value,
  origin: { kind: 'entered', reason: 'price list', by: 'test', at: '2026-01-01' },
  ...others,
})
const exactly = (value: number, unit: Range['unit']): Range => ({ min: value, max: value, unit })
const product = (id: string, facts: Fact[], others: Partial<ProductFacts> = {}): ProductFacts => ({
  id,
  name: `Ostrel ${id}`,
  maker: 'Ostrel',
  kind: 'resin',
  chemistry: 'epoxy',
  status: 'active',
  facts,
  sheets: [],
  ...others,
})
const density = (value: number) => fact('density', exactly(value, 'lb/gal'))
const mixOf = (id: string, facts: Fact[]): MixFacts => ({
  id,
  name: `Ostrel ${id}`,
  maker: 'Ostrel',
  chemistry: 'epoxy',
  color: '#a8571a',
  status: 'active',
  sheets: [],
  facts: [fact('mixRatio', { parts: [2, 1], basis: 'volume' }), fact('volumeSolids', exactly(100, '%')), ...facts],
  parts: [
    { part: 'A', product: product('A', [density(9.6)]) },
    { part: 'B', product: product('B', [density(8.3)]) },
  ],
})
const kit = fact('packSize', exactly(3, 'gal'))
const body = mixOf('Body', [kit, fact('splitKit', { is: false }), fact('packPrice', exactly(210, 'USD'))])
const prime = mixOf('Prime', [kit, fact('splitKit', { is: true }), fact('packPrice', exactly(180, 'USD'))])
const patch = mixOf('Patch', [])
const quartz = product(
  'quartz',
  [fact('density', exactly(2.65, 'g/cm³')), fact('packSize', exactly(50, 'lb')), fact('packPrice', exactly(14, 'USD'))],
  { name: 'Teasel quartz', maker: 'Teasel', kind: 'aggregate', chemistry: 'silica' },
)

const course = (stage: Course['stage'], id: string, given: Partial<Course>): Course => ({ ...newCourse(stage, id), ...given })
const spread = { value: 150, unit: 'ft²/gal' as const }
const bay = (id: string, area: number, others: Partial<Bay> = {}): Bay => ({
  id,
  name: `Bay ${id}`,
  area: { value: area, unit: 'ft²' },
  joints: [],
  spalls: null,
  ...others,
})
const noLoss: Loss = { percent: 0, convention: 'lost' }

interface Given {
  courses: Course[]
  bays?: Bay[]
  texture?: Quantity | null
  loss?: Loss
  products?: EvaluationInput['products']
}
function quantitiesOf({ courses, bays = [bay('1', 5000)], texture = null, loss = noLoss, products = { quartz } }: Given): CourseQuantity[] {
  const input: EvaluationInput = {
    courses,
    mixes: { Body: body, Prime: prime, Patch: patch },
    products,
    onDate: '2026-12-01',
    sheetAgeLimitYears: 3,
    conditions: {
      slabTemperature: quantity(68, '°F'),
      airTemperature: quantity(68, '°F'),
      relativeHumidity: 45,
      substrateRelativeHumidity: null,
      moistureEmission: null,
      vocPlace: null,
    },
  }
  return jobQuantities({ floor: input, results: evaluate(input).courses, bays, texture, loss })
}
const gallons = (one: CourseQuantity | undefined) =>
  one && one.total.kind !== 'not-stated' ? greatestOf(one.total.value).value : Number.NaN

describe('quantities of a job', () => {
  const two = [
    course('prep', 'prep', {}),
    course('body', 'first', { mixId: 'Body', spreadRate: spread }),
    course('body', 'second', { mixId: 'Body', spreadRate: spread }),
  ]

  it('two coats at 150 ft²/gal on 5,000 ft² take 33.3 gal each before loss (common practice)', () => {
    const [first, second] = quantitiesOf({ courses: two })
    expect(gallons(first)).toBeCloseTo(33.333, 3)
    expect(gallons(second)).toBeCloseTo(33.333, 3)
    expect(quantitiesOf({ courses: two }), 'preparation takes no resin').toHaveLength(2)
  })

  it('shows the sum of each term', () => {
    const [first] = quantitiesOf({ courses: two, loss: { percent: 10, convention: 'lost' } })
    const film = first?.bays[0]?.film
    expect(film?.kind === 'computed' && film.working.sum).toBe('5,000 ft² × 6.67 gal per 1,000 ft² = 33.3 gal')
    expect(first?.total.kind === 'computed' && first.total.working.sum).toBe('33.3 gal ÷ (1 − 10 %) = 37 gal')
    expect(first?.bays[0]?.loss && formatFigure(first.bays[0].loss)).toBe('3.7 gal')
  })

  it('tells what is lost from what is added: 10 % lost is ÷ 0.9, 10 % added is × 1.1', () => {
    expect(gallons(quantitiesOf({ courses: two, loss: { percent: 10, convention: 'lost' } })[0])).toBeCloseTo(33.3333 / 0.9, 3)
    expect(gallons(quantitiesOf({ courses: two, loss: { percent: 10, convention: 'added' } })[0])).toBeCloseTo(33.3333 * 1.1, 3)
  })

  it('fills the texture of the slab once, under the first coat: 20 mil over 2,000 ft² is 24.9 gal', () => {
    const [first, second] = quantitiesOf({ courses: two, bays: [bay('1', 2000)], texture: quantity(20, 'mil') })
    expect(first?.bays[0]?.texture && formatFigure(first.bays[0].texture)).toBe('24.9 gal')
    expect(second?.bays[0]?.texture).toBeNull()
  })

  it('fills joints and spalls in the fill course, and lays no film there', () => {
    const joints = [{ length: quantity(320, 'ft'), width: quantity(0.25, 'in'), depth: quantity(1.5, 'in') }]
    const spalls = { area: quantity(120, 'ft²'), meanDepth: quantity(0.35, 'in') }
    const [fill] = quantitiesOf({
      courses: [course('fill', 'fill', { mixId: 'Patch' }), ...two],
      bays: [bay('1', 5000, { joints, spalls })],
    })
    expect(fill?.bays[0]).toMatchObject({ film: null, texture: null })
    expect(gallons(fill)).toBeCloseTo(6.234 + 26.18, 1)
  })

  it('leaves joints to the course that is named after them, spalls to the other', () => {
    const joints = [{ length: quantity(320, 'ft'), width: quantity(0.25, 'in'), depth: quantity(1.5, 'in') }]
    const spalls = { area: quantity(120, 'ft²'), meanDepth: quantity(0.35, 'in') }
    const fills = [
      course('fill', 'j', { mixId: 'Body', title: 'Joint filler' }),
      course('fill', 's', { mixId: 'Patch', title: 'Spall repair' }),
    ]
    const [jointFill, patchFill] = quantitiesOf({ courses: fills, bays: [bay('1', 5000, { joints, spalls })] })
    expect(gallons(jointFill)).toBeCloseTo(6.234, 2)
    expect(gallons(patchFill)).toBeCloseTo(26.18, 1)
  })

  it('is not stated where the thickness is not given, and is no nought', () => {
    const [only] = quantitiesOf({ courses: [course('body', 'b', { mixId: 'Body' })] })
    expect(only?.total.kind).toBe('not-stated')
    expect(only?.packing.plan).toBeNull()
  })

  it('takes no density of sand for granted', () => {
    const slurry = course('slurry', 's', {
      mixId: 'Body',
      thickness: { value: 125, unit: 'mil', film: 'wet' },
      filler: { productId: 'quartz', loading: quantity(13.8, 'lb/gal') },
    })
    const without = quantitiesOf({ courses: [slurry], products: { quartz: { ...quartz, facts: [] } } })
    expect(without[0]?.total).toMatchObject({ kind: 'not-stated', missing: { property: 'density', of: 'Teasel quartz' } })
    const heap = quantitiesOf({ courses: [slurry], products: { quartz: { ...quartz, facts: [fact('density', exactly(100, 'lb/ft³'))] } } })
    expect(heap[0]?.total).toMatchObject({
      kind: 'not-stated',
      missing: { because: '100 lb/ft³ is the density of the heap, not of the grain' },
    })
  })

  it('gives each part by volume and on the scale: 2:1 of 33.3 gal is 22.2 gal of A, 213 lb, and 11.1 gal of B, 92.2 lb', () => {
    const [first] = quantitiesOf({ courses: two })
    expect(first?.parts.map((part) => [part.part, formatFigure(part.volume), formatFigure(part.mass)])).toEqual([
      ['A', '22.2 gal', '213 lb'],
      ['B', '11.1 gal', '92.2 lb'],
    ])
  })
})

describe('kits of a job', () => {
  const bays = [bay('1', 700), bay('2', 700), bay('3', 700)]

  it('are counted bay by bay when the sheet forbids part kits: 3 × 4.67 gal are 6 kits of 3 gal', () => {
    const [only] = quantitiesOf({ courses: [course('body', 'b', { mixId: 'Body', spreadRate: spread })], bays })
    expect(only?.packing).toMatchObject({ partKits: 'forbidden', perBay: true, plan: { lines: [{ count: 6 }], cost: 1260 } })
  })

  it('are counted for the whole floor when it allows them: 14 gal are 5 kits', () => {
    const [only] = quantitiesOf({ courses: [course('prime', 'p', { mixId: 'Prime', spreadRate: spread })], bays })
    expect(only?.packing).toMatchObject({ partKits: 'allowed', perBay: false, plan: { lines: [{ count: 5 }], leftover: { value: 1 } } })
  })

  it('come on one order by maker, with what is left over and what it costs', () => {
    const courses = [
      course('prime', 'p', { mixId: 'Prime', title: 'Prime coat', spreadRate: spread }),
      course('body', 'b', {
        mixId: 'Body',
        title: 'Body coat',
        spreadRate: spread,
        broadcast: { productId: 'quartz', rate: quantity(0.5, 'lb/ft²'), toRefusal: true },
      }),
      course('seal', 's', { mixId: 'Body', title: 'Seal coat', spreadRate: spread }),
    ]
    const order = orderList(quantitiesOf({ courses, bays }))
    expect(
      order.makers.map(({ maker, lines }) => [maker, ...lines.map((line) => `${line.count} × ${line.item.name}: ${line.cost}`)]),
    ).toEqual([
      ['Ostrel', '5 × Ostrel Prime: 900', '12 × Ostrel Body: 2520'],
      ['Teasel', '21 × Teasel quartz: 294'],
    ])
    expect(order).toMatchObject({ cost: 3714, open: [] })
    expect(order.makers[0]?.lines[1]?.courses).toEqual(['Body coat', 'Seal coat'])
    expect(order.makers[0]?.leftovers).toMatchObject([{ name: 'Ostrel Prime' }, { name: 'Ostrel Body' }])
  })

  it('never come to a cost while something is unpriced or has no pack size', () => {
    const order = orderList(quantitiesOf({ courses: [course('body', 'x', { mixId: 'Patch', spreadRate: spread })], bays }))
    expect(order).toEqual({ makers: [], cost: null, open: ['Ostrel Patch'] })
  })
})

describe('whatever the job', () => {
  const area = fc.double({ min: 1, max: 50_000, noNaN: true })
  const percent = fc.double({ min: 0, max: 60, noNaN: true })
  const courses = [course('body', 'b', { mixId: 'Body', spreadRate: spread })]

  it('more area, texture or loss never needs less resin, and the kits hold it', () => {
    fc.assert(
      fc.property(area, area, percent, fc.constantFrom<Loss['convention']>('lost', 'added'), (...[one, more, loss, convention]) => {
        const total = (size: number, lossPercent: number, texture: Quantity | null = null) =>
          quantitiesOf({ courses, bays: [bay('1', size)], loss: { percent: lossPercent, convention }, texture })[0]
        const small = total(one, loss)
        expect(gallons(total(one + more, loss))).toBeGreaterThanOrEqual(gallons(small))
        expect(gallons(total(one, Math.min(60, loss + 5)))).toBeGreaterThanOrEqual(gallons(small))
        expect(gallons(total(one, loss, quantity(10, 'mil')))).toBeGreaterThanOrEqual(gallons(small))
        expect(small?.packing.plan?.held.value).toBeGreaterThanOrEqual(gallons(small) - 1e-6)
      }),
      { numRuns: 40 },
    )
  })

  it('a floor cut into bays needs what it needs whole', () => {
    fc.assert(
      fc.property(fc.array(area, { minLength: 1, maxLength: 6 }), (areas) => {
        const cut = quantitiesOf({ courses, bays: areas.map((size, index) => bay(String(index), size)) })[0]
        const whole = quantitiesOf({
          courses,
          bays: [
            bay(
              'all',
              areas.reduce((sum, size) => sum + size, 0),
            ),
          ],
        })[0]
        expect(gallons(cut) / gallons(whole)).toBeCloseTo(1, 9)
      }),
      { numRuns: 40 },
    )
  })
})
