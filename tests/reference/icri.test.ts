import { describe, expect, it } from 'vitest'
import { preparationMethods } from '../../shared/domain/build-up.ts'
import { type Example, courseOf, exampleFloor, findingOf, restate } from '../setup/example-floor.ts'
import { icriEdition, profileForThickness, profileOfMethod } from '../../shared/reference/icri.ts'

type Method = (typeof preparationMethods)[number]

/** The example floor with one course of a film over a preparation; no sheet speaks of the profile. */
function laidOver({ method, profile }: { method: Method; profile: number }, value: number, unit: 'mil' | 'mm' | 'in'): Example {
  const floor = exampleFloor()
  restate(floor, 'surfaceProfile')
  courseOf(floor, 'prep').preparation = { method, profile }
  const prime = courseOf(floor, 'prime')
  prime.spreadRate = null
  prime.thickness = { value, unit, film: 'dry' }
  floor.input.courses = floor.input.courses.filter(({ id }) => id !== 'top')
  return floor
}
const profileVerdict = (floor: Example) => findingOf(floor, 'profile-for-film', 'prep')
const reachVerdict = (floor: Example) => findingOf(floor, 'prep-reaches-profile', 'prep')

describe('ICRI 310.2R-2013: profiles by method and by thickness (CSP columns from memory, so each finding says "verify")', () => {
  it('every method a builder may choose has its range, within CSP 1 to 10', () => {
    for (const method of preparationMethods) {
      const range = profileOfMethod[method]
      expect(range && range.from >= 1 && range.from <= range.to && range.to <= 10, method).toBe(true)
    }
    expect(icriEdition).toMatch(/2013.*verify/)
  })

  it('bands follow one another in both systems, the thicker never asking for less', () => {
    profileForThickness.slice(1).forEach((band, index) => {
      const thinner = profileForThickness[index]
      expect(band.mil.from).toBeGreaterThanOrEqual(thinner?.mil.to ?? Number.NaN)
      expect(band.mm.from).toBeGreaterThanOrEqual(thinner?.mm.to ?? Number.NaN)
      expect(band.profile.from).toBeGreaterThanOrEqual(thinner?.profile.from ?? Number.NaN)
    })
  })

  it('8 mil over grinding to CSP 2: thin films ask for 1–3, grinding leaves 1–3', () => {
    const floor = laidOver({ method: 'grinding', profile: 2 }, 8, 'mil')
    expect(profileVerdict(floor).status).toBe('met')
    expect(reachVerdict(floor).status).toBe('met')
    expect(profileVerdict(floor).source).toMatch(/verify/)
  })

  it('1/8 in of self-levelling topping over acid etching: 4 is asked for, etching leaves 1–3', () => {
    expect(reachVerdict(laidOver({ method: 'acid etching', profile: 4 }, 1 / 8, 'in')).status).toBe('stop')
    expect(profileVerdict(laidOver({ method: 'acid etching', profile: 3 }, 1 / 8, 'in')).status).toBe('stop')
  })

  it('1/4 in of slurry and broadcast over shot blasting to CSP 6: 5–9 asked for, 2–9 left', () => {
    const floor = laidOver({ method: 'steel shot blasting', profile: 6 }, 1 / 4, 'in')
    expect([profileVerdict(floor).status, reachVerdict(floor).status]).toEqual(['met', 'met'])
  })

  it('a sealer of 3 mil over scarifying to CSP 5: rougher than the 1–2 asked for, and it shows', () => {
    expect(profileVerdict(laidOver({ method: 'scarifying', profile: 5 }, 3, 'mil')).status).toBe('caution')
  })

  it('scarifying cannot leave CSP 2 (4–7), nor shot blasting CSP 10 (2–9)', () => {
    expect(reachVerdict(laidOver({ method: 'scarifying', profile: 2 }, 8, 'mil')).status).toBe('caution')
    expect(reachVerdict(laidOver({ method: 'steel shot blasting', profile: 10 }, 8, 'mil')).status).toBe('stop')
  })

  it.each([
    [10, 1, 'met'],
    [10, 5, 'met'],
    [10, 6, 'caution'],
    [10.1, 2, 'stop'],
    [10.1, 3, 'met'],
    [40, 3, 'met'],
    [40.1, 3, 'stop'],
    [125, 4, 'met'],
    [125.1, 4, 'stop'],
    [250, 5, 'met'],
    [300, 4, 'stop'],
    [300, 10, 'met'],
  ] as const)('%d mil over CSP %d: %s; a thickness that ends one band and begins the next may follow either', (mil, profile, status) => {
    expect(profileVerdict(laidOver({ method: 'steel shot blasting', profile }, mil, 'mil')).status).toBe(status)
  })

  it('the standard prints 3 mm beside 1/8 in, which is 3.175: a metric floor of 3.1 mm is a polymer overlay, one of 122 mil is not', () => {
    expect(profileVerdict(laidOver({ method: 'steel shot blasting', profile: 4 }, 3.1, 'mm')).status).toBe('stop')
    expect(profileVerdict(laidOver({ method: 'steel shot blasting', profile: 4 }, 122, 'mil')).status).toBe('met')
  })
})
