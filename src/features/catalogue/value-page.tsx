import { type SubmitEvent, useMemo, useState } from 'react'
import { Link, useLocation, useNavigate, useParams } from 'react-router'
import { type MixRecord, type ProductRecord, factBody } from '../../../shared/api/catalogue.ts'
import { formatConditions, formatValue } from '../../../shared/domain/format.ts'
import { type Property, definitionOf, properties } from '../../../shared/domain/property.ts'
import { sentenceOf } from '../../lib/api.ts'
import { useSubmit } from '../../lib/form.ts'
import { useLeaveGuard } from '../../lib/leave-guard.ts'
import { paths } from '../../lib/paths.ts'
import { Asking } from '../../ui/asking.tsx'
import { Button } from '../../ui/button.tsx'
import { SelectField } from '../../ui/field.tsx'
import { LeaveDialog } from '../../ui/leave-dialog.tsx'
import { Card, Notice, Page } from '../../ui/page.tsx'
import { ProblemSummary } from '../../ui/problem-summary.tsx'
import { HowFields, citableOf } from './how-fields.tsx'
import { propertyGroups } from './property-groups.ts'
import { type RecordKind, useCatalogueChanges, useRecord } from './queries.ts'
import { RemoveValue } from './remove-value.tsx'
import { useValueDraft } from './use-value-draft.ts'
import { ValueFields } from './value-fields.tsx'
import { bodyOfDraft, draftOf, valueFields } from './value-text.ts'

export function ProductValuePage() {
  const { productId = '' } = useParams()
  return <ValuePage kind="product" id={productId} />
}

export function MixValuePage() {
  const { mixId = '' } = useParams()
  return <ValuePage kind="mix" id={mixId} />
}

function ValuePage({ kind, id }: { kind: RecordKind; id: string }) {
  const record = useRecord(kind, id)
  return (
    <Asking query={record} says={sentenceOf}>
      {(data) => <ValueForm key={data.id} kind={kind} given={data} />}
    </Asking>
  )
}

/** Adds a value to a record or amends one: the value, its conditions, and how it is known. */
function ValueForm({ kind, given }: { kind: RecordKind; given: ProductRecord | MixRecord }) {
  const { factId } = useParams()
  const { pathname } = useLocation()
  const navigate = useNavigate()
  // The value as it was when the form opened: one that someone else ends meanwhile is told on saving, not lost under the hands.
  const [fact] = useState(() => given.facts.find(({ id }) => id === factId))
  const { draft, dirty, change, forget } = useValueDraft(fact)
  const guard = useLeaveGuard(dirty)
  const [added, setAdded] = useState<string>()
  const { addFact, amendFact } = useCatalogueChanges()
  const { submit, problems, busy } = useSubmit(factBody, (body) => (factId ? amendFact(factId, body) : addFact(kind, given.id, body)))
  const shown = useMemo(() => ({ ...problems, fields: valueFields(problems.fields) }), [problems])
  const back = kind === 'product' ? paths.product(given.id) : paths.mix(given.id)
  const leave = async () => {
    guard.pass()
    forget()
    await navigate(back)
  }
  const save = async (another: boolean) => {
    const kept = await submit(bodyOfDraft(draft))
    if (!kept) return
    if (!another) return leave()
    const { how, reason, revisionId, page, unit, saying } = draft
    change({ ...draftOf(draft.property), how, reason, revisionId, page, unit, saying })
    setAdded(`${properties[kept.property].label}: ${formatValue(kept)} ${formatConditions(kept.at)}`.trim())
  }
  const onSubmit = (event: SubmitEvent) => {
    event.preventDefault()
    void save(false)
  }
  const choose = (property: Property) => {
    const { how, reason, revisionId, page } = draft
    change({ ...draftOf(property), how, reason, revisionId, page })
  }
  if (factId && !fact) return <GoneValue back={back} />
  const label = properties[draft.property].label.toLowerCase()
  return (
    <Page title={factId ? `Amend ${label} of ${given.name}` : `Add a value to ${given.name}`}>
      <LeaveDialog guard={guard} />
      <Card className="max-w-3xl">
        <form onSubmit={onSubmit} className="grid gap-5 p-4" noValidate>
          <ProblemSummary problems={shown} />
          {added && Object.keys(shown.fields).length === 0 && !shown.summary && <Notice>Added {added}.</Notice>}
          {!factId && <PropertyChoice property={draft.property} kind={kind} onChoose={choose} />}
          {!factId && <TakesPlace record={given} property={draft.property} part={draft.part} base={back} />}
          <ValueFields
            draft={draft}
            change={change}
            fields={shown.fields}
            parts={'parts' in given ? given.parts.map(({ part }) => part) : []}
          />
          <HowFields
            draft={draft}
            change={change}
            fields={shown.fields}
            citable={citableOf(given.sheets, fact)}
            firmOnly={definitionOf(draft.property).source === 'firm'}
            returnTo={`${pathname}?resume=1`}
            onMark={guard.pass}
          />
          <div className="flex flex-wrap gap-2">
            <Button type="submit" look="primary" busy={busy}>
              {factId ? 'Save' : 'Add'}
            </Button>
            {!factId && definitionOf(draft.property).repeats && (
              <Button busy={busy} onClick={() => void save(true)}>
                Add, then another
              </Button>
            )}
            <Button onClick={() => void leave()}>{added ? 'Done' : 'Cancel'}</Button>
            {fact && <RemoveValue factId={fact.id} onRemoved={() => void leave()} />}
          </div>
        </form>
      </Card>
    </Page>
  )
}

function PropertyChoice({ property, kind, onChoose }: { property: Property; kind: RecordKind; onChoose: (property: Property) => void }) {
  return (
    <SelectField
      label="Property"
      name="statement.property"
      value={property}
      onChange={(event) => onChoose(event.target.value as Property)}
      className="max-w-sm"
    >
      {propertyGroups.map(({ title, properties: members }) => (
        <optgroup key={title} label={title}>
          {members
            .filter((member) => kind === 'mix' || member !== 'mixRatio')
            .map((member) => (
              <option key={member} value={member}>
                {properties[member].label}
              </option>
            ))}
        </optgroup>
      ))}
    </SelectField>
  )
}

/** Says so when the new value will take the place of one that is there. */
function TakesPlace({
  record,
  property,
  part,
  base,
}: {
  record: ProductRecord | MixRecord
  property: Property
  part: string
  base: string
}) {
  const there = record.facts.find((fact) => fact.property === property && fact.part === part)
  if (!there || definitionOf(property).repeats) return null
  return (
    <Notice>
      There is {formatValue(there)} already. A new value takes its place; the history keeps the old one.{' '}
      <Link to={`${base}/values/${there.id}`} className="text-resin underline">
        Amend it instead
      </Link>
    </Notice>
  )
}

function GoneValue({ back }: { back: string }) {
  return (
    <Page title="This value is not there any more">
      <Notice>
        Someone has changed or removed it.{' '}
        <Link to={back} className="text-resin underline">
          Go back to the record
        </Link>{' '}
        and look at what stands there now.
      </Notice>
    </Page>
  )
}
