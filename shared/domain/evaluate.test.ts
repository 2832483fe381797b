import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { courseOf, exampleFloor, fact, restate } from '../../tests/setup/example-floor.ts'
import { type Conditions, type Course, type EvaluationInput, evaluationInputSchema, preparationMethods, stages } from './build-up.ts'
import { newCourse } from './course.ts'
import { evaluate } from './evaluate.ts'
import { evaluationSchema } from './evaluation.ts'
import { type Fact, factSchema } from './fact.ts'
import { type Figure, isTypical } from './figure.ts'
import { propertyNames } from './property.ts'
import { units, unitsOf, valueIn } from './units.ts'

const oneIn = <T>(...of: readonly T[]) => fc.constantFrom(...of)
const number = (min: number, max: number) => fc.double({ min, max, noNaN: true })
const anyNumber = fc.oneof(number(-1e9, 1e9), number(-5, 120), oneIn(0, 1, 100))
const ids = oneIn('mix', 'mix two', 'gone', 'constructor', '__proto__')
const optional = <T>(arbitrary: fc.Arbitrary<T>) => fc.option(arbitrary, { nil: undefined })

const given = <T extends object>(record: T): T => Object.fromEntries(Object.entries(record).filter(([, value]) => value !== undefined)) as T
const quantities = fc.record({ value: anyNumber, unit: oneIn(...units) })
const ranges = fc
  .record({ min: optional(anyNumber), max: optional(anyNumber), unit: oneIn(...units) })
  .filter(({ min, max }) => (min !== undefined || max !== undefined) && (min ?? -Infinity) <= (max ?? Infinity))
  .map(given)
const values = fc.oneof(
  { arbitrary: ranges, weight: 6 },
  {
    arbitrary: fc
      .record({ parts: fc.array(number(0.001, 10_000), { minLength: 2, maxLength: 3 }), basis: optional(oneIn('volume', 'weight')) })
      .map(given),
    weight: 1,
  },
  {
    arbitrary: fc.record({
      codes: fc.array(oneIn('H302', 'H314', 'H317+H334', 'H350i', 'EUH205', 'P260', 'P305+P351+P338', 'H999'), { minLength: 1 }),
    }),
    weight: 1,
  },
  { arbitrary: oneIn({ text: 'Danger' }, { date: '2024-12' }, { is: false }, { name: 'Quartz', min: 10, unit: '%' as const }), weight: 1 },
)
const origins = oneIn<Fact['origin']>(
  { kind: 'entered', reason: 'letter', by: 'lead', at: '2026-01-01' },
  { kind: 'typical', source: 'common practice', dated: '2026' },
  {
    kind: 'stated',
    by: 'lead',
    at: '2026-01-01',
    citation: { sheetId: 's', revisionId: 'r1', sheetTitle: 'Sheet', revisionDate: null, page: 1, box: null, quote: null },
  },
)
const conditionsOfFact = fc
  .record({
    temperature: optional(quantities),
    mass: optional(quantities),
    film: optional(quantities),
    next: optional(oneIn('mix two', 'itself')),
  })
  .map(given)

/** Facts of the right form in any unit, of any property, under any conditions: what the schema lets through. */
const facts: fc.Arbitrary<Fact[]> = fc.array(
  fc
    .record({
      id: oneIn('a', 'b', 'c'),
      property: oneIn(...propertyNames),
      part: oneIn('mixed', 'A', 'B'),
      value: values,
      at: optional(conditionsOfFact),
      film: optional(oneIn('wet', 'dry')),
      of: optional(oneIn('air', 'slab', 'material')),
      thinned: optional(fc.boolean()),
      origin: origins,
    })
    .map((one) => factSchema.parse(given(one)) as Fact),
  { maxLength: 12 },
)

const amount = (dimension: 'density' | 'consumption') => fc.record({ value: number(1e-6, 90), unit: oneIn(...unitsOf(dimension)) })
const course = (index: number): fc.Arbitrary<Course> =>
  fc.record({
    id: fc.constant(`c${index}`),
    stage: oneIn(...stages),
    title: fc.constant(`Course ${index}`),
    mixId: fc.option(ids),
    thickness: fc.option(
      fc
        .record({ value: fc.oneof(number(0.001, 39), number(1, 200)), unit: oneIn('mil', 'µm', 'mm', 'in'), film: oneIn('wet', 'dry') })
        .filter((film) => valueIn(film, 'm') <= 1),
    ),
    spreadRate: fc.option(fc.record({ value: fc.oneof(number(0.001, 1e5), number(20, 400)), unit: oneIn('ft²/gal', 'm²/L') })),
    filler: fc.option(fc.record({ productId: oneIn('sand', 'gone', 'constructor'), loading: amount('density') })),
    broadcast: fc.option(fc.record({ productId: oneIn('sand', 'gone'), rate: amount('consumption'), toRefusal: fc.boolean() })),
    preparation: fc.option(
      fc.record({ method: oneIn(...preparationMethods), profile: optional(fc.integer({ min: 1, max: 10 })) }).map(given),
    ) as fc.Arbitrary<Course['preparation']>,
    startsAfter: fc.option(number(0, 8760)),
    note: fc.constant(''),
  })
const temperature = fc.oneof(
  fc.record({ value: number(-60, 100), unit: oneIn('°C') }),
  fc.record({ value: number(-76, 212), unit: oneIn('°F') }),
)
const conditions: fc.Arbitrary<Conditions> = fc.record({
  slabTemperature: temperature,
  airTemperature: temperature,
  relativeHumidity: number(1, 100),
  substrateRelativeHumidity: fc.option(number(0, 100)),
  moistureEmission: fc.option(fc.record({ value: number(0, 1e6), unit: oneIn(...unitsOf('emission')) })),
  vocPlace: oneIn(null, 'us-national', 'eu', 'nowhere', 'constructor'),
})

/** Any floor that the schema lets through: courses without mixes, mixes that are gone, facts that contradict one another or make no sense. */
const floors: fc.Arbitrary<EvaluationInput> = fc
  .record({
    courses: fc.integer({ min: 0, max: 14 }).chain((count) => fc.tuple(...Array.from({ length: count }, (_, index) => course(index)))),
    more: fc.tuple(facts, facts, facts, facts),
    kept: fc.subarray([...propertyNames]),
    conditions,
    onDate: oneIn('2026-12-01', '', 'today', '2026'),
    sheetAgeLimitYears: oneIn(3, 0.5, 1e9),
    status: oneIn('active', 'withdrawn'),
  })
  .map(({ courses, more, kept, conditions: room, onDate, sheetAgeLimitYears, status }) => {
    const { mix, input } = exampleFloor()
    const [ofMix, ofPart, ofSand, ofOther] = more
    const [a, b] = mix.parts
    const sand = {
      ...(a?.product ?? mix.parts[0]!.product),
      id: 'sand',
      name: 'Sand',
      kind: 'aggregate' as const,
      chemistry: 'silica' as const,
      facts: ofSand,
      sheets: [],
    }
    const facts = [...mix.facts.filter(({ property }) => kept.includes(property)), ...ofMix]
    const parts = mix.parts.map((part) =>
      part === b ? { ...part, product: { ...part.product, facts: [...part.product.facts, ...ofPart], sheets: [] } } : part,
    )
    const alone = { ...mix, id: 'mix two', name: 'mix two', status, parts: mix.parts.slice(0, 1), facts: ofOther }
    return {
      ...input,
      courses,
      conditions: room,
      onDate,
      sheetAgeLimitYears,
      products: { sand },
      mixes: { mix: { ...mix, status, facts, parts }, 'mix two': alone },
    }
  })

const known = (figure: Figure) => figure.kind !== 'not-stated'

describe('any floor that the schema lets through', () => {
  it('is worked out: never throws, answers in the form agreed, leaves its input alone and says the same twice', () => {
    fc.assert(
      fc.property(floors, (floor) => {
        const input = evaluationInputSchema.parse(floor)
        const before = structuredClone(input)
        const evaluation = evaluate(input)
        expect(evaluationSchema.safeParse(evaluation).error).toBeUndefined()
        expect(evaluation.courses.map(({ courseId }) => courseId)).toEqual(input.courses.map(({ id }) => id))
        expect(input).toEqual(before)
        expect(evaluate(input)).toEqual(evaluation)
      }),
      { numRuns: 400 },
    )
  })

  it('no check is met while a fact is missing or typical, every unknown names what is missing and whom to ask, and nothing is called safe', () => {
    fc.assert(
      fc.property(floors, (floor) => {
        for (const { status, missing, figures, says, todo } of evaluate(floor).findings) {
          expect(`${says} ${todo}`).not.toMatch(/\bsafe\b|NaN|Infinity|∞|undefined|\[object/i)
          if (status === 'met') {
            expect(missing).toEqual([])
            expect(figures.every(({ figure }) => known(figure) && !isTypical(figure))).toBe(true)
          } else expect(todo).not.toBe('')
          if (status === 'unknown') expect(missing.length + figures.filter(({ figure }) => isTypical(figure)).length).toBeGreaterThan(0)
          for (const { of, ask } of missing) expect(of !== '' && ask !== '').toBe(true)
        }
      }),
      { numRuns: 400 },
    )
  })

  it('figures never hold a number that is none', () => {
    fc.assert(
      fc.property(floors, (floor) => {
        const { courses, totals, timeline } = evaluate(floor)
        const figures = [
          ...Object.values(totals),
          ...courses.flatMap((one) => [one.wetFilm, one.dryFilm, one.spreadRate, one.resinPerArea, one.potLife, one.window, one.voc]),
        ]
        for (const figure of figures)
          if (figure.kind !== 'not-stated') expect([figure.value.min ?? 0, figure.value.max ?? 0].every(Number.isFinite)).toBe(true)
        for (const one of courses)
          for (const { massShare, volumeShare } of one.proportions) expect((massShare ?? 0) >= 0 && (volumeShare ?? 0) <= 1).toBe(true)
        for (const { start, windowOpens } of timeline)
          if (start !== null && windowOpens !== null) expect(windowOpens).toBeGreaterThanOrEqual(start)
      }),
      { numRuns: 300 },
    )
  })
})

describe('working a floor out', () => {
  it('two coats at 150 ft²/gal are 10.7 mil wet each (common practice), and the sum is shown', () => {
    const { courses, totals } = evaluate(exampleFloor().input)
    const wet = courses[1]?.wetFilm
    expect(wet?.kind === 'computed' && wet.working.sum).toBe('1,604.17 ft²·mil/gal ÷ 150 ft²/gal = 10.7 mil')
    expect(totals.thickness.kind === 'computed' && totals.thickness.value.min).toBeCloseTo(2 * (1604.1667 / 150), 3)
  })

  it('98 ± 2 % solids leave 9.6–10 mil of 10 wet, and 10 mil dry asks for 10–10.4 wet', () => {
    const floor = exampleFloor()
    restate(floor, 'volumeSolids', fact('volumeSolids', { min: 96, max: 100, unit: '%' }))
    Object.assign(courseOf(floor, 'prime'), { spreadRate: null, thickness: { value: 10, unit: 'mil', film: 'wet' } })
    Object.assign(courseOf(floor, 'top'), { spreadRate: null, thickness: { value: 10, unit: 'mil', film: 'dry' } })
    const [, prime, top] = evaluate(floor.input).courses
    expect(prime?.dryFilm).toMatchObject({ value: { min: 9.6, max: 10, unit: 'mil' } })
    expect(top?.wetFilm.kind === 'computed' && top.wetFilm.value.min).toBeCloseTo(10, 10)
    expect(top?.wetFilm.kind === 'computed' && top.wetFilm.value.max).toBeCloseTo(10 / 0.96, 10)
    // the most that the film can take: 1,000 ft² × 10.417 mil ÷ 1,604.17
    expect(top?.resinPerArea.kind === 'computed' && top.resinPerArea.value.max).toBeCloseTo((1000 * (10 / 0.96)) / 1604.1667, 3)
  })

  it('solids given as a greatest alone do not tell the dry film', () => {
    const floor = exampleFloor()
    restate(floor, 'volumeSolids', fact('volumeSolids', { max: 60, unit: '%' }))
    expect(evaluate(floor.input).courses[1]?.dryFilm).toMatchObject({
      kind: 'not-stated',
      missing: { property: 'volumeSolids', because: 'the sheet states the greatest only' },
    })
  })

  it('a film in hours or solids of 140 % are facts of nothing', () => {
    const floor = exampleFloor()
    restate(
      floor,
      'volumeSolids',
      fact('volumeSolids', { min: 140, max: 140, unit: '%' }),
      fact('volumeSolids', { min: 3, max: 3, unit: 'h' }),
    )
    expect(evaluate(floor.input).courses[1]?.dryFilm.kind).toBe('not-stated')
  })

  it('wheels return when the last of the courses allows them, be it beneath a faster top', () => {
    const floor = exampleFloor()
    const slow = fact('vehicleTraffic', { min: 48, max: 72, unit: 'h' })
    const fast = { ...floor.mix, id: 'fast', name: 'Fast top', facts: [fact('vehicleTraffic', { min: 6, max: 6, unit: 'h' })] }
    restate(floor, 'vehicleTraffic', slow)
    floor.input.mixes['fast'] = fast
    courseOf(floor, 'top').mixId = 'fast'
    const { hoursToVehicles } = evaluate(floor.input).totals
    expect(hoursToVehicles).toMatchObject({
      kind: 'computed',
      value: { max: 72 },
      working: { formula: 'start of Prime coat + its sheet’s time' },
    })
  })

  it('nothing laid: nothing known, and nothing found', () => {
    const floor = exampleFloor()
    floor.input.courses = []
    const { totals, findings } = evaluate(floor.input)
    expect([totals.thickness, totals.vocWorst, totals.hoursToFoot].map(({ kind }) => kind)).toEqual([
      'not-stated',
      'not-stated',
      'not-stated',
    ])
    expect(findings).toEqual([])
  })

  it('a start not planned waits for the window beneath; with none stated it is not known', () => {
    const floor = exampleFloor()
    floor.input.courses = [
      courseOf(floor, 'prep'),
      { ...courseOf(floor, 'prime'), startsAfter: null },
      newCourse('grind', 'grind'),
      { ...courseOf(floor, 'top'), startsAfter: null },
    ]
    expect(evaluate(floor.input).timeline.map(({ start }) => start)).toEqual([0, 0, 9, 9])
    restate(floor, 'recoatWindow')
    expect(evaluate(floor.input).timeline.map(({ start }) => start)).toEqual([0, 0, null, null])
  })
})
