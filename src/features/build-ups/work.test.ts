import { describe, expect, it } from 'vitest'
import { firstConditions, newCourse } from '../../../shared/domain/course.ts'
import { type Step, historyOf, reduce } from './work.ts'

const begin = historyOf({ courses: [newCourse('prep', 'a'), newCourse('slurry', 'b'), newCourse('top', 'c')], conditions: firstConditions })
const after = (...steps: Step[]) => steps.reduce(reduce, begin)
const order = (...steps: Step[]) =>
  after(...steps)
    .present.courses.map(({ id }) => id)
    .join('')

describe('reduce', () => {
  it('adds, duplicates, moves and removes courses, bottom up', () => {
    expect(order({ kind: 'add', stage: 'prime', id: 'd', at: 2 })).toBe('abdc')
    expect(order({ kind: 'duplicate', id: 'b', newId: 'd' })).toBe('abdc')
    expect(order({ kind: 'move', id: 'c', to: 0 })).toBe('cab')
    expect(order({ kind: 'move', id: 'a', to: 9 })).toBe('bca')
    expect(order({ kind: 'remove', id: 'b' })).toBe('ac')
  })
  it('takes back what was done, and does it again', () => {
    expect(order({ kind: 'remove', id: 'b' }, { kind: 'remove', id: 'c' }, { kind: 'undo' })).toBe('ac')
    expect(order({ kind: 'remove', id: 'b' }, { kind: 'undo' }, { kind: 'redo' })).toBe('ac')
    expect(after({ kind: 'undo' })).toBe(begin)
  })
  it('counts typing in one field as one step', () => {
    const typed = after(
      { kind: 'change', id: 'c', change: { title: 'T' } },
      { kind: 'change', id: 'c', change: { title: 'To' } },
      { kind: 'change', id: 'b', change: { note: 'x' } },
    )
    expect(typed.past).toHaveLength(2)
    expect(reduce(reduce(typed, { kind: 'undo' }), { kind: 'undo' }).present.courses[2]?.title).toBe('Top coat')
  })
})
