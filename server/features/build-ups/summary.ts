import type { BuildUpSummary } from '../../../shared/api/build-ups.ts'
import type { Course, EvaluationInput } from '../../../shared/domain/build-up.ts'
import { evaluate } from '../../../shared/domain/evaluate.ts'
import type { Evaluation } from '../../../shared/domain/evaluation.ts'
import type { Finding } from '../../../shared/domain/finding.ts'
import { sectionLayers } from '../../../shared/drawing/section-layer.ts'
import type { Database } from '../../db/open.ts'
import { readFirm } from '../people/queries.ts'
import { type listNewest, readCourses, readFactsFor, readReleased } from './queries.ts'

type Newest = Awaited<ReturnType<typeof listNewest>>['items'][number]

/** How many findings say what. */
export function countFindings(findings: readonly Finding[]): BuildUpSummary['findings'] {
  const counts = { stop: 0, caution: 0, unknown: 0, met: 0 }
  for (const { status } of findings) counts[status] += 1
  return counts
}

/** Sums up a page of build-ups: drafts by the facts of this moment, the others as frozen at release. Facts are read once for the page. */
export async function summarise(db: Database, rows: readonly Newest[], now: number): Promise<BuildUpSummary[]> {
  const live = rows.filter(({ version }) => !version.frozenInput).map(({ version }) => version.id)
  const courses = await readCourses(db, live)
  const facts = await readFactsFor(db, [...courses.values()].flat())
  const { sheetAgeLimitYears } = await readFirm(db)
  const onDate = new Date(now).toISOString().slice(0, 10)
  const released = await readReleased(
    db,
    rows.map(({ buildUp }) => buildUp.id),
  )
  const inputOf = ({ version }: Newest): EvaluationInput =>
    version.frozenInput ?? {
      ...factsUsed(facts, courses.get(version.id) ?? []),
      courses: courses.get(version.id) ?? [],
      conditions: version.conditions,
      onDate,
      sheetAgeLimitYears,
    }
  return rows.map((row) => {
    const input = inputOf(row)
    return {
      ...headOf(row),
      released: released.get(row.buildUp.id) ?? null,
      ...figuresOf(input, row.version.frozenEvaluation ?? evaluate(input)),
    }
  })
}

function headOf({ buildUp, version, updatedByName }: Newest) {
  return {
    ...buildUp,
    newest: { versionId: version.id, number: version.number, status: version.status, updatedAt: version.updatedAt, updatedByName },
  }
}

function figuresOf(input: EvaluationInput, evaluation: Evaluation) {
  return {
    courses: input.courses.length,
    thickness: evaluation.totals.thickness,
    findings: countFindings(evaluation.findings),
    layers: sectionLayers(input, evaluation),
  }
}

/** Of the page's facts, those that one build-up rests on. */
function factsUsed(
  facts: Pick<EvaluationInput, 'mixes' | 'products'>,
  list: readonly Course[],
): Pick<EvaluationInput, 'mixes' | 'products'> {
  const pick = <T>(from: Record<string, T>, ids: (string | null | undefined)[]) =>
    Object.fromEntries(ids.flatMap((id) => (id && from[id] !== undefined ? [[id, from[id]]] : []))) as Record<string, T>
  return {
    mixes: pick(
      facts.mixes,
      list.map((course) => course.mixId),
    ),
    products: pick(
      facts.products,
      list.flatMap((course) => [course.filler?.productId, course.broadcast?.productId]),
    ),
  }
}
