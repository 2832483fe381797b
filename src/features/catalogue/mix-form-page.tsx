import { type SubmitEvent, useMemo, useState } from 'react'
import { useNavigate, useParams } from 'react-router'
import { type MixRecord, mixBody, newMixBody } from '../../../shared/api/catalogue.ts'
import { chemistries } from '../../../shared/domain/product.ts'
import { sentenceOf } from '../../lib/api.ts'
import { useSubmit } from '../../lib/form.ts'
import { useLeaveGuard } from '../../lib/leave-guard.ts'
import { paths } from '../../lib/paths.ts'
import { Asking } from '../../ui/asking.tsx'
import { Button } from '../../ui/button.tsx'
import { AreaField, SelectField, TextField } from '../../ui/field.tsx'
import { LeaveDialog } from '../../ui/leave-dialog.tsx'
import { Card, Page } from '../../ui/page.tsx'
import { ProblemSummary } from '../../ui/problem-summary.tsx'
import { ConflictNotice, merged, useConflict } from './conflict.tsx'
import { type MixDraft, type MixFormPart, bodyOfMix, draftOfMix, mixDifferences, mixFields } from './mix-draft.ts'
import { PartsFields } from './parts-fields.tsx'
import { useCatalogueChanges, useMakers, useRecord } from './queries.ts'
import { RatioFields } from './ratio-fields.tsx'

export function NewMixPage() {
  return <MixForm mix={undefined} />
}

export function EditMixPage() {
  const { mixId = '' } = useParams()
  const record = useRecord('mix', mixId)
  return (
    <Asking query={record} says={sentenceOf}>
      {(data) => ('parts' in data ? <MixForm key={data.id} mix={data} /> : null)}
    </Asking>
  )
}

/** Name, parts and, for a new mix of several parts, the ratio with its basis and how it is known. */
function MixForm({ mix }: { mix: MixRecord | undefined }) {
  const { addMix, changeMix, readMix } = useCatalogueChanges()
  const navigate = useNavigate()
  const { base, theirs, watch, settle } = useConflict(mix, readMix)
  const [began] = useState(() => draftOfMix(mix))
  const [draft, setDraft] = useState(began)
  const change = (part: Partial<MixDraft>) => setDraft((before) => ({ ...before, ...part }))
  const guard = useLeaveGuard(JSON.stringify(draft) !== JSON.stringify(began))
  const { submit, problems, busy } = useSubmit(mix ? mixBody : newMixBody, (body) =>
    watch(base ? changeMix(base.id, { ...mixBody.parse(body), version: base.version }) : addMix(newMixBody.parse(body))),
  )
  const shown = useMemo(() => ({ ...problems, fields: mixFields(problems.fields) }), [problems])
  const onSubmit = async (event: SubmitEvent<HTMLFormElement>) => {
    event.preventDefault()
    const kept = await submit(bodyOfMix(draft, !mix))
    if (!kept) return
    guard.pass()
    await navigate(paths.mix(kept.id))
  }
  const takeTheirs = () => {
    if (theirs) setDraft(draftOfMix(theirs))
    settle()
  }
  const keepMine = () => {
    if (theirs) setDraft(merged(began, { mine: draft, theirs: draftOfMix(theirs) }))
    settle()
  }
  return (
    <Page title={mix ? `Edit ${mix.name}` : 'Add a mix'}>
      <LeaveDialog guard={guard} />
      <Card className="max-w-2xl">
        <form onSubmit={(event) => void onSubmit(event)} className="grid gap-4 p-4 sm:grid-cols-2" noValidate>
          <div className="empty:hidden sm:col-span-2">
            {theirs ? (
              <ConflictNotice
                differences={mixDifferences(began, { mine: draft, theirs: draftOfMix(theirs) })}
                onMine={keepMine}
                onTheirs={takeTheirs}
              />
            ) : (
              <ProblemSummary problems={shown} />
            )}
          </div>
          <MixFields draft={draft} change={change} fields={shown.fields} />
          <PartsFields draft={draft} change={change} fields={shown.fields} mix={base} />
          {!mix && draft.parts.length > 1 && <RatioFields draft={draft} change={change} fields={shown.fields} />}
          <div className="flex gap-2 sm:col-span-2">
            <Button type="submit" look="primary" busy={busy}>
              {mix ? 'Save' : 'Add the mix'}
            </Button>
            <Button onClick={() => void navigate(mix ? paths.mix(mix.id) : paths.mixes)}>Cancel</Button>
          </div>
        </form>
      </Card>
    </Page>
  )
}

function MixFields({ draft, change, fields }: MixFormPart) {
  const makers = useMakers()
  const field = (name: 'name' | 'maker' | 'chemistry' | 'color' | 'note', label: string) => ({
    label,
    name,
    value: draft[name],
    error: fields[name],
    onChange: (event: { target: { value: string } }) => change({ [name]: event.target.value }),
  })
  return (
    <>
      <TextField
        {...field('name', 'Name')}
        help="As on the data sheet, without the component."
        className="sm:col-span-2"
        autoComplete="off"
      />
      <TextField {...field('maker', 'Maker')} list="makers" autoComplete="off" />
      <datalist id="makers">
        {makers.data?.items.map((maker) => (
          <option key={maker} value={maker} />
        ))}
      </datalist>
      <SelectField {...field('chemistry', 'Chemistry')}>
        {chemistries.map((chemistry) => (
          <option key={chemistry}>{chemistry}</option>
        ))}
      </SelectField>
      <AreaField {...field('note', 'Note')} />
      <TextField {...field('color', 'Colour it cures to')} type="color" help="For the drawing of the floor." />
    </>
  )
}
