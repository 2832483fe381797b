import type { Conditions, Course, Stage } from './build-up.ts'
import type { Finding } from './finding.ts'

/** What a stage is called, and what a new course of it is called until a person says otherwise. */
export const stageNames: Record<Stage, { name: string; title: string }> = {
  prep: { name: 'Preparation', title: 'Prepare the slab' },
  fill: { name: 'Fill', title: 'Joint and crack fill' },
  slurry: { name: 'Slurry', title: 'Slurry' },
  grind: { name: 'Grinding', title: 'Grind flush' },
  prime: { name: 'Prime', title: 'Prime coat' },
  body: { name: 'Body', title: 'Body coat' },
  broadcast: { name: 'Broadcast', title: 'Broadcast' },
  seal: { name: 'Seal', title: 'Seal coat' },
  top: { name: 'Top', title: 'Top coat' },
  cove: { name: 'Cove', title: 'Cove' },
}

/** A course that says nothing yet but its stage. */
export function newCourse(stage: Stage, id: string): Course {
  return {
    id,
    stage,
    title: stageNames[stage].title,
    mixId: null,
    thickness: null,
    spreadRate: null,
    filler: null,
    broadcast: null,
    preparation: null,
    startsAfter: null,
    note: '',
  }
}

/** Conditions a new build-up begins with: a heated hall. A choice to be changed, not a fact about any floor. */
export const firstConditions: Conditions = {
  slabTemperature: { value: 68, unit: '°F' },
  airTemperature: { value: 68, unit: '°F' },
  relativeHumidity: 45,
  substrateRelativeHumidity: null,
  moistureEmission: null,
  vocPlace: null,
}

/** Where the reason for accepting a finding is kept: the check and the course, or `floor`. */
export function reasonKey({ checkId, courseId }: Pick<Finding, 'checkId' | 'courseId'>): string {
  return `${checkId}:${courseId ?? 'floor'}`
}

/** What stands between a draft and its release: stops refuse it, cautions and unknowns want a reason each. */
export function releaseObstacles(findings: readonly Finding[], reasons: Readonly<Record<string, string>> = {}) {
  return {
    stops: findings.filter((finding) => finding.status === 'stop'),
    unreasoned: findings.filter(
      (finding) => (finding.status === 'caution' || finding.status === 'unknown') && !reasons[reasonKey(finding)]?.trim(),
    ),
  }
}
