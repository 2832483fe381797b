import { describe, expect, it } from 'vitest'
import { type Example, exampleFloor, fact } from '../../../tests/setup/example-floor.ts'
import { newCourse } from '../course.ts'
import { type Item, type SpecDocument, plainText } from './document.ts'
import type { SpecInput } from './floor.ts'
import { specify } from './specify.ts'

/** A job on the example floor, bent by a test first. Invented throughout. */
function specified(bend: (example: Example) => void = () => undefined, more: Partial<SpecInput> = {}): SpecDocument {
  const example = exampleFloor()
  bend(example)
  return specify({
    header: {
      firm: { name: 'Brackenholt Floors', address: '', phone: '' },
      project: 'Filling hall',
      jobNumber: 1,
      client: '',
      site: '',
      sectionNumber: '09 67 23',
      sectionTitle: 'Resinous flooring',
      date: '2026-12-01',
      issue: null,
    },
    buildUp: { number: 1, name: 'Example', version: 1, status: 'released', releasedAt: null, releasedByName: null },
    input: example.input,
    reasons: {},
    bays: [{ id: 'bay', name: 'Bay 1', area: { value: 1500, unit: 'ft²' }, joints: [], spalls: null }],
    texture: null,
    loss: { percent: 5, convention: 'lost' },
    ...more,
  })
}

const linesOf = (items: readonly Item[]): string[] => items.flatMap((item) => [plainText(item.runs), ...linesOf(item.items)])
const article = ({ parts }: SpecDocument, id: string) =>
  linesOf(parts.flatMap(({ articles }) => articles).find((one) => one.id === id)?.items ?? [])
const rowsOf = ({ schedules }: SpecDocument, id: string) =>
  schedules.find((one) => one.id === id)?.rows.map((row) => row.map(plainText)) ?? []

describe('the written specification', () => {
  it('is the same document for the same facts', () => {
    expect(JSON.stringify(specified())).toBe(JSON.stringify(specified()))
  })

  // SectionFormat (CSI), from memory: three parts always; a part with nothing in it says "Not used", which the printers write for no articles.
  it('of a floor without courses keeps its three parts, the last two empty', () => {
    const { parts } = specified(({ input }) => input.courses.splice(0))
    expect(parts.map(({ number }) => number)).toEqual([1, 2, 3])
    expect(parts[1]?.articles).toEqual([])
    expect(parts[2]?.articles).toEqual([])
  })

  it('names at the front everything that it calls not stated', () => {
    const document = specified(({ mix }) => {
      mix.facts = mix.facts.filter(({ property }) => !['surfaceProfile', 'recoatWindow'].includes(property))
    })
    const front = linesOf(document.front.unknowns)
    expect(front).toContainEqual('Surface profile: not stated for Example epoxy. Ask the maker, in writing.')
    expect(front.some((line) => line.startsWith('Recoat window of Example epoxy: not stated'))).toBe(true)
    expect(front.some((line) => line.startsWith('Pull-off strength: not stated for Example epoxy'))).toBe(true)
    expect(front.some((line) => line.startsWith('Part kits allowed: not stated for Example epoxy'))).toBe(true)
  })

  it('tells a reason beside the check that it answers, and says so where there is none', () => {
    const bend = ({ input }: Example) => {
      input.conditions = { ...input.conditions, substrateRelativeHumidity: 90 }
    }
    expect(linesOf(specified(bend).front.overrides).join(' ')).toMatch(/Moisture in the slab.*not met.*No reason is recorded/)
  })

  // 2 : 1 by volume at 9.6 and 8.3 lb/gal: 2 × 9.6 : 8.3 = 100 : 43.2 by weight. Source: conservation of mass.
  it('adds the ratio by weight through the densities where the sheet gives it by volume alone', () => {
    const document = specified(({ mix }) => {
      mix.facts = mix.facts.filter(({ value }) => !('parts' in value && value.basis === 'weight'))
    })
    expect(article(document, 'mixes').some((line) => /^By weight, through the densities: 100 : 43\.2 \[W\d+\]\.$/.test(line))).toBe(true)
    expect(article(specified(), 'mixes').some((line) => line.startsWith('By weight'))).toBe(false)
  })

  it('asks for three moisture tests in the first 1,000 ft² and one for each further 1,000 begun (ASTM F2170, from memory)', () => {
    const tests = (area: number) =>
      article(
        specified(undefined, { bays: [{ id: 'b', name: 'B', area: { value: area, unit: 'ft²' }, joints: [], spalls: null }] }),
        'examination',
      ).join(' ')
    expect(tests(1000)).toContain('3 tests')
    expect(tests(1001)).toContain('4 tests')
    expect(tests(7350)).toContain('10 tests')
    expect(article(specified(undefined, { bays: [] }), 'examination').join(' ')).toContain('or ASTM F1869: not stated')
  })

  it('gives a joint fill no film: it takes what the joints hold', () => {
    const document = specified(({ input }) => {
      input.courses.splice(1, 0, { ...newCourse('fill', 'fill'), mixId: 'mix' })
    })
    const [, fill] = rowsOf(document, 'system')
    expect(fill?.slice(2, 5)).toEqual(['as the joints and cracks take: schedule of areas', '–', '–'])
    expect(linesOf(document.front.unknowns).join(' ')).not.toContain('neither thickness')
  })

  it('looks for the safety sheet of a mix at its parts, and for the data sheet of a part at its mix', () => {
    const [mix, partA] = rowsOf(specified(), 'sheets')
    expect(mix?.slice(2)).toEqual(['data sheet, 1 June 2025', 'one for each part, below'])
    expect(partA?.slice(2)).toEqual(['that of the mix, above', 'safety sheet, 1 June 2025'])
    const bare = specified(({ mix: { parts } }) => parts.forEach(({ product }) => (product.sheets = [])))
    expect(rowsOf(bare, 'sheets').map((row) => row[3])).toEqual(['no sheet loaded', 'no sheet loaded', 'no sheet loaded'])
  })

  it('holds field quality control against the limits of the sheets', () => {
    const rows = rowsOf(specified(), 'field-quality')
    const limit = (what: string) => rows.find(([name]) => name === what)?.[3]
    expect(limit('Relative humidity in the slab')).toBe('Example epoxy: ≤ 80 % [E1]')
    expect(limit('Pull-off strength')).toBe('Example epoxy: not stated')
    expect(limit('Surface profile')).toMatch(/: CSP 4\. Sheets: Example epoxy: CSP 3–5 \[E1\]$/)
    // 1604.17 ft²·mil/gal ÷ 150 ft²/gal = 10.7 mil
    expect(limit('Wet film')).toMatch(/10\.7 mil \[W\d+\] wet, sheet 8–12 mil wet \[E1\]/)
  })

  it('cautions against what the labels and the work call for, each with who decides', () => {
    const hazards = article(
      specified(({ mix }) => mix.parts[0]?.product.facts.push(fact('hazardStatements', { codes: ['H314', 'H317'] }))),
      'hazards',
    )
    expect(hazards.some((line) => /^Burns eyes and skin, .*Decides: /.test(line))).toBe(true)
    expect(hazards.some((line) => /^Sensitizes by skin, .*Decides: /.test(line))).toBe(true)
    expect(hazards.some((line) => line.startsWith('Sensitizes by breathing'))).toBe(false)
    expect(hazards.some((line) => /^Dust, .*29 CFR 1926\.1153/.test(line))).toBe(true)
    expect(hazards.join(' ')).not.toMatch(/\bsafe\b/)
  })

  it('says "not stated" for equipment of a course whose safety sheets are silent', () => {
    const [, prime] = rowsOf(specified(), 'hazards')
    expect(prime?.slice(2)).toEqual(['not stated', 'not stated', 'not stated'])
  })
})
