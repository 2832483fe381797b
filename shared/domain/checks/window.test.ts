import { describe, expect, it } from 'vitest'
import { type Example, courseOf, exampleFloor, fact, findingOf, findingsOf, restate } from '../../../tests/setup/example-floor.ts'
import { newCourse } from '../course.ts'

const at70 = { at: { temperature: { value: 70, unit: '°F' as const } } }
const startOf = (hours: number | null): Example => {
  const floor = exampleFloor()
  courseOf(floor, 'top').startsAfter = hours
  return floor
}
const both = (floor: Example) => ['window-opens', 'window-closes'].map((id) => findingOf(floor, id, 'top').status)

describe('a start within the window beneath (sheet: 9–24 h at 70 °F, 18–48 h at 50 °F)', () => {
  it.each([
    [8.9, ['stop', 'met']],
    [9, ['met', 'met']],
    [24, ['met', 'met']],
    [24.1, ['met', 'stop']],
  ] as const)('%d h after the coat beneath', (hours, statuses) => {
    expect(both(startOf(hours))).toEqual(statuses)
  })

  it('a start that is not planned follows the opening of the window', () => {
    const floor = startOf(null)
    expect(both(floor)).toEqual(['met', 'met'])
    expect(findingOf(floor, 'window-opens', 'top').says).toBe('Laid 9 h after Prime coat, whose window opens at 9 h.')
  })

  it('at 60 °F it opens between the columns: ln t straight over 1/T, 12.6 h', () => {
    // 283.15 K 18 h, 294.26 K 9 h; at 288.71 K the weight of the warmer is (1/283.15 − 1/288.71) ÷ (1/283.15 − 1/294.26) = 0.5099
    const opens = Math.exp(Math.log(18) * (1 - 0.5099) + Math.log(9) * 0.5099)
    expect(opens).toBeCloseTo(12.64, 2)
    const floor = startOf(12.5)
    floor.input.conditions.slabTemperature = { value: 60, unit: '°F' }
    expect(both(floor)).toEqual(['stop', 'met'])
    courseOf(floor, 'top').startsAfter = 12.7
    expect(both(floor)).toEqual(['met', 'met'])
  })

  it('says how much is lacking in minutes where it is less than an hour, never "0 h"', () => {
    expect(findingOf(startOf(8.9), 'window-opens', 'top').todo).toBe('Wait 6 min longer.')
    expect(findingOf(startOf(24.01), 'window-closes', 'top').todo).toMatch(/^Start 1 min earlier/)
  })

  it('a window in days is told in hours too', () => {
    const floor = startOf(60)
    restate(floor, 'recoatWindow', fact('recoatWindow', { min: 1, max: 2, unit: 'd' }, at70))
    expect(findingOf(floor, 'window-closes', 'top').says).toBe('Laid 60 h after Prime coat, whose window closes at 2 d (48 h).')
  })

  it('a window stated before another coat does not hold for this one', () => {
    const floor = startOf(12)
    restate(floor, 'recoatWindow', fact('recoatWindow', { min: 9, max: 24, unit: 'h' }, { at: { ...at70.at, next: 'Teasel Seal' } }))
    const finding = findingOf(floor, 'window-closes', 'top')
    expect(finding.status).toBe('unknown')
    expect(finding.missing[0]?.because).toMatch(/before Teasel Seal only/)
  })

  it('past the window but ground between: the bond is mechanical', () => {
    const floor = startOf(200)
    floor.input.courses = [...floor.courses.slice(0, 2), newCourse('grind', 'grind'), courseOf(floor, 'top')]
    const finding = findingOf(floor, 'window-closes', 'top')
    expect(finding.status).toBe('met')
    expect(finding.source).toMatch(/common practice/)
  })

  it('washed between is not ground', () => {
    const floor = startOf(200)
    const wash = { ...newCourse('prep', 'wash'), preparation: { method: 'detergent scrubbing' as const, profile: 1 } }
    floor.input.courses = [...floor.courses.slice(0, 2), wash, courseOf(floor, 'top')]
    expect(findingOf(floor, 'window-closes', 'top').status).toBe('stop')
  })

  it('three coats, the window of the first not stated: the start of the third is unknown, and the first is named', () => {
    const floor = startOf(null)
    const first = {
      ...floor.mix,
      id: 'first',
      name: 'Corbel primer',
      facts: floor.mix.facts.filter(({ property }) => property !== 'recoatWindow'),
    }
    floor.input.mixes['first'] = first
    courseOf(floor, 'prime').mixId = 'first'
    floor.input.courses = [...floor.courses, { ...courseOf(floor, 'top'), id: 'third' }]
    const finding = findingOf(floor, 'window-opens', 'third')
    expect(finding.status).toBe('unknown')
    expect(finding.missing.map(({ of, property }) => `${of} ${property}`)).toContain('Corbel primer recoatWindow')
  })

  it('the first course on the slab has no window beneath', () => {
    expect(findingsOf(exampleFloor(), 'window-opens').map(({ courseId }) => courseId)).toEqual(['top'])
  })
})
