import { type SubmitEvent, useState } from 'react'
import { useNavigate, useParams } from 'react-router'
import { type MixRecord, mixBody, newMixBody } from '../../../shared/api/catalogue.ts'
import type { ComponentPart } from '../../../shared/domain/mix.ts'
import { chemistries } from '../../../shared/domain/product.ts'
import { sentenceOf } from '../../lib/api.ts'
import { useSubmit } from '../../lib/form.ts'
import { paths } from '../../lib/paths.ts'
import { Asking } from '../../ui/asking.tsx'
import { Button } from '../../ui/button.tsx'
import { AreaField, SelectField, TextField } from '../../ui/field.tsx'
import { Card, Page } from '../../ui/page.tsx'
import { ProblemSummary } from '../../ui/problem-summary.tsx'
import { ProductPicker } from './product-picker.tsx'
import { useCatalogueChanges, useMakers, useRecord } from './queries.ts'
import { ratioFrom } from './value-text.ts'

const partNames = ['A', 'B', 'C'] as const satisfies readonly ComponentPart[]

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

type Chosen = { id: string; name: string } | null

/** Name, parts and, for a new mix of several parts, the ratio with its basis and how it is known. */
function MixForm({ mix }: { mix: MixRecord | undefined }) {
  const { addMix, changeMix } = useCatalogueChanges()
  const makers = useMakers()
  const navigate = useNavigate()
  const [parts, setParts] = useState<Chosen[]>(mix?.parts.map(({ product }) => ({ id: product.id, name: product.name })) ?? [null, null])
  const { submit, problems, busy } = useSubmit(mix ? mixBody : newMixBody, (body) => (mix ? changeMix(mix.id, { ...mixBody.parse(body), version: mix.version }) : addMix(newMixBody.parse(body))))
  const { fields } = problems
  const onSubmit = async (event: SubmitEvent<HTMLFormElement>) => {
    event.preventDefault()
    const { ratioText, ratioBasis, ratioReason, name, maker, chemistry, color, note } = Object.fromEntries(new FormData(event.currentTarget))
    const chosen = parts.map((part, index) => ({ part: partNames[index], productId: part?.id ?? '' }))
    const ratio = parts.length > 1 ? { value: { parts: ratioFrom(typeof ratioText === 'string' ? ratioText : ''), ...(ratioBasis ? { basis: ratioBasis } : {}) }, reason: ratioReason } : null
    const kept = await submit({ name, maker, chemistry, color, note, parts: chosen, ...(mix ? {} : { ratio }) })
    if (kept) await navigate(paths.mix(kept.id))
  }
  const put = (index: number, product: Chosen) => setParts(parts.map((part, at) => (at === index ? product : part)))
  return (
    <Page title={mix ? `Edit ${mix.name}` : 'Add a mix'}>
      <Card className="max-w-3xl">
        <form onSubmit={onSubmit} className="grid gap-4 p-4 sm:grid-cols-2">
          <div className="sm:col-span-2">
            <ProblemSummary problems={problems} />
            <TextField label="Name" name="name" defaultValue={mix?.name} error={fields['name']} />
          </div>
          <TextField label="Maker" name="maker" list="makers" defaultValue={mix?.maker} error={fields['maker']} autoComplete="off" />
          <datalist id="makers">{makers.data?.items.map((maker) => <option key={maker} value={maker} />)}</datalist>
          <SelectField label="Chemistry" name="chemistry" defaultValue={mix?.chemistry ?? 'epoxy'} error={fields['chemistry']}>
            {chemistries.map((chemistry) => (
              <option key={chemistry}>{chemistry}</option>
            ))}
          </SelectField>
          <TextField label="Colour it cures to" name="color" type="color" defaultValue={mix?.color ?? '#8f9a98'} error={fields['color']} help="For the drawing of the floor." />
          <AreaField label="Note" name="note" defaultValue={mix?.note} error={fields['note']} />
          <fieldset className="grid gap-4 sm:col-span-2 sm:grid-cols-3">
            <legend className="mb-1 font-semibold">Parts</legend>
            {parts.map((part, index) => (
              <ProductPicker key={index} label={`Part ${partNames[index]}`} name={`parts.${index}.productId`} chosen={part} onChoose={(product) => put(index, product)} error={fields[`parts.${index}.productId`]} />
            ))}
          </fieldset>
          <div className="flex gap-2 sm:col-span-2">
            {parts.length < 3 && <Button onClick={() => setParts([...parts, null])}>Add part {partNames[parts.length]}</Button>}
            {parts.length > 1 && <Button onClick={() => setParts(parts.slice(0, -1))}>Remove part {partNames[parts.length - 1]}</Button>}
          </div>
          {!mix && parts.length > 1 && <RatioFields fields={fields} />}
          <div className="flex gap-2 sm:col-span-2">
            <Button type="submit" look="primary" busy={busy}>{mix ? 'Save' : 'Add'}</Button>
            <Button onClick={() => void navigate(mix ? paths.mix(mix.id) : paths.mixes)}>Cancel</Button>
          </div>
        </form>
      </Card>
    </Page>
  )
}

function RatioFields({ fields }: { fields: Record<string, string> }) {
  return (
    <fieldset className="grid gap-4 sm:col-span-2 sm:grid-cols-3">
      <legend className="mb-1 font-semibold">Ratio</legend>
      <TextField label="A : B" name="ratioText" placeholder="2 : 1" error={fields['ratio.value.parts'] ?? fields['ratio.value']} help="In the order of the parts." />
      <SelectField label="Basis" name="ratioBasis" defaultValue="volume" error={fields['ratio.value.basis']}>
        <option value="volume">by volume</option>
        <option value="weight">by weight</option>
        <option value="">not stated</option>
      </SelectField>
      <TextField label="How it is known" name="ratioReason" error={fields['ratio.reason']} placeholder="Label of the kit" help="Once its data sheet is attached, tie the ratio to its page." />
    </fieldset>
  )
}
