import { unitText } from '../../../shared/domain/format.ts'
import type { Unit } from '../../../shared/domain/units.ts'
import { SelectField, TextField } from '../../ui/field.tsx'
import type { DraftPart } from './draft-part.ts'
import type { Saying } from './value-text.ts'

const sayings: Record<Saying, string> = { one: 'one figure', between: 'from … to', least: 'at least', most: 'at most, up to' }
const windowSayings: Record<Saying, string> = {
  one: 'one moment',
  between: 'from earliest to latest',
  least: 'earliest alone',
  most: 'latest alone',
}

/** A range in the unit it is stated in: one figure, from – to, or a bound alone. */
export function RangeFields({ draft, change, fields, units, isWindow }: DraftPart & { units: readonly Unit[]; isWindow: boolean }) {
  const { saying } = draft
  const [from, to] = isWindow ? (['Earliest', 'Latest'] as const) : (['From', 'To'] as const)
  const names = isWindow ? windowSayings : sayings
  const end = (name: 'min' | 'max', label: string, address: string) => (
    <TextField
      label={label}
      name={address}
      inputMode="decimal"
      autoComplete="off"
      value={draft[name]}
      error={fields[address]}
      onChange={(event) => change({ [name]: event.target.value })}
    />
  )
  return (
    <div className="grid items-start gap-4 sm:grid-cols-[minmax(0,3fr)_minmax(0,2fr)_minmax(0,2fr)_minmax(0,2fr)]">
      <SelectField
        label="It says"
        name="saying"
        value={saying}
        onChange={(event) => change({ saying: event.target.value as Saying, ...carried(draft, event.target.value as Saying) })}
      >
        {Object.entries(names).map(([value, name]) => (
          <option key={value} value={value}>
            {name}
          </option>
        ))}
      </SelectField>
      {saying !== 'most' &&
        end('min', saying === 'between' || isWindow ? from : saying === 'least' ? 'At least' : 'Figure', 'statement.value')}
      {saying === 'most' && end('max', isWindow ? to : 'At most', 'statement.value')}
      {saying === 'between' && end('max', to, 'statement.value.max')}
      <SelectField
        label="Unit, as stated"
        name="statement.value.unit"
        value={draft.unit}
        error={fields['statement.value.unit']}
        onChange={(event) => change({ unit: event.target.value })}
      >
        {units.map((unit) => (
          <option key={unit} value={unit}>
            {unitText(unit)}
          </option>
        ))}
      </SelectField>
    </div>
  )
}

/** What was typed goes along to the one input that is left. */
function carried({ saying, min, max }: DraftPart['draft'], next: Saying) {
  if (next === 'most' && max === '') return { max: min }
  if (saying === 'most' && min === '' && next !== 'between') return { min: max }
  return {}
}
