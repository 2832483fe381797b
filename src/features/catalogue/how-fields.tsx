import { Link } from 'react-router'
import type { Fact } from '../../../shared/domain/fact.ts'
import { writtenDate } from '../../../shared/domain/sheet-age.ts'
import type { SheetSummary } from '../../../shared/domain/sheet.ts'
import { paths } from '../../lib/paths.ts'
import { buttonClass } from '../../ui/button.tsx'
import { AreaField, SelectField, TextField } from '../../ui/field.tsx'
import type { DraftPart } from './draft-part.ts'

/** A revision that a value may be tied to. */
export interface Citable {
  revisionId: string
  name: string
  pages: number | undefined
}

/** Revisions in force of the record's sheets, and the superseded one that the value at hand cites. */
export function citableOf(sheets: readonly SheetSummary[], fact: Fact | undefined): Citable[] {
  const inForce = sheets.map(({ revisionId, title, kind, revisionDate, pages }) => ({
    revisionId,
    pages,
    name: `${title} (${kind} sheet, ${dated(revisionDate)})`,
  }))
  const cited = fact?.origin.kind === 'stated' ? fact.origin.citation : undefined
  if (!cited || inForce.some(({ revisionId }) => revisionId === cited.revisionId)) return inForce
  return [
    ...inForce,
    { revisionId: cited.revisionId, pages: undefined, name: `${cited.sheetTitle} (superseded, ${dated(cited.revisionDate)})` },
  ]
}
const dated = (date: string | null) => (date === null ? 'date not stated' : writtenDate(date))

interface HowFieldsProps extends DraftPart {
  citable: readonly Citable[]
  /** A value of the firm’s own: it stands on no sheet. */
  firmOnly: boolean
  returnTo: string
  /** What was typed is kept; leaving for the page of the sheet loses nothing. */
  onMark: () => void
}

/** How a value is known: stated on a page of one of the record's sheets, or entered with a reason. */
export function HowFields({ draft, change, fields, citable, firmOnly, returnTo, onMark }: HowFieldsProps) {
  const stated = draft.how === 'stated' && !firmOnly
  const chosen = citable.some(({ revisionId }) => revisionId === draft.revisionId) ? draft.revisionId : (citable[0]?.revisionId ?? '')
  const choose = (how: 'stated' | 'entered') => change({ how, ...(how === 'stated' ? { revisionId: chosen } : {}) })
  return (
    <fieldset className="grid gap-4 border-t border-rule pt-4">
      <legend className="sr-only">How it is known</legend>
      <div className="flex flex-wrap gap-x-5">
        <label className="flex min-h-9 items-center gap-2">
          <input
            type="radio"
            name="how.kind"
            className="h-5 w-5"
            checked={stated}
            disabled={firmOnly || citable.length === 0}
            onChange={() => choose('stated')}
          />
          Stated on a sheet
        </label>
        <label className="flex min-h-9 items-center gap-2">
          <input type="radio" name="how.kind" className="h-5 w-5" checked={!stated} onChange={() => choose('entered')} />
          Entered by hand
        </label>
        {citable.length === 0 && !firmOnly && <span className="self-center text-pencil">No sheet is attached to this record yet.</span>}
      </div>
      {stated ? (
        <StatedFields draft={draft} change={change} fields={fields} citable={citable} chosen={chosen} returnTo={returnTo} onMark={onMark} />
      ) : (
        <TextField
          label="Reason"
          name="how.reason"
          value={draft.reason}
          error={fields['how.reason']}
          placeholder="Maker’s letter of 3 May"
          help="Who says so, and when."
          autoComplete="off"
          onChange={(event) => change({ reason: event.target.value })}
        />
      )}
    </fieldset>
  )
}

function StatedFields({ draft, change, fields, citable, chosen, returnTo, onMark }: Omit<HowFieldsProps, 'firmOnly'> & { chosen: string }) {
  const pages = citable.find(({ revisionId }) => revisionId === chosen)?.pages
  const box = draft.box ? draft.box.split(',').map(Number) : null
  return (
    <div className="grid items-start gap-4 sm:grid-cols-[minmax(0,1fr)_110px]">
      <SelectField
        label="Sheet"
        name="how.revisionId"
        value={chosen}
        error={fields['how.revisionId']}
        onChange={(event) => change({ revisionId: event.target.value, page: '1', box: '', quote: '' })}
      >
        {citable.map(({ revisionId, name }) => (
          <option key={revisionId} value={revisionId}>
            {name}
          </option>
        ))}
      </SelectField>
      <TextField
        label="Page"
        name="how.page"
        inputMode="numeric"
        autoComplete="off"
        value={draft.page}
        error={fields['how.page']}
        help={pages === undefined ? undefined : pages === 1 ? 'of one' : `of ${pages}`}
        onChange={(event) => change({ page: event.target.value, box: '' })}
      />
      <AreaField
        label="The sheet’s words"
        name="how.quote"
        rows={2}
        value={draft.quote}
        error={fields['how.quote']}
        className="sm:col-span-2"
        onChange={(event) => change({ quote: event.target.value })}
      />
      <p className="flex flex-wrap items-center gap-x-4 gap-y-2 sm:col-span-2">
        <Link
          to={`${paths.sheetPage(chosen, Number(draft.page) || 1, box)}&mark=1&return=${encodeURIComponent(returnTo)}`}
          className={buttonClass()}
          onClick={onMark}
        >
          {box ? 'Mark another place' : 'Mark the place on the page'}
        </Link>
        <span className="text-pencil">
          {box ? `A place is marked on page ${draft.page}.` : 'No place is marked yet; the page and the words will do.'}
        </span>
      </p>
    </div>
  )
}
