import type { JobBody } from '../../../shared/api/jobs.ts'

/** What each card of the job's form is given. */
export interface JobFormPart {
  body: JobBody
  change: (part: Partial<JobBody>) => void
  fields: Record<string, string>
  disabled: boolean
}
