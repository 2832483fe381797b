import { describe, expect, it } from 'vitest'
import { courseOf, exampleFloor, fact, findingOf, findingsOf, restate } from '../../../tests/setup/example-floor.ts'
import type { Course } from '../build-up.ts'
import { newCourse } from '../course.ts'

describe('profile for what follows', () => {
  it('a sheet that is content with less than the standard leaves a caution, not a stop', () => {
    const floor = exampleFloor()
    restate(floor, 'surfaceProfile', fact('surfaceProfile', { min: 1, max: 3, unit: 'CSP' }))
    courseOf(floor, 'prep').preparation = { method: 'grinding', profile: 2 }
    expect(findingOf(floor, 'profile-for-film', 'prime').status).toBe('met')
    const standard = findingOf(floor, 'profile-for-film', 'prep')
    expect(standard.status).toBe('caution')
    expect(standard.todo).toMatch(/maker, in writing/)
  })

  it('a sheet may state a least profile alone: CSP 2 and more', () => {
    const floor = exampleFloor()
    restate(floor, 'surfaceProfile', fact('surfaceProfile', { min: 5, unit: 'CSP' }))
    expect(findingOf(floor, 'profile-for-film', 'prime')).toMatchObject({
      status: 'stop',
      says: 'CSP 4 is prepared; the sheet of Example epoxy asks for ≥ CSP 5.',
    })
  })

  it('the joint filler laid first is not what the profile is for', () => {
    const floor = exampleFloor()
    const fill = { ...newCourse('fill', 'joints'), mixId: 'other' }
    floor.input.courses = [courseOf(floor, 'prep'), fill, courseOf(floor, 'prime'), courseOf(floor, 'top')]
    floor.input.mixes['other'] = { ...floor.mix, id: 'other', facts: [fact('surfaceProfile', { min: 9, max: 10, unit: 'CSP' })] }
    expect(findingsOf(floor, 'profile-for-film').map(({ courseId, status }) => [courseId, status])).toEqual([
      ['prime', 'met'],
      ['prep', 'met'],
    ])
  })

  it('blasting after the joints are filled is still the preparation of the floor', () => {
    const floor = exampleFloor()
    const fill = { ...newCourse('fill', 'joints'), mixId: 'mix' }
    floor.input.courses = [fill, courseOf(floor, 'prep'), courseOf(floor, 'prime'), courseOf(floor, 'top')]
    expect(findingOf(floor, 'profile-for-film', 'prep').status).toBe('met')
  })

  it('washing before the blast needs no profile of its own, blasting without one does', () => {
    const floor = exampleFloor()
    const wash: Course = { ...newCourse('prep', 'wash'), preparation: { method: 'detergent scrubbing' } }
    floor.input.courses = [wash, ...floor.courses]
    expect(findingsOf(floor, 'prep-reaches-profile').map(({ courseId }) => courseId)).toEqual(['prep'])
    wash.preparation = { method: 'steel shot blasting' }
    expect(findingOf(floor, 'prep-reaches-profile', 'wash').status).toBe('unknown')
  })

  it('without solids the wet film stands for the thickness', () => {
    const floor = exampleFloor()
    restate(floor, 'volumeSolids')
    expect(findingOf(floor, 'profile-for-film', 'prep').status).toBe('met')
  })

  it('a course without thickness leaves it unknown, and names the course', () => {
    const floor = exampleFloor()
    courseOf(floor, 'top').spreadRate = null
    const finding = findingOf(floor, 'profile-for-film', 'prep')
    expect(finding.status).toBe('unknown')
    expect(finding.missing[0]).toMatchObject({ property: 'filmThickness', of: 'Top coat', ask: 'whoever builds this up' })
  })

  it('a typical profile of the sheet decides nothing', () => {
    const floor = exampleFloor()
    const typical = { kind: 'typical', source: 'common practice', dated: '2026' } as const
    restate(floor, 'surfaceProfile', fact('surfaceProfile', { min: 3, max: 5, unit: 'CSP' }, { origin: typical }))
    expect(findingOf(floor, 'profile-for-film', 'prime').status).toBe('unknown')
  })
})
