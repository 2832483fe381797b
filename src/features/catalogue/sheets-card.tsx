import { Link } from 'react-router'
import { ageInYears, writtenDate } from '../../../shared/domain/sheet-age.ts'
import type { SheetSummary } from '../../../shared/domain/sheet.ts'
import { formatNumber } from '../../../shared/domain/format.ts'
import { paths } from '../../lib/paths.ts'
import { Card } from '../../ui/page.tsx'
import { StatusMark } from '../../ui/status-mark.tsx'
import { useFirm } from '../people/queries.ts'

const kinds = { data: 'Data sheet', safety: 'Safety sheet' } as const

/** The sheets that speak of a record, with date and age. */
export function SheetsCard({ record }: { record: { sheets: readonly SheetSummary[] } }) {
  const firm = useFirm()
  const limit = firm.data?.sheetAgeLimitYears ?? 3
  const today = new Date().toISOString()
  return (
    <Card title="Sheets">
      {record.sheets.length === 0 && (
        <p className="p-4 text-pencil">
          No sheet is attached.{' '}
          <Link to={paths.sheets} className="text-resin underline">
            Upload it under Sheets
          </Link>{' '}
          and attach it to this record.
        </p>
      )}
      <ul>
        {record.sheets.map((sheet) => {
          const age = sheet.revisionDate ? ageInYears(sheet.revisionDate, today) : undefined
          const old = sheet.kind === 'safety' && age !== undefined && age > limit
          return (
            <li key={sheet.revisionId} className="border-b border-rule px-4 py-2 last:border-b-0">
              <Link to={paths.sheet(sheet.id)} className="text-resin hover:underline">
                {sheet.title}
              </Link>
              <span className="block text-small text-pencil">
                {kinds[sheet.kind]}, {sheet.revisionDate ? writtenDate(sheet.revisionDate) : 'date not stated'}
                {age !== undefined && `, ${formatNumber(age, 1)} years old`}, {sheet.pages === 1 ? 'one page' : `${sheet.pages} pages`},{' '}
                <Link to={paths.sheetPage(sheet.revisionId)} className="underline">
                  open
                </Link>
                {old && (
                  <>
                    {' '}
                    <StatusMark status="caution" wordless /> older than {formatNumber(limit, 1)} years
                  </>
                )}
              </span>
            </li>
          )
        })}
      </ul>
    </Card>
  )
}
