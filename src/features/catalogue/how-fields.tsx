import { Link } from 'react-router'
import type { SheetSummary } from '../../../shared/domain/sheet.ts'
import { paths } from '../../lib/paths.ts'
import { buttonClass } from '../../ui/button.tsx'
import { AreaField, SelectField, TextField } from '../../ui/field.tsx'
import type { DraftPart } from './value-fields.tsx'

interface HowFieldsProps extends DraftPart {
  sheets: readonly SheetSummary[]
  /** A value of the firm’s own: it stands on no sheet. */
  firmOnly: boolean
  returnTo: string
}

/** How a value is known: stated on a page of one of the record's sheets, or entered with a reason. */
export function HowFields({ draft, change, fields, sheets, firmOnly, returnTo }: HowFieldsProps) {
  const stated = draft.how === 'stated' && !firmOnly
  const chosen = draft.revisionId || (sheets[0]?.revisionId ?? '')
  const choose = (how: 'stated' | 'entered') => change({ how, ...(how === 'stated' ? { revisionId: chosen } : {}) })
  return (
    <fieldset className="grid gap-4 border-t border-rule pt-4">
      <legend className="sr-only">How it is known</legend>
      <div className="flex flex-wrap gap-5">
        <label className="flex min-h-9 items-center gap-2">
          <input type="radio" name="how.kind" className="h-5 w-5" checked={stated} disabled={firmOnly || sheets.length === 0} onChange={() => choose('stated')} />
          Stated on a sheet
        </label>
        <label className="flex min-h-9 items-center gap-2">
          <input type="radio" name="how.kind" className="h-5 w-5" checked={!stated} onChange={() => choose('entered')} />
          Entered by hand
        </label>
        {sheets.length === 0 && !firmOnly && <span className="self-center text-pencil">No sheet is attached to this record yet.</span>}
      </div>
      {stated ? (
        <div className="grid gap-4 sm:grid-cols-[minmax(0,1fr)_100px_auto]">
          <SelectField label="Sheet" name="how.revisionId" value={chosen} error={fields['how.revisionId']} onChange={(event) => change({ revisionId: event.target.value, box: '', quote: '' })}>
            {sheets.map((sheet) => (
              <option key={sheet.revisionId} value={sheet.revisionId}>
                {sheet.title} ({sheet.kind} sheet{sheet.revisionDate ? `, ${sheet.revisionDate}` : ''})
              </option>
            ))}
          </SelectField>
          <TextField label="Page" name="how.page" inputMode="numeric" value={draft.page} error={fields['how.page']} onChange={(event) => change({ page: event.target.value, box: '' })} />
          <Link to={`${paths.sheetPage(chosen, Number(draft.page) || 1)}&mark=1&return=${encodeURIComponent(returnTo)}`} className={`${buttonClass()} self-end`}>
            {draft.box ? 'Mark again' : 'Mark the place'}
          </Link>
          <AreaField label="The sheet’s words" name="how.quote" value={draft.quote} error={fields['how.quote']} className="sm:col-span-3" help={draft.box ? 'A box is marked on the page.' : 'No box is marked yet; page and words will do.'} onChange={(event) => change({ quote: event.target.value })} />
        </div>
      ) : (
        <TextField label="Reason" name="how.reason" value={draft.reason} error={fields['how.reason']} placeholder="Maker’s letter of 3 May" help="Who says so, and when." onChange={(event) => change({ reason: event.target.value })} />
      )}
    </fieldset>
  )
}
