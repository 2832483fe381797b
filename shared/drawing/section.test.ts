import { describe, expect, it } from 'vitest'
import type { Stage } from '../domain/build-up.ts'
import { scaleFor } from './scale.ts'
import { type SectionOptions, sectionOf, sectionSvg } from './section.ts'
import type { SectionLayer } from './section-layer.ts'
import { lengthText } from './section-words.ts'

const mil = 25.4
const layer = (
  id: string,
  stage: Stage,
  { thicknessInMil = null, ...more }: Partial<SectionLayer> & { thicknessInMil?: number | null } = {},
): SectionLayer => ({
  id,
  stage,
  title: `${stage} ${id}`,
  detail: '',
  color: '#8f9a98',
  thickness: thicknessInMil === null ? null : thicknessInMil * mil,
  typical: false,
  profile: null,
  filler: null,
  broadcast: null,
  status: null,
  ...more,
})
const freight = [
  layer('1', 'prep', { profile: 5 }),
  layer('2', 'fill'),
  layer('3', 'slurry', { thicknessInMil: 125, filler: { grain: 425 } }),
  layer('4', 'prime', { thicknessInMil: 10.7 }),
  layer('5', 'top', { thicknessInMil: 10.7 }),
]
const fourteen = [
  layer('1', 'prep', { profile: 6 }),
  layer('2', 'fill'),
  layer('3', 'prime', { thicknessInMil: 6 }),
  layer('4', 'slurry', { thicknessInMil: 125, filler: { grain: null } }),
  layer('5', 'grind'),
  layer('6', 'prime', { thicknessInMil: 6 }),
  layer('7', 'broadcast', { thicknessInMil: 20, broadcast: { grain: 600, toRefusal: true } }),
  layer('8', 'broadcast', { thicknessInMil: 20, broadcast: { grain: 600, toRefusal: false } }),
  layer('9', 'body', { thicknessInMil: 40 }),
  layer('10', 'body'),
  layer('11', 'seal', { thicknessInMil: 10 }),
  layer('12', 'top', { thicknessInMil: 5 }),
  layer('13', 'top', { thicknessInMil: 3, status: 'stop' }),
  layer('14', 'cove'),
]
const builder: SectionOptions = { width: 330, height: 588, unit: 'mil' }
const texts = (options: SectionOptions, layers = freight) =>
  sectionOf(layers, options).shapes.flatMap((shape) => (shape.kind === 'text' ? [shape.text] : []))

describe('sectionOf', () => {
  it.each([
    ['two courses', freight.slice(2, 4)],
    ['five courses', freight],
    ['fourteen courses', fourteen],
  ])('draws %s true to scale within each band', (_, layers) => {
    const model = sectionOf(layers, builder)
    for (const drawn of model.layers) {
      if (drawn.thickness === null || drawn.top === drawn.bottom) continue
      expect((drawn.bottom - drawn.top) / scaleFor(drawn.thickness, model.scale)).toBeCloseTo(drawn.thickness, 4)
    }
  })

  it('lays each course on the one beneath without a gap and keeps all of them within the figure', () => {
    const { layers } = sectionOf(fourteen, builder)
    const films = layers.filter((one) => one.top < one.bottom)
    expect(films).toHaveLength(10)
    films.slice(1).forEach((one, index) => expect(one.bottom).toBeCloseTo(films[index]?.top ?? NaN, 6))
    expect(films.at(-1)?.top).toBeGreaterThan(0)
    expect(films[0]?.bottom).toBeLessThan(588)
  })

  it('says by how much films are enlarged, and in whose scale', () => {
    const model = sectionOf(freight, builder)
    expect(model.notes).toContain(`Films up to 10.7 mil drawn ${model.scale.filmFactor} × the slurry’s scale.`)
    expect(model.scale.filmFactor).toBeGreaterThan(1)
  })

  it('writes the true figures on the dimension lines in the chosen unit', () => {
    expect(texts(builder)).toEqual(expect.arrayContaining(['125', '10.7', '146 mil']))
    // 125 mil = 3,175 µm; 10.7 mil = 271.8 µm
    expect(texts({ ...builder, unit: 'µm' })).toEqual(expect.arrayContaining(['3,175', '272', '3,719 µm']))
    // 146.4 mil = 0.146 in
    expect(texts({ ...builder, unit: 'in' })).toEqual(expect.arrayContaining(['0.125', '0.0107', '0.146 in']))
  })

  it('does not total what it does not know, and draws it dashed', () => {
    const model = sectionOf(fourteen, builder)
    expect(texts(builder, fourteen)).toEqual(expect.arrayContaining(['?', 'not known']))
    expect(model.notes).toContain('Dashed: thickness not known.')
    expect(model.shapes.some((shape) => shape.kind === 'path' && shape.course === '10' && shape.dash)).toBe(true)
  })

  it('marks what stands in for a survey, for a grain size and for a stop', () => {
    expect(sectionOf(fourteen, builder).notes).toEqual(
      expect.arrayContaining([
        'Spalls and joints not surveyed: drawn as a stand-in.',
        'Grain size not stated: sand drawn as a stand-in.',
        'Hatched: a check stops this course.',
      ]),
    )
    const plain = sectionOf([layer('1', 'prep', { profile: 2 }), layer('2', 'top', { thicknessInMil: 10 })], builder)
    expect(plain.notes).toEqual(['Dimensions in mil, wet.', 'Slab and profile not to scale.'])
  })

  it('reads the courses from the top down', () => {
    expect(sectionOf(freight, builder).alternative).toBe(
      'Section through the floor, from the top down. Course 5, top 5, 10.7 mil. Course 4, prime 4, 10.7 mil. Course 3, slurry 3, 125 mil, filled with sand. ' +
        'Course 2, fill 2. Course 1, prep 1, surface profile CSP 5. Concrete slab.',
    )
    expect(sectionOf([], builder).alternative).toBe('Section through the floor: a concrete slab without courses yet.')
  })

  it('runs a leader from every course to its row', () => {
    const anchors = Object.fromEntries(freight.map(({ id }, index) => [id, 540 - index * 84]))
    const { shapes } = sectionOf(freight, { ...builder, anchors })
    for (const [id, y] of Object.entries(anchors)) {
      expect(shapes.some((shape) => shape.kind === 'path' && shape.course === id && shape.d.endsWith(`L330 ${y}`))).toBe(true)
    }
  })

  it('is the same figure each time, standalone or small, and well-formed', () => {
    const svg = sectionSvg(sectionOf(fourteen, { width: 640, height: 700, unit: 'mil', standalone: true }))
    expect(svg).toBe(sectionSvg(sectionOf(fourteen, { width: 640, height: 700, unit: 'mil', standalone: true })))
    expect(svg).not.toMatch(/NaN|undefined|Infinity/)
    expect(sectionSvg(sectionOf([layer('1', 'top', { thicknessInMil: 5, title: 'A & <B>' })], { ...builder, standalone: true }))).toContain(
      'A &amp; &lt;B&gt;',
    )
    const small = sectionOf(fourteen, { width: 132, height: 56, unit: 'mil', compact: true })
    expect(small.shapes.filter((shape) => shape.kind === 'text')).toEqual([])
    expect(sectionSvg(small).length).toBeLessThan(40_000)
  })
})

describe('lengthText', () => {
  it('keeps three figures that count', () => {
    expect([10.6945, 125, 3, 1000, 2.5].map((value) => lengthText(value * mil, 'mil'))).toEqual(['10.7', '125', '3', '1,000', '2.5'])
  })
})
