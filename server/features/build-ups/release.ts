import { AppError } from '../../../shared/api/errors.ts'
import { reasonKey, releaseObstacles } from '../../../shared/domain/course.ts'
import { evaluate } from '../../../shared/domain/evaluate.ts'
import type { Evaluation } from '../../../shared/domain/evaluation.ts'
import type { Finding } from '../../../shared/domain/finding.ts'
import type { Transaction } from '../../db/open.ts'
import { keepRelease, takeForRelease } from './write-queries.ts'

interface ReleaseWanted {
  place: { buildUpId: string; number: number; version: number }
  reasons: Record<string, string>
  /** `id` null: released by the system itself. */
  by: { id: string | null; name: string }
  now: number
}

const fieldsOf = (findings: readonly Finding[]) =>
  Object.fromEntries(findings.map((finding) => [reasonKey(finding), `${finding.title}. ${finding.says}`]))

/** Throws when a stop refuses the release, or a caution or unknown has no reason yet. */
function refuseUnready(findings: readonly Finding[], reasons: Record<string, string>): void {
  const { stops, unreasoned } = releaseObstacles(findings, reasons)
  if (stops.length > 0) throw new AppError('release-refused', { fields: fieldsOf(stops) })
  if (unreasoned.length > 0) throw new AppError('reasons-missing', { fields: fieldsOf(unreasoned) })
}

/** Reckons the draft on the facts of this moment and, if nothing stops it, freezes it with them. */
export async function release(tx: Transaction, { place, reasons, by, now }: ReleaseWanted): Promise<Evaluation> {
  const { row, input } = await takeForRelease(tx, place, now)
  if (input.courses.length === 0) throw new AppError('invalid', { message: 'A build-up without courses cannot be released.' })
  const evaluation = evaluate(input)
  refuseUnready(evaluation.findings, reasons)
  const wanted = new Set(evaluation.findings.filter(({ status }) => status === 'caution' || status === 'unknown').map(reasonKey))
  const kept = Object.fromEntries(Object.entries(reasons).filter(([key, reason]) => wanted.has(key) && reason !== ''))
  await keepRelease(tx, row, { input, evaluation, reasons: kept, by, now })
  return evaluation
}
