import type { Conditions, Course, Stage } from '../../../shared/domain/build-up.ts'
import { newCourse } from '../../../shared/domain/course.ts'

/** What a draft is made of, and all that an edit changes. */
export interface Work {
  courses: Course[]
  conditions: Conditions
}

export type Step =
  | { kind: 'change'; id: string; change: Partial<Course> }
  | { kind: 'add'; stage: Stage; id: string; at: number }
  | { kind: 'duplicate'; id: string; newId: string }
  | { kind: 'remove'; id: string }
  | { kind: 'move'; id: string; to: number }
  | { kind: 'conditions'; change: Partial<Conditions> }
  | { kind: 'undo' }
  | { kind: 'redo' }
  | { kind: 'load'; work: Work }

/** The work with what it was before, so that any step can be taken back. */
export interface History {
  present: Work
  past: readonly Work[]
  future: readonly Work[]
  /** The field that was typed in last: typing on is one step. */
  field: string | null
}

const kept = 100

export function historyOf(work: Work): History {
  return { present: work, past: [], future: [], field: null }
}

/** One step of editing. Pure: the same steps give the same work. */
export function reduce(history: History, step: Step): History {
  const { present, past, future } = history
  if (step.kind === 'load') return historyOf(step.work)
  if (step.kind === 'undo') {
    const before = past.at(-1)
    return before ? { present: before, past: past.slice(0, -1), future: [present, ...future], field: null } : history
  }
  if (step.kind === 'redo') {
    const [after, ...rest] = future
    return after ? { present: after, past: [...past, present], future: rest, field: null } : history
  }
  const next = applied(present, step)
  if (next === present) return history
  const field = fieldOf(step)
  const typingOn = field !== null && field === history.field
  return { present: next, past: typingOn ? past : [...past, present].slice(-kept), future: [], field }
}

type Edit = Exclude<Step, { kind: 'undo' | 'redo' | 'load' }>

function fieldOf(step: Edit): string | null {
  if (step.kind === 'change') return `${step.id} ${Object.keys(step.change).join()}`
  return step.kind === 'conditions' ? Object.keys(step.change).join() : null
}

function applied(work: Work, step: Edit): Work {
  const { courses } = work
  switch (step.kind) {
    case 'conditions':
      return { ...work, conditions: { ...work.conditions, ...step.change } }
    case 'change':
      return { ...work, courses: courses.map((course) => (course.id === step.id ? { ...course, ...step.change } : course)) }
    case 'add':
      return { ...work, courses: courses.toSpliced(step.at, 0, newCourse(step.stage, step.id)) }
    case 'remove':
      return { ...work, courses: courses.filter(({ id }) => id !== step.id) }
    case 'duplicate': {
      const at = courses.findIndex(({ id }) => id === step.id)
      const course = courses[at]
      return course ? { ...work, courses: courses.toSpliced(at + 1, 0, { ...course, id: step.newId }) } : work
    }
    case 'move': {
      const from = courses.findIndex(({ id }) => id === step.id)
      const course = courses[from]
      const to = Math.min(Math.max(step.to, 0), courses.length - 1)
      return course && from !== to ? { ...work, courses: courses.toSpliced(from, 1).toSpliced(to, 0, course) } : work
    }
  }
}

/** A course's own id: short, and never the same twice within a build-up. */
export function courseId(): string {
  return crypto.randomUUID().slice(0, 13)
}
