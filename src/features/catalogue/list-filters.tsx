import { useEffect, useId } from 'react'
import { chemistries, productKinds } from '../../../shared/domain/product.ts'
import type { ListAddress } from '../../lib/list-address.ts'
import { SelectField, TextField } from '../../ui/field.tsx'
import { useMakers } from './queries.ts'

const capital = (word: string) => `${word[0]?.toUpperCase() ?? ''}${word.slice(1)}`
const standings = ['active', 'withdrawn'] as const
const choices = { kind: productKinds, chemistry: chemistries, status: standings } as const

/** Search and filters of the address as the server takes them; what is no choice of a filter is left out. */
export function filtersOf(address: ListAddress, withKind: boolean) {
  const chosen = (name: keyof typeof choices) => (choices[name] as readonly string[]).find((choice) => choice === address.filter(name))
  return {
    ...(withKind ? { kind: chosen('kind') } : {}),
    maker: address.filter('maker') || undefined,
    chemistry: chosen('chemistry'),
    status: chosen('status'),
  }
}

/** Search and filters of a catalogue list, kept in the address. */
export function ListFilters({ address, withKind }: { address: ListAddress; withKind: boolean }) {
  const makers = useMakers()
  const choice = (name: string, label: string, options: readonly string[]) => (
    <SelectField
      label={label}
      value={address.filter(name)}
      className="max-sm:min-w-0 max-sm:flex-1"
      onChange={(event) => address.set({ [name]: event.target.value })}
    >
      <option value="">All</option>
      {options.map((option) => (
        <option key={option} value={option}>
          {capital(option)}
        </option>
      ))}
    </SelectField>
  )
  return (
    <div className="flex flex-wrap gap-4 border-b border-rule p-4">
      <SearchField address={address} />
      {withKind && choice('kind', 'Kind', productKinds)}
      {choice('maker', 'Maker', makers.data?.items ?? [])}
      {choice('chemistry', 'Chemistry', chemistries)}
      {choice('status', 'Standing', standings)}
    </div>
  )
}

/** What is typed goes into the address; an address that changes by itself (back, a link) goes into the field while nobody types there. */
function SearchField({ address }: { address: ListAddress }) {
  const id = useId()
  const { q } = address
  useEffect(() => {
    const input = document.getElementById(id)
    if (input instanceof HTMLInputElement && document.activeElement !== input) input.value = q
  }, [id, q])
  return (
    <TextField
      id={id}
      label="Search"
      type="search"
      defaultValue={q}
      className="w-full max-w-sm"
      placeholder="Name, maker, CAS number or hazard code"
      autoComplete="off"
      spellCheck={false}
      onChange={(event) => address.set({ q: event.target.value })}
    />
  )
}
