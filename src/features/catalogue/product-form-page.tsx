import { type SubmitEvent, useState } from 'react'
import { useNavigate, useParams } from 'react-router'
import { type ProductRecord, productBody } from '../../../shared/api/catalogue.ts'
import { chemistries, productKinds } from '../../../shared/domain/product.ts'
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
import { useCatalogueChanges, useMakers, useRecord } from './queries.ts'

export function NewProductPage() {
  return <ProductForm product={undefined} />
}

export function EditProductPage() {
  const { productId = '' } = useParams()
  const record = useRecord('product', productId)
  return (
    <Asking query={record} says={sentenceOf}>
      {(data) => ('kind' in data ? <ProductForm key={data.id} product={data} /> : null)}
    </Asking>
  )
}

const labels = { name: 'Name', maker: 'Maker', kind: 'Kind', chemistry: 'Chemistry', note: 'Note' } as const
type ProductDraft = Record<keyof typeof labels, string>
const fieldNames = Object.keys(labels) as (keyof ProductDraft)[]
const blank: ProductDraft = { name: '', maker: '', kind: 'resin', chemistry: 'epoxy', note: '' }
const draftOf = ({ name, maker, kind, chemistry, note }: ProductRecord): ProductDraft => ({ name, maker, kind, chemistry, note })

function ProductForm({ product }: { product: ProductRecord | undefined }) {
  const { addProduct, changeProduct, readProduct } = useCatalogueChanges()
  const navigate = useNavigate()
  const { base, theirs, watch, settle } = useConflict(product, readProduct)
  const [draft, setDraft] = useState<ProductDraft>(base ? draftOf(base) : blank)
  const began = base ? draftOf(base) : blank
  const guard = useLeaveGuard(fieldNames.some((name) => draft[name] !== began[name]))
  const { submit, problems, busy } = useSubmit(productBody, (body) =>
    watch(base ? changeProduct(base.id, { ...body, version: base.version }) : addProduct(body)),
  )
  const onSubmit = async (event: SubmitEvent<HTMLFormElement>) => {
    event.preventDefault()
    const kept = await submit(draft)
    if (!kept) return
    guard.pass()
    await navigate(paths.product(kept.id))
  }
  const takeTheirs = () => {
    if (theirs) setDraft(draftOf(theirs))
    settle()
  }
  const saved = theirs && draftOf(theirs)
  const keepMine = () => {
    if (saved) setDraft(merged(began, { mine: draft, theirs: saved }))
    settle()
  }
  return (
    <Page title={product ? `Edit ${product.name}` : 'Add a product'}>
      <LeaveDialog guard={guard} />
      <Card className="max-w-2xl">
        <form onSubmit={(event) => void onSubmit(event)} className="grid gap-4 p-4 sm:grid-cols-2" noValidate>
          <div className="empty:hidden sm:col-span-2">
            {saved ? (
              <ConflictNotice
                differences={fieldNames
                  .filter((name) => saved[name] !== draft[name])
                  .map((name) => ({ label: labels[name], theirs: saved[name], mine: draft[name] === began[name] ? null : draft[name] }))}
                onMine={keepMine}
                onTheirs={takeTheirs}
              />
            ) : (
              <ProblemSummary problems={problems} />
            )}
          </div>
          <ProductFields draft={draft} change={(part) => setDraft({ ...draft, ...part })} fields={problems.fields} />
          <div className="flex gap-2 sm:col-span-2">
            <Button type="submit" look="primary" busy={busy}>
              {product ? 'Save' : 'Add the product'}
            </Button>
            <Button onClick={() => void navigate(product ? paths.product(product.id) : paths.products)}>Cancel</Button>
          </div>
        </form>
      </Card>
    </Page>
  )
}

function ProductFields({
  draft,
  change,
  fields,
}: {
  draft: ProductDraft
  change: (part: Partial<ProductDraft>) => void
  fields: Record<string, string>
}) {
  const makers = useMakers()
  const field = (name: keyof ProductDraft) => ({
    label: labels[name],
    name,
    value: draft[name],
    error: fields[name],
    onChange: (event: { target: { value: string } }) => change({ [name]: event.target.value }),
  })
  return (
    <>
      <TextField {...field('name')} help="As printed on the pail, with its component." className="sm:col-span-2" autoComplete="off" />
      <TextField {...field('maker')} list="makers" autoComplete="off" />
      <datalist id="makers">
        {makers.data?.items.map((maker) => (
          <option key={maker} value={maker} />
        ))}
      </datalist>
      <SelectField {...field('kind')}>
        {productKinds.map((kind) => (
          <option key={kind}>{kind}</option>
        ))}
      </SelectField>
      <SelectField {...field('chemistry')}>
        {chemistries.map((chemistry) => (
          <option key={chemistry}>{chemistry}</option>
        ))}
      </SelectField>
      <AreaField {...field('note')} className="sm:col-span-2" />
    </>
  )
}
