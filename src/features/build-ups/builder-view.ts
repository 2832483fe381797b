import type { EvaluationInput } from '../../../shared/domain/build-up.ts'
import type { Evaluation } from '../../../shared/domain/evaluation.ts'
import type { Step, Work } from './work.ts'

/** What the builder shows: a draft at work, or a version that no longer changes. */
export interface BuilderView {
  work: Work
  input: EvaluationInput
  evaluation: Evaluation
  /** Absent where nothing may be changed. */
  dispatch: ((step: Step) => void) | null
  /** What the last save refused, by address. */
  fields: Record<string, string>
}
