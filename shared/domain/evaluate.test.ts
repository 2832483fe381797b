import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { exampleFloor, fact } from '../../tests/setup/example-floor.ts'
import { type Course, preparationMethods, stages } from './build-up.ts'
import { evaluate } from './evaluate.ts'
import { propertyNames } from './property.ts'

const course = (index: number): fc.Arbitrary<Course> =>
  fc.record({
    id: fc.constant(`c${index}`),
    stage: fc.constantFrom(...stages),
    title: fc.constant(`Course ${index}`),
    mixId: fc.constantFrom('mix', 'gone', null),
    thickness: fc.option(
      fc.record({
        value: fc.double({ min: 0.1, max: 500, noNaN: true }),
        unit: fc.constantFrom('mil', 'µm', 'mm', 'in'),
        film: fc.constantFrom('wet', 'dry'),
      }),
    ),
    spreadRate: fc.constant(null),
    filler: fc.option(
      fc.record({ productId: fc.constantFrom('sand', 'gone'), loading: fc.constant({ value: 10, unit: 'lb/gal' as const }) }),
    ),
    broadcast: fc.option(
      fc.record({
        productId: fc.constantFrom('sand', 'gone'),
        rate: fc.constant({ value: 0.5, unit: 'lb/ft²' as const }),
        toRefusal: fc.boolean(),
      }),
    ),
    preparation: fc.option(fc.record({ method: fc.constantFrom(...preparationMethods), profile: fc.integer({ min: 1, max: 10 }) })),
    startsAfter: fc.option(fc.double({ min: 0, max: 400, noNaN: true })),
    note: fc.constant(''),
  })

describe('working a floor out', () => {
  it('never throws, and no check is met while a fact is missing: 500 random floors over random gaps in the sheets', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 0, max: 14 }).chain((count) => fc.tuple(...Array.from({ length: count }, (_, index) => course(index)))),
        fc.subarray([...propertyNames]),
        fc.double({ min: -20, max: 140, noNaN: true }),
        (courses, gaps, slab) => {
          const { input, mix } = exampleFloor()
          mix.facts = mix.facts.filter(({ property }) => !gaps.includes(property))
          const evaluation = evaluate({
            ...input,
            courses,
            conditions: { ...input.conditions, slabTemperature: { value: slab, unit: '°F' } },
          })
          expect(evaluation.courses).toHaveLength(courses.length)
          for (const finding of evaluation.findings) if (finding.status === 'met') expect(finding.missing).toEqual([])
        },
      ),
      { numRuns: 500 },
    )
  })

  it('a typical value never makes a check met', () => {
    const { input, mix } = exampleFloor()
    mix.facts = mix.facts.map((one) =>
      one.property === 'dewPointMargin'
        ? { ...fact('dewPointMargin', one.value), origin: { kind: 'typical', source: 'common practice', dated: '2026' } }
        : one,
    )
    const said = evaluate(input).findings.filter(({ checkId }) => checkId === 'dew-point-margin')
    expect(said.every(({ status }) => status === 'unknown')).toBe(true)
  })

  it('two coats at 150 ft²/gal are 10.7 mil wet each (common practice), and the sum is shown', () => {
    const { courses, totals } = evaluate(exampleFloor().input)
    const wet = courses[1]?.wetFilm
    expect(wet?.kind === 'computed' && wet.working.sum).toBe('1,604.17 ft²·mil/gal ÷ 150 ft²/gal = 10.7 mil')
    expect(totals.thickness.kind === 'computed' && totals.thickness.value.min).toBeCloseTo(2 * (1604.1667 / 150), 3)
  })
})
