import Fuse, { type Expression } from 'fuse.js'
import { type KeyboardEvent, useId, useMemo, useState } from 'react'
import type { ProductRow } from '../../../shared/api/catalogue.ts'
import { useSettled } from '../../lib/use-settled.ts'
import { TextField } from '../../ui/field.tsx'
import { useProducts } from './queries.ts'

export interface Chosen {
  id: string
  name: string
  maker: string
}

interface ProductPickerProps {
  label: string
  name: string
  chosen: Chosen | null
  onChoose: (product: Chosen | null) => void
  /** Products that are chosen elsewhere in the form. */
  without: readonly string[]
  error?: string | undefined
}

/** Letters typed wrong still find it; 0.3 lets about one in three differ. */
const likeness = { keys: ['name', 'maker', 'kind', 'chemistry'], threshold: 0.3, ignoreLocation: true }
const most = 8

/** Every word that is typed must be like something of the product: "hardner 110" finds the hardener of the 110. */
const everyWord = (typed: string): Expression => ({
  $and: typed
    .trim()
    .split(/\s+/)
    .map((word) => ({ $or: likeness.keys.map((key) => ({ [key]: word })) })),
})

/** What the server found for the letters typed, put in order here on every key. */
function useFound(typed: string, without: readonly string[]): { rows: ProductRow[]; waiting: boolean } {
  const asked = useSettled(typed.trim(), 150)
  const products = useProducts({ q: asked, sort: 'name', limit: '100', status: 'active' })
  const items = products.data?.items
  const waiting = products.isPending || products.isPlaceholderData || asked !== typed.trim()
  const rows = useMemo(() => {
    const offered = (items ?? []).filter(({ id }) => !without.includes(id))
    if (typed.trim() === '') return offered.slice(0, most)
    const alike = new Fuse(offered, likeness).search(everyWord(typed), { limit: most }).map(({ item }) => item)
    return alike.length > 0 || waiting ? alike : offered.slice(0, most)
  }, [items, typed, without, waiting])
  return { rows, waiting }
}

/** Finds a product by a few letters: arrow keys and Enter choose, Escape closes. */
export function ProductPicker({ label, name, chosen, onChoose, without, error }: ProductPickerProps) {
  if (!chosen) return <ProductSearch label={label} name={name} onChoose={onChoose} without={without} error={error} />
  return (
    <div>
      <p className="mb-1 font-semibold">{label}</p>
      <p className="flex min-h-9 flex-wrap items-center justify-between gap-x-4 border border-rule px-2 py-1">
        <span>
          {chosen.name} <span className="text-pencil">{chosen.maker}</span>
        </span>
        <button
          type="button"
          name={name}
          className="text-resin underline"
          aria-label={`Choose another product for ${label}`}
          onClick={() => onChoose(null)}
        >
          Choose another
        </button>
      </p>
      {error && <p className="mt-1 font-semibold text-stop">{error}</p>}
    </div>
  )
}

function ProductSearch({ label, name, onChoose, without, error }: Omit<ProductPickerProps, 'chosen'>) {
  const listId = useId()
  const [typed, setTyped] = useState('')
  const [open, setOpen] = useState(false)
  const [at, setAt] = useState(0)
  const { rows, waiting } = useFound(typed, without)
  const lit = Math.min(at, rows.length - 1)
  const choose = (row: ProductRow | undefined) => row && onChoose({ id: row.id, name: row.name, maker: row.maker })
  const onKeyDown = (event: KeyboardEvent) => {
    const step = { ArrowDown: 1, ArrowUp: -1 }[event.key]
    if (step !== undefined) {
      setOpen(true)
      setAt(open ? Math.max(0, Math.min(rows.length - 1, lit + step)) : 0)
    } else if (event.key === 'Enter' && open && rows.length > 0) choose(rows[lit])
    else if (event.key === 'Escape' && open) setOpen(false)
    else return
    event.preventDefault()
  }
  return (
    <div onBlur={(event) => !event.currentTarget.contains(event.relatedTarget) && setOpen(false)}>
      <TextField
        label={label}
        name={name}
        autoComplete="off"
        value={typed}
        error={error}
        placeholder="Name, maker or kind"
        role="combobox"
        aria-expanded={open}
        aria-controls={listId}
        aria-autocomplete="list"
        aria-activedescendant={open && rows.length > 0 ? `${listId}-${lit}` : undefined}
        onFocus={() => setOpen(true)}
        onKeyDown={onKeyDown}
        onChange={(event) => {
          setTyped(event.target.value)
          setAt(0)
          setOpen(true)
        }}
      />
      <ul
        id={listId}
        role="listbox"
        aria-label={`Products for ${label}`}
        className={open ? 'border border-t-0 border-pencil bg-card' : 'hidden'}
      >
        {rows.map((product, index) => (
          // eslint-disable-next-line jsx-a11y/click-events-have-key-events -- the keys are the input's: focus stays there
          <li
            key={product.id}
            id={`${listId}-${index}`}
            role="option"
            aria-selected={index === lit}
            tabIndex={-1}
            onMouseDown={(event) => event.preventDefault()}
            onClick={() => choose(product)}
            className={`flex min-h-9 cursor-pointer flex-wrap items-center justify-between gap-x-3 px-2 py-1 hover:bg-resin-wash ${index === lit ? 'bg-resin-wash' : ''}`}
          >
            <span>{product.name}</span>
            <span className="text-pencil">
              {product.maker}, {product.kind}
            </span>
          </li>
        ))}
        {rows.length === 0 && (
          <li role="option" aria-selected="false" aria-disabled="true" className="px-2 py-1 text-pencil">
            {waiting ? 'Looking …' : 'Nothing found. Add the product first.'}
          </li>
        )}
      </ul>
    </div>
  )
}
