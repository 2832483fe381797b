import { describe, expect, it } from 'vitest'
import { type Example, courseOf, exampleFloor, fact } from '../../tests/setup/example-floor.ts'
import { preparationMethods, stages } from './build-up.ts'
import { newCourse } from './course.ts'
import { handledIn } from './course-result.ts'
import { dustOf, phaseOf } from './hazard-phases.ts'

const prepared = (method: (typeof preparationMethods)[number]) => dustOf({ stage: 'prep', preparation: { method } })
const idsOf = (floor: Example, id: string) => phaseOf(courseOf(floor, id), floor.input).cautions.map((caution) => caution.id)
const withCodes = (floor: Example, codes: string[]) =>
  floor.mix.parts.forEach(({ product }) => product.facts.push(fact('hazardStatements', { codes })))

describe('dust of preparing (29 CFR 1926.1153 Table 1, condensed)', () => {
  it('grinding has rows of its own: floor grinders (xiii), handheld grinders (xii) at the edges', () => {
    expect(prepared('grinding')?.tasks.map(({ row }) => row)).toEqual(['(xiii)', '(xii)'])
    expect(dustOf(newCourse('grind', 'a'))?.tasks.map(({ row }) => row)).toEqual(['(xiii)', '(xii)'])
  })

  it('indoors a handheld grinder over four hours asks for a protection factor of 10, a floor grinder for a HEPA vacuum between passes', () => {
    const [floorGrinder, handheld] = prepared('grinding')?.tasks ?? []
    expect(handheld?.indoors).toEqual({ upTo4h: null, over4h: 10 })
    expect(floorGrinder).toMatchObject({
      indoors: { upTo4h: null, over4h: null },
      indoorsBesides: 'vacuum loose dust with a HEPA filter between passes',
    })
  })

  it.each(['steel shot blasting', 'abrasive blasting', 'scabbling'] as const)(
    '%s is no task of the table: assess the exposure',
    (method) => {
      expect(prepared(method)?.tasks).toEqual([])
      expect(prepared(method)?.says).toMatch(/assess the exposure/)
    },
  )

  it('nothing dry is swept or blown, whatever the method', () => {
    for (const method of preparationMethods) {
      const dust = prepared(method)
      if (dust) expect(dust.says).toMatch(/Do not sweep dry and do not blow/)
    }
  })

  it('washing and etching raise no dust; laying resin raises none of its own', () => {
    expect([prepared('detergent scrubbing'), prepared('acid etching'), dustOf(newCourse('top', 'a'))]).toEqual([null, null, null])
  })
})

describe('cautions of a step', () => {
  it('of the slab: asbestos and lead, carbon monoxide; of etching: the acid', () => {
    expect(idsOf(exampleFloor(), 'prep')).toEqual(['old-floor', 'engines'])
    const floor = exampleFloor()
    courseOf(floor, 'prep').preparation = { method: 'acid etching', profile: 2 }
    expect(idsOf(floor, 'prep')).toContain('acid')
  })

  it('of a two-part mix: the pail that heats by itself; of one part alone: not', () => {
    const floor = exampleFloor()
    expect(idsOf(floor, 'top')).toContain('exotherm')
    floor.mix.parts = floor.mix.parts.slice(0, 1)
    expect(idsOf(floor, 'top')).not.toContain('exotherm')
  })

  it.each([
    ['H334', 'isocyanate'],
    ['H317', 'sensitizer'],
    ['H314', 'corrosive'],
    ['H318', 'corrosive'],
    ['H225', 'flammable'],
    ['H226', 'flammable'],
  ] as const)('what the label says of %s calls for the caution "%s"', (code, id) => {
    const floor = exampleFloor()
    expect(idsOf(floor, 'top')).not.toContain(id)
    withCodes(floor, [code])
    expect(idsOf(floor, 'top')).toContain(id)
  })

  it('sand in the pail or on the film: dust at the mixer, which is no task of Table 1', () => {
    const floor = exampleFloor()
    courseOf(floor, 'top').broadcast = { productId: 'sand', rate: { value: 0.5, unit: 'lb/ft²' }, toRefusal: true }
    expect(idsOf(floor, 'top')).toContain('sand')
  })

  it('each says who decides, and none that anything suffices', () => {
    const floor = exampleFloor()
    withCodes(floor, ['H314', 'H317', 'H334', 'H225'])
    for (const stage of stages) {
      for (const method of preparationMethods) {
        const course = { ...newCourse(stage, 'x'), mixId: 'mix', preparation: { method } }
        for (const { says, defer, title } of phaseOf(course, floor.input).cautions) {
          expect(defer).not.toBe('')
          expect(`${title} ${says}`).not.toMatch(/\bsafe\b|suffices|is enough|protects fully/i)
        }
      }
    }
  })
})

describe('one safety sheet for a whole mix', () => {
  it('what it says of part A goes with the product in part A, what it says of the mix stands under the mix’s name', () => {
    const floor = exampleFloor()
    floor.mix.facts.push(fact('hazardStatements', { codes: ['H317'] }, { part: 'A' }), fact('hazardStatements', { codes: ['H411'] }))
    const handled = handledIn(courseOf(floor, 'top'), floor.input)
    expect(handled.map(({ name, facts }) => [name, facts.filter(({ property }) => property === 'hazardStatements').length])).toEqual([
      ['Part A', 1],
      ['Part B', 0],
      ['Example epoxy', 1],
    ])
  })
})
