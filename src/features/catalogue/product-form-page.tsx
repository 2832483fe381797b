import { type SubmitEvent } from 'react'
import { useNavigate, useParams } from 'react-router'
import { type ProductRecord, productBody } from '../../../shared/api/catalogue.ts'
import { chemistries, productKinds } from '../../../shared/domain/product.ts'
import { sentenceOf } from '../../lib/api.ts'
import { useSubmit } from '../../lib/form.ts'
import { paths } from '../../lib/paths.ts'
import { Asking } from '../../ui/asking.tsx'
import { Button } from '../../ui/button.tsx'
import { AreaField, SelectField, TextField } from '../../ui/field.tsx'
import { Card, Page } from '../../ui/page.tsx'
import { ProblemSummary } from '../../ui/problem-summary.tsx'
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

function ProductForm({ product }: { product: ProductRecord | undefined }) {
  const { addProduct, changeProduct } = useCatalogueChanges()
  const makers = useMakers()
  const navigate = useNavigate()
  const { submit, problems, busy } = useSubmit(productBody, (body) => (product ? changeProduct(product.id, { ...body, version: product.version }) : addProduct(body)))
  const { fields } = problems
  const onSubmit = async (event: SubmitEvent<HTMLFormElement>) => {
    event.preventDefault()
    const kept = await submit(Object.fromEntries(new FormData(event.currentTarget)))
    if (kept) await navigate(paths.product(kept.id))
  }
  return (
    <Page title={product ? `Edit ${product.name}` : 'Add a product'}>
      <Card className="max-w-2xl">
        <form onSubmit={onSubmit} className="grid gap-4 p-4 sm:grid-cols-2">
          <div className="sm:col-span-2">
            <ProblemSummary problems={problems} />
            <TextField label="Name" name="name" defaultValue={product?.name} error={fields['name']} help="As printed on the pail, with its component." />
          </div>
          <TextField label="Maker" name="maker" list="makers" defaultValue={product?.maker} error={fields['maker']} autoComplete="off" />
          <datalist id="makers">{makers.data?.items.map((maker) => <option key={maker} value={maker} />)}</datalist>
          <SelectField label="Kind" name="kind" defaultValue={product?.kind ?? 'resin'} error={fields['kind']}>
            {productKinds.map((kind) => (
              <option key={kind}>{kind}</option>
            ))}
          </SelectField>
          <SelectField label="Chemistry" name="chemistry" defaultValue={product?.chemistry ?? 'epoxy'} error={fields['chemistry']}>
            {chemistries.map((chemistry) => (
              <option key={chemistry}>{chemistry}</option>
            ))}
          </SelectField>
          <AreaField label="Note" name="note" defaultValue={product?.note} error={fields['note']} className="sm:col-span-2" />
          <div className="flex gap-2 sm:col-span-2">
            <Button type="submit" look="primary" busy={busy}>{product ? 'Save' : 'Add'}</Button>
            <Button onClick={() => void navigate(product ? paths.product(product.id) : paths.products)}>Cancel</Button>
          </div>
        </form>
      </Card>
    </Page>
  )
}
