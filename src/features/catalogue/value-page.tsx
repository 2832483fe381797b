import { type SubmitEvent, useEffect, useState } from 'react'
import { useLocation, useNavigate, useParams, useSearchParams } from 'react-router'
import { type MixRecord, type ProductRecord, factBody } from '../../../shared/api/catalogue.ts'
import { type Property, definitionOf, properties, propertyNames } from '../../../shared/domain/property.ts'
import { sentenceOf } from '../../lib/api.ts'
import { useSubmit } from '../../lib/form.ts'
import { paths } from '../../lib/paths.ts'
import { Asking } from '../../ui/asking.tsx'
import { Button } from '../../ui/button.tsx'
import { SelectField } from '../../ui/field.tsx'
import { Card, Page } from '../../ui/page.tsx'
import { ProblemSummary } from '../../ui/problem-summary.tsx'
import { HowFields } from './how-fields.tsx'
import { type RecordKind, useCatalogueChanges, useRecord } from './queries.ts'
import { ValueFields } from './value-fields.tsx'
import { type ValueDraft, bodyOfDraft, draftOf } from './value-text.ts'

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
      {(data) => <ValueForm key={data.id} kind={kind} record={data} />}
    </Asking>
  )
}

const propertyIn = (search: URLSearchParams): Property => {
  const asked = search.get('property') as Property | null
  return asked && propertyNames.includes(asked) ? asked : 'density'
}

/** What was typed, kept while the page of the sheet is open for marking; the marked place comes back in the address. */
function useDraft(record: ProductRecord | MixRecord, factId: string | undefined) {
  const location = useLocation()
  const [search] = useSearchParams()
  const key = `wearcourse.value ${location.pathname}`
  const [draft, setDraft] = useState<ValueDraft>(() => {
    const marked = search.get('revision')
    const kept = marked || search.has('resume') ? sessionStorage.getItem(key) : null
    const begun = kept ? (JSON.parse(kept) as ValueDraft) : draftOf(propertyIn(search), record.facts.find(({ id }) => id === factId))
    const fact = record.facts.find(({ id }) => id === factId)
    const base = fact && !kept ? draftOf(fact.property, fact) : begun
    if (!marked) return base
    return { ...base, how: 'stated', revisionId: marked, page: search.get('page') ?? '1', box: search.get('box') ?? '', quote: search.get('quote') ?? '' }
  })
  useEffect(() => sessionStorage.setItem(key, JSON.stringify(draft)), [key, draft])
  return { draft, change: (part: Partial<ValueDraft>) => setDraft((before) => ({ ...before, ...part })), forget: () => sessionStorage.removeItem(key) }
}

/** Adds a value to a record or amends one: the value, its conditions, and how it is known. */
function ValueForm({ kind, record }: { kind: RecordKind; record: ProductRecord | MixRecord }) {
  const { factId } = useParams()
  const location = useLocation()
  const navigate = useNavigate()
  const { addFact, amendFact } = useCatalogueChanges()
  const { draft, change, forget } = useDraft(record, factId)
  const back = kind === 'product' ? paths.product(record.id) : paths.mix(record.id)
  const { submit, problems, busy } = useSubmit(factBody, (body) => (factId ? amendFact(factId, body) : addFact(kind, record.id, body)))
  const onSubmit = async (event: SubmitEvent) => {
    event.preventDefault()
    if (!(await submit(bodyOfDraft(draft)))) return
    forget()
    await navigate(back)
  }
  const label = properties[draft.property].label.toLowerCase()
  return (
    <Page title={factId ? `Amend ${label} of ${record.name}` : `Add a value to ${record.name}`}>
      <Card className="max-w-3xl">
        <form onSubmit={onSubmit} className="grid gap-5 p-4">
          <ProblemSummary problems={problems} />
          {!factId && (
            <SelectField label="Property" name="statement.property" value={draft.property} onChange={(event) => change({ ...draftOf(event.target.value as Property), how: draft.how, reason: draft.reason, revisionId: draft.revisionId, page: draft.page })}>
              {propertyNames.map((property) => (
                <option key={property} value={property}>
                  {properties[property].label}
                </option>
              ))}
            </SelectField>
          )}
          <ValueFields draft={draft} change={change} fields={problems.fields} />
          <HowFields
            draft={draft} change={change} fields={problems.fields} sheets={record.sheets} firmOnly={definitionOf(draft.property).source === 'firm'}
            returnTo={`${location.pathname}?resume=1`}
          />
          <div className="flex gap-2">
            <Button type="submit" look="primary" busy={busy}>{factId ? 'Save' : 'Add'}</Button>
            <Button
              onClick={() => {
                forget()
                void navigate(back)
              }}
            >
              Cancel
            </Button>
          </div>
        </form>
      </Card>
    </Page>
  )
}
