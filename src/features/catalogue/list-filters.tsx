import { chemistries, productKinds } from '../../../shared/domain/product.ts'
import type { ListAddress } from '../../lib/list-address.ts'
import { SelectField, TextField } from '../../ui/field.tsx'
import { useMakers } from './queries.ts'

const capital = (word: string) => `${word[0]?.toUpperCase() ?? ''}${word.slice(1)}`

/** Search and filters of a catalogue list, kept in the address. */
export function ListFilters({ address, withKind }: { address: ListAddress; withKind: boolean }) {
  const makers = useMakers()
  const choice = (name: string, label: string, options: readonly string[]) => (
    <SelectField label={label} value={address.filter(name)} onChange={(event) => address.set({ [name]: event.target.value })}>
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
      <TextField
        label="Search" type="search" defaultValue={address.q} className="w-full max-w-sm" placeholder="Name, maker, CAS number or hazard code" onChange={(event) => address.set({ q: event.target.value })}
      />
      {withKind && choice('kind', 'Kind', productKinds)}
      {choice('maker', 'Maker', makers.data?.items ?? [])}
      {choice('chemistry', 'Chemistry', chemistries)}
      {choice('status', 'Standing', ['active', 'withdrawn'])}
    </div>
  )
}
