import { describe, expect, it } from 'vitest'
import { type Example, courseOf, exampleFloor, fact, restate } from '../../../tests/setup/example-floor.ts'
import { evaluate } from '../evaluate.ts'
import type { FindingStatus } from '../finding.ts'
import type { Property } from '../property.ts'
import { checks } from './index.ts'

type Bend = (floor: Example) => void
const without =
  (property: Property): Bend =>
  (floor) =>
    restate(floor, property)
const course = courseOf

interface Bent {
  status: FindingStatus
  title: string
  bend: Bend
}

/** For each check: how the example floor is bent, and what the check says then. */
const examples: Record<string, Bent[]> = {
  'profile-for-film': [
    {
      status: 'met',
      title: '21.4 mil over CSP 4 (ICRI 310.2R: high build 10–40 mil asks for CSP 3–5, from memory)',
      bend: () => undefined,
    },
    {
      status: 'stop',
      title: 'the same over CSP 2 is too smooth',
      bend: (floor) => void (course(floor, 'prep').preparation = { method: 'grinding', profile: 2 }),
    },
    {
      status: 'caution',
      title: 'over CSP 7 is rougher than asked for',
      bend: (floor) => {
        course(floor, 'prep').preparation = { method: 'steel shot blasting', profile: 7 }
        without('surfaceProfile')(floor)
      },
    },
    { status: 'unknown', title: 'no preparation is given', bend: (floor) => void (course(floor, 'prep').preparation = null) },
  ],
  'prep-reaches-profile': [
    { status: 'met', title: 'shot blasting reaches CSP 4 (ICRI 310.2R: 2–9, from memory)', bend: () => undefined },
    {
      status: 'stop',
      title: 'acid etching does not reach CSP 4 (1–3)',
      bend: (floor) => void (course(floor, 'prep').preparation = { method: 'acid etching', profile: 4 }),
    },
    {
      status: 'caution',
      title: 'scarifying is rougher than CSP 3 (4–7)',
      bend: (floor) => void (course(floor, 'prep').preparation = { method: 'scarifying', profile: 3 }),
    },
    { status: 'unknown', title: 'no profile is given', bend: (floor) => void (course(floor, 'prep').preparation = { method: 'grinding' }) },
  ],
  'film-in-range': [
    { status: 'met', title: '10.7 mil within 8–12 mil wet', bend: () => undefined },
    {
      status: 'stop',
      title: '16 mil is above it: 1,604 ÷ 100 ft²/gal',
      bend: (floor) => void (course(floor, 'top').spreadRate = { value: 100, unit: 'ft²/gal' }),
    },
    { status: 'unknown', title: 'no film is stated', bend: without('filmThickness') },
    {
      status: 'unknown',
      title: 'wet or dry is not said and the two differ: 14 mil wet, 7 dry at 50 % solids against 8–15 mil',
      bend: (floor) => {
        without('filmThickness')(floor)
        without('volumeSolids')(floor)
        floor.mix.facts.push(fact('filmThickness', { min: 8, max: 15, unit: 'mil' }), fact('volumeSolids', { min: 50, max: 50, unit: '%' }))
        course(floor, 'top').spreadRate = null
        course(floor, 'top').thickness = { value: 14, unit: 'mil', film: 'wet' }
      },
    },
  ],
  'window-opens': [
    { status: 'met', title: '12 h after the coat beneath, window 9–24 h at 70 °F', bend: () => undefined },
    { status: 'stop', title: '8 h is too early', bend: (floor) => void (course(floor, 'top').startsAfter = 8) },
    {
      status: 'unknown',
      title: 'at 45 °F the sheet has stopped at 50 °F',
      bend: (floor) => void (floor.input.conditions.slabTemperature = { value: 45, unit: '°F' }),
    },
  ],
  'window-closes': [
    { status: 'met', title: '12 h is before 24 h', bend: () => undefined },
    { status: 'stop', title: '30 h is after it', bend: (floor) => void (course(floor, 'top').startsAfter = 30) },
    {
      status: 'unknown',
      title: 'no latest time is stated',
      bend: (floor) => {
        without('recoatWindow')(floor)
        floor.mix.facts.push(fact('recoatWindow', { min: 9, unit: 'h' }, { at: { temperature: { value: 70, unit: '°F' } } }))
      },
    },
  ],
  'ratio-bases-agree': [
    { status: 'met', title: '2 : 1 by volume of 9.6 and 8.3 lb/gal is 100 : 43.2 by weight', bend: () => undefined },
    {
      status: 'stop',
      title: '2 : 1 by weight beside 2 : 1 by volume is 13.5 % short of hardener by volume',
      bend: (floor) => {
        without('mixRatio')(floor)
        floor.mix.facts.push(fact('mixRatio', { parts: [2, 1], basis: 'volume' }), fact('mixRatio', { parts: [2, 1], basis: 'weight' }))
      },
    },
    {
      status: 'caution',
      title: '100 : 41.8 beside 43.2 is 3.4 % off',
      bend: (floor) => {
        without('mixRatio')(floor)
        floor.mix.facts.push(
          fact('mixRatio', { parts: [2, 1], basis: 'volume' }),
          fact('mixRatio', { parts: [100, 41.8], basis: 'weight' }),
        )
      },
    },
    {
      status: 'unknown',
      title: 'the ratio is stated by volume alone',
      bend: (floor) => restate(floor, 'mixRatio', fact('mixRatio', { parts: [2, 1], basis: 'volume' })),
    },
    {
      status: 'unknown',
      title: 'both bases, but no densities that tie them',
      bend: ({ mix }) => mix.parts.forEach(({ product }) => (product.facts = [])),
    },
  ],
  'temperature-in-range': [
    { status: 'met', title: '70 °F within 50–90 °F', bend: () => undefined },
    {
      status: 'stop',
      title: 'a slab of 48 °F is outside',
      bend: (floor) => void (floor.input.conditions.slabTemperature = { value: 48, unit: '°F' }),
    },
    { status: 'unknown', title: 'no range is stated', bend: without('applicationTemperature') },
  ],
  'dew-point-margin': [
    { status: 'met', title: 'slab and air 70 °F at 45 %: dew point 47.7 °F, 22 °F beneath', bend: () => undefined },
    {
      status: 'stop',
      title: 'air 75 °F and 65 %: dew point 62.5 °F (psychrolib); a slab of 67.4 °F is 4.95 °F above, short of 5',
      bend: (floor) =>
        void Object.assign(floor.input.conditions, {
          slabTemperature: { value: 67.4, unit: '°F' },
          airTemperature: { value: 75, unit: '°F' },
          relativeHumidity: 65,
        }),
    },
    {
      status: 'caution',
      title: 'a slab of 68.5 °F is 6 °F above, within the instruments’ error of 5',
      bend: (floor) =>
        void Object.assign(floor.input.conditions, {
          slabTemperature: { value: 68.5, unit: '°F' },
          airTemperature: { value: 75, unit: '°F' },
          relativeHumidity: 65,
        }),
    },
    { status: 'unknown', title: 'no margin is stated', bend: without('dewPointMargin') },
  ],
  'moisture-limit': [
    { status: 'met', title: '75 % in the slab, 80 % allowed', bend: () => undefined },
    { status: 'stop', title: '85 % is above it', bend: (floor) => void (floor.input.conditions.substrateRelativeHumidity = 85) },
    { status: 'unknown', title: 'not measured', bend: (floor) => void (floor.input.conditions.substrateRelativeHumidity = null) },
    {
      status: 'unknown',
      title: '99 % holds from 16 mil only, 10.7 mil are laid',
      bend: (floor) => {
        without('substrateRelativeHumidity')(floor)
        floor.mix.facts.push(fact('substrateRelativeHumidity', { max: 99, unit: '%' }, { at: { film: { value: 16, unit: 'mil' } } }))
      },
    },
  ],
  'voc-limit': [
    {
      status: 'met',
      title: '50 g/L, 350 allowed for primers, the strictest here (40 CFR 59 subpart D, from memory)',
      bend: () => undefined,
    },
    {
      status: 'stop',
      title: '236 g/L where 50 are allowed',
      bend: (floor) => {
        without('voc')(floor)
        floor.mix.facts.push(fact('voc', { min: 236, max: 236, unit: 'g/L' }))
        floor.input.conditions.vocPlace = 'us-ca-south-coast'
      },
    },
    {
      status: 'stop',
      title: '45 g/L as mixed, but 120 with the thinner the sheet allows',
      bend: (floor) => {
        floor.mix.facts.push(fact('voc', { min: 120, max: 120, unit: 'g/L' }, { thinned: true }))
        floor.input.conditions.vocPlace = 'us-otc-2'
      },
    },
    { status: 'unknown', title: 'no VOC is stated', bend: without('voc') },
    { status: 'unknown', title: 'no rule is loaded for the place', bend: (floor) => void (floor.input.conditions.vocPlace = 'nowhere') },
  ],
  'sheet-present': [
    { status: 'met', title: 'data sheet and both safety sheets are loaded', bend: () => undefined },
    {
      status: 'stop',
      title: 'a component has no safety sheet',
      bend: ({ mix }) => mix.parts.forEach(({ product }) => (product.sheets = [])),
    },
    { status: 'caution', title: 'the mix has no data sheet', bend: ({ mix }) => void (mix.sheets = []) },
    { status: 'unknown', title: 'no mix is chosen', bend: (floor) => void (course(floor, 'top').mixId = null) },
  ],
  'sheet-current': [
    { status: 'met', title: 'sheets of June 2025, three years allowed', bend: () => undefined },
    {
      status: 'caution',
      title: 'a safety sheet of 2021',
      bend: ({ mix }) => mix.parts.forEach(({ product }) => product.sheets.forEach((one) => (one.revisionDate = '2021-05-18'))),
    },
    {
      status: 'unknown',
      title: 'a safety sheet without a date',
      bend: ({ mix }) => mix.parts.forEach(({ product }) => product.sheets.forEach((one) => (one.revisionDate = null))),
    },
  ],
}

it('the table holds the twelve checks of the builder, each once', () => {
  expect(checks.map(({ id }) => id)).toEqual([
    'profile-for-film',
    'prep-reaches-profile',
    'film-in-range',
    'window-opens',
    'window-closes',
    'ratio-bases-agree',
    'temperature-in-range',
    'dew-point-margin',
    'moisture-limit',
    'voc-limit',
    'sheet-present',
    'sheet-current',
  ])
  expect(Object.keys(examples).sort()).toEqual(checks.map(({ id }) => id).sort())
})

it('on the example floor every check is met, and everything met stands last', () => {
  const { findings } = evaluate(exampleFloor().input)
  expect(findings.filter(({ status }) => status !== 'met')).toEqual([])
  expect(new Set(findings.map(({ checkId }) => checkId)).size).toBe(12)
})

describe.each(checks.map((check) => [check.id, check] as const))('%s', (id, check) => {
  it('has a met, a failing and an unknown example', () => {
    const said = new Set((examples[id] ?? []).map(({ status }) => status))
    expect(said.has('met') && said.has('unknown') && (said.has('stop') || said.has('caution'))).toBe(true)
    expect(check.needs.length).toBeGreaterThan(0)
    expect(check.source).not.toBe('')
    expect(check.severity, 'why it stops or warns').toMatch(/^(Stop|Caution)/)
  })

  it.each((examples[id] ?? []).map((example) => [example.status, example.title, example] as const))('%s: %s', (status, _, { bend }) => {
    const floor = exampleFloor()
    bend(floor)
    const findings = evaluate(floor.input).findings.filter(({ checkId }) => checkId === id)
    expect(findings.map((finding) => finding.status)).toContain(status)
    if (status === 'met') expect(findings.every((finding) => finding.status === 'met')).toBe(true)
    for (const finding of findings) {
      expect(finding.says).not.toBe('')
      expect(`${finding.says} ${finding.todo}`).not.toMatch(/\bsafe\b|NaN|Infinity|undefined/i)
      expect(new Set(finding.figures.map(({ label }) => label)).size, 'labels tell figures apart').toBe(finding.figures.length)
      if (finding.status === 'met') expect({ todo: finding.todo, missing: finding.missing }).toEqual({ todo: '', missing: [] })
      else expect(finding.todo).not.toBe('')
      if (finding.status === 'unknown')
        expect(finding.missing.every(({ of, ask }) => of !== '' && ask !== '') && finding.missing.length).toBeGreaterThan(0)
    }
  })
})
