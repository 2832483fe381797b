import { Link } from 'react-router'
import type { Course, EvaluationInput } from '../../../shared/domain/build-up.ts'
import { productsOf } from '../../../shared/domain/course-result.ts'
import { paths } from '../../lib/paths.ts'

const kinds = { data: 'data sheet', safety: 'safety sheet' } as const

/** The sheets of everything in this course, at the revision in force. */
export function SheetsPanel({ course, input }: { course: Course; input: EvaluationInput }) {
  const mix = course.mixId ? input.mixes[course.mixId] : undefined
  const holders = [...(mix ? [mix] : []), ...productsOf(course, input)]
  const sheets = [...new Map(holders.flatMap((holder) => holder.sheets).map((sheet) => [sheet.revisionId, sheet])).values()]
  return (
    <section aria-label="Sheets" className="grid gap-3 p-4">
      {sheets.length === 0 && <p>No sheet is loaded for this course. Call the office before opening a pail.</p>}
      {sheets.map((sheet) => (
        <Link
          key={sheet.revisionId}
          to={paths.sheetPage(sheet.revisionId)}
          className="flex min-h-[64px] flex-col justify-center rounded-touch border-2 border-ink px-4 py-2"
        >
          <span className="font-semibold">{sheet.title}</span>
          <span className="text-body">
            {kinds[sheet.kind]}, {sheet.revisionDate ?? 'no date stated'}, {sheet.pages === 1 ? 'one page' : `${sheet.pages} pages`}
          </span>
        </Link>
      ))}
    </section>
  )
}
