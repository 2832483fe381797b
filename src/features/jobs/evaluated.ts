import { useMemo } from 'react'
import type { Job, JobBody } from '../../../shared/api/jobs.ts'
import { evaluate } from '../../../shared/domain/evaluate.ts'
import { jobQuantities } from '../../../shared/domain/quantities.ts'

/** The floor of a job worked out at the conditions in the form: the same call as everywhere else. Undefined until a build-up is saved with the job. */
export function useEvaluated(body: JobBody, job: Job | undefined) {
  const buildUp = job?.buildUp && job.buildUp.versionId === body.buildUpVersionId ? job.buildUp : undefined
  return useMemo(() => {
    if (!buildUp) return undefined
    const { texture, ...conditions } = body.conditions
    const input = { ...buildUp.input, conditions }
    const evaluation = evaluate(input)
    const quantities = jobQuantities({ floor: input, results: evaluation.courses, bays: body.bays, texture, loss: body.loss })
    return { buildUp, input, evaluation, quantities }
  }, [buildUp, body.conditions, body.bays, body.loss])
}
