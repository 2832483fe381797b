import { type ReactNode, type SubmitEvent, useState } from 'react'
import type { Sheet, Subject, Suggestion } from '../../../shared/api/sheets.ts'
import { sheetEndpoints } from '../../../shared/api/sheets.ts'
import type { SheetKind } from '../../../shared/domain/sheet.ts'
import { useSubmit } from '../../lib/form.ts'
import { Button } from '../../ui/button.tsx'
import { SelectField, TextField } from '../../ui/field.tsx'
import { ProblemSummary } from '../../ui/problem-summary.tsx'
import { useSheetChanges } from './queries.ts'
import { SubjectPicker, refOf } from './subject-picker.tsx'

interface DetailsFormProps {
  sheet: Sheet
  /** Revisions whose dates are asked for; the first is the one uploaded. */
  revisionIds: [string, ...string[]]
  /** What the text suggests; shown in fields that nobody has filled. */
  suggestion?: Suggestion
  /** Sheets of a like title that this may be a new revision of. */
  alike?: { id: string; title: string; kind: SheetKind }[]
  /** Beside the save button. */
  beside?: ReactNode
  onSaved: (sheet: Sheet) => void
}

const textOf = (value: FormDataEntryValue | null) => (typeof value === 'string' ? value.trim() : '')
const kindNames = { data: 'Data sheet', safety: 'Safety sheet' } as const

/** Kind, title, maker, date and subjects of a sheet, for a person to put right. */
export function DetailsForm({ sheet, revisionIds, suggestion, alike = [], beside, onSaved }: DetailsFormProps) {
  const { change, move } = useSheetChanges()
  const [subjects, setSubjects] = useState<Subject[]>(sheet.subjects)
  const twin = alike.find((other) => other.kind === sheet.kind && other.title.toLowerCase() === sheet.title.toLowerCase())
  const [revisionOf, setRevisionOf] = useState(twin?.id ?? '')
  const [maker, setMaker] = useState(sheet.maker)
  const { submit, problems, busy } = useSubmit(sheetEndpoints.changeSheet.body, (body) => change({ sheetId: sheet.id, ...body }))
  const { fields } = problems
  const dated = sheet.revisions.filter((revision) => revisionIds.includes(revision.id))

  const choose = (next: Subject[]) => {
    setSubjects(next)
    if (maker === '' && next[0]) setMaker(next[0].maker)
  }
  const onSubmit = async (event: SubmitEvent<HTMLFormElement>) => {
    event.preventDefault()
    const values = new FormData(event.currentTarget)
    const dates = dated.map(({ id }, index) => ({
      revisionId: id,
      revisionDate: textOf(values.get(`dates.${index}.revisionDate`)) || null,
    }))
    const body = {
      version: sheet.version,
      kind: values.get('kind'),
      title: values.get('title'),
      maker,
      subjects: subjects.map(refOf),
      dates,
    }
    const saved = await submit(body)
    if (!saved) return
    onSaved(revisionOf ? await move({ revisionId: revisionIds[0], sheetId: revisionOf }) : saved)
  }

  return (
    <form onSubmit={onSubmit} className="flex flex-col gap-3" aria-label={`Details of ${sheet.title}`}>
      <ProblemSummary problems={problems} />
      {alike.length > 0 && (
        <SelectField label="This file is" value={revisionOf} onChange={(event) => setRevisionOf(event.target.value)} className="max-w-xl">
          <option value="">a new sheet</option>
          {alike.map((other) => (
            <option key={other.id} value={other.id}>
              a new revision of “{other.title}” ({kindNames[other.kind].toLowerCase()})
            </option>
          ))}
        </SelectField>
      )}
      <div className="grid gap-3 md:grid-cols-[1fr_2fr_1.5fr_1.2fr]">
        {!revisionOf && (
          <>
            <SelectField label="Kind" name="kind" defaultValue={sheet.kind} error={fields['kind']}>
              <option value="data">Data sheet</option>
              <option value="safety">Safety sheet</option>
            </SelectField>
            <TextField label="Title" name="title" defaultValue={sheet.title} error={fields['title']} />
            <TextField
              label="Maker"
              name="maker"
              value={maker}
              onChange={(event) => setMaker(event.target.value)}
              error={fields['maker']}
            />
          </>
        )}
        {revisionOf && <KeptValues sheet={sheet} />}
        {dated.map(({ id, fileName, revisionDate }, index) => (
          <TextField
            key={id}
            label={dated.length > 1 ? `Revision date of ${fileName}` : 'Revision date'}
            name={`dates.${index}.revisionDate`}
            defaultValue={revisionDate ?? suggestion?.revisionDate ?? ''}
            placeholder="not stated"
            error={fields[`dates.${index}.revisionDate`]}
            help={
              revisionDate === null && suggestion?.revisionDate
                ? 'Found in the text. Check it on the sheet.'
                : 'As 2024-03-18, 2024-03 or 2024.'
            }
          />
        ))}
      </div>
      {!revisionOf && <SubjectPicker value={subjects} onChange={choose} error={fields['subjects']} />}
      <div className="flex flex-wrap items-center gap-3">
        <Button type="submit" look="primary" busy={busy}>
          Save
        </Button>
        {beside}
      </div>
    </form>
  )
}

/** Fields that a revision of another sheet does not ask for, but the request needs. */
function KeptValues({ sheet }: { sheet: Sheet }) {
  return (
    <>
      <input type="hidden" name="kind" value={sheet.kind} />
      <input type="hidden" name="title" value={sheet.title} />
    </>
  )
}
