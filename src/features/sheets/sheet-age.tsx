import type { SheetKind } from '../../../shared/domain/sheet.ts'
import { ageInYears, writtenDate } from '../../../shared/domain/sheet-age.ts'
import { useFirm } from '../people/queries.ts'

/** How old, in the unit that tells most. */
function ageText(years: number): string {
  if (years < 0) return 'dated ahead'
  const months = Math.floor(years * 12)
  if (months < 1) return 'under a month'
  if (months < 24) return `${months} ${months === 1 ? 'month' : 'months'}`
  return `${Math.floor(years)} years`
}

/** A revision's date and age; a safety sheet beyond the firm's limit is called out. */
export function SheetAge({ kind, revisionDate, superseded }: { kind: SheetKind; revisionDate: string | null; superseded: boolean }) {
  const limit = useFirm().data?.sheetAgeLimitYears
  if (revisionDate === null) return <span className="text-pencil">not stated</span>
  const age = ageInYears(revisionDate, new Date().toISOString())
  const beyond = kind === 'safety' && !superseded && limit !== undefined && age > limit
  return (
    <span className="whitespace-nowrap">
      {writtenDate(revisionDate)},{' '}
      <span className={beyond ? 'font-semibold text-caution' : 'text-pencil'}>
        {beyond && <span aria-hidden="true">▲ </span>}
        {ageText(age)}
        {beyond && ` (over ${limit})`}
      </span>
    </span>
  )
}
