import Fuse from 'fuse.js'
import { useMemo, useState } from 'react'
import type { ProductRow } from '../../../shared/api/catalogue.ts'
import { TextField } from '../../ui/field.tsx'
import { useProducts } from './queries.ts'

interface ProductPickerProps {
  label: string
  name: string
  chosen: { id: string; name: string } | null
  onChoose: (product: { id: string; name: string } | null) => void
  error?: string | undefined
}

/** Letters typed wrong still find it; 0.3 lets about one in three differ. */
const likeness = { keys: ['name', 'maker', 'kind'], threshold: 0.3, ignoreLocation: true }

/** Finds a product by a few letters. What the server found is put in order here on every key. */
export function ProductPicker({ label, name, chosen, onChoose, error }: ProductPickerProps) {
  const [typed, setTyped] = useState('')
  const products = useProducts({ q: typed, sort: 'name', limit: '100', status: 'active' })
  const items = products.data?.items
  const found = useMemo(() => {
    const rows: ProductRow[] = items ?? []
    return typed === '' ? rows.slice(0, 8) : new Fuse(rows, likeness).search(typed, { limit: 8 }).map(({ item }) => item)
  }, [items, typed])
  if (chosen)
    return (
      <div>
        <p className="font-semibold">{label}</p>
        <p className="flex min-h-9 items-center gap-3">
          {chosen.name}
          <button type="button" name={name} className="text-resin underline" onClick={() => onChoose(null)}>
            Choose another
          </button>
        </p>
        {error && <p className="font-semibold text-stop">{error}</p>}
      </div>
    )
  return (
    <div>
      <TextField label={label} name={name} autoComplete="off" value={typed} error={error} placeholder="Type a few letters" onChange={(event) => setTyped(event.target.value)} />
      <ul className="border border-t-0 border-rule">
        {found.map((product) => (
          <li key={product.id}>
            <button
              type="button" className="flex min-h-9 w-full items-center justify-between gap-3 px-2 py-1 text-left hover:bg-resin-wash focus:bg-resin-wash"
              onClick={() => {
                onChoose({ id: product.id, name: product.name })
                setTyped('')
              }}
            >
              <span>{product.name}</span>
              <span className="text-pencil">
                {product.maker}, {product.kind}
              </span>
            </button>
          </li>
        ))}
        {found.length === 0 && <li className="px-2 py-1 text-pencil">Nothing found. Add the product first.</li>}
      </ul>
    </div>
  )
}
