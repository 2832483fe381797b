import { definitionOf } from '../../../shared/domain/property.ts'
import { unitText } from '../../../shared/domain/format.ts'
import { AreaField, SelectField, TextField } from '../../ui/field.tsx'
import { type ValueDraft, unitsFor } from './value-text.ts'

export interface DraftPart {
  draft: ValueDraft
  change: (part: Partial<ValueDraft>) => void
  fields: Record<string, string>
}

/** The inputs of a value, by the form of its property, with its conditions. */
export function ValueFields(part: DraftPart) {
  const { draft, change, fields } = part
  const { form, byPart } = definitionOf(draft.property)
  return (
    <>
      {byPart && (
        <SelectField label="Stated of" name="statement.part" value={draft.part} error={fields['statement.part']} onChange={(event) => change({ part: event.target.value as ValueDraft['part'] })} className="max-w-xs">
          <option value="mixed">the product or mix as a whole</option>
          <option value="A">part A</option>
          <option value="B">part B</option>
          <option value="C">part C</option>
        </SelectField>
      )}
      <FormFields {...part} />
      {(form === 'quantity' || form === 'window') && <ConditionFields {...part} />}
    </>
  )
}

function FormFields({ draft, change, fields }: DraftPart) {
  const error = fields['statement.value'] ?? fields['statement.value.text'] ?? fields['statement.value.codes']
  const text = (label: string, help: string) => (
    <TextField label={label} name="statement.value" value={draft.text} help={help} error={error} onChange={(event) => change({ text: event.target.value })} />
  )
  switch (definitionOf(draft.property).form) {
    case 'quantity':
    case 'window':
      return <RangeFields draft={draft} change={change} fields={fields} units={unitsFor(draft.property)} />
    case 'ratio':
      return (
        <div className="grid gap-4 sm:grid-cols-2">
          {text('Ratio', 'Parts in the order A, B, C: 2 : 1')}
          <SelectField label="Basis" name="statement.value.basis" value={draft.basis} onChange={(event) => change({ basis: event.target.value })}>
            <option value="volume">by volume</option>
            <option value="weight">by weight</option>
            <option value="">not stated</option>
          </SelectField>
        </div>
      )
    case 'codes':
      return <AreaField label="Codes" name="statement.value" value={draft.text} help="H315, H317 … with commas between." error={error} onChange={(event) => change({ text: event.target.value })} />
    case 'substance':
      return (
        <>
          <div className="grid gap-4 sm:grid-cols-2">
            {text('Substance', 'As printed.')}
            <TextField label="CAS number" name="statement.value.cas" value={draft.cas} error={fields['statement.value.cas']} onChange={(event) => change({ cas: event.target.value.trim() })} />
          </div>
          <RangeFields draft={draft} change={change} fields={fields} units={['%']} />
        </>
      )
    case 'date':
      return text('Date', 'Year, year and month, or day: 2024, 2024-03, 2024-03-18.')
    case 'flag':
      return (
        <SelectField label="Is it so" name="statement.value" value={draft.is} error={error} className="max-w-xs" onChange={(event) => change({ is: event.target.value })}>
          <option value="yes">yes</option>
          <option value="no">no</option>
        </SelectField>
      )
    case 'text':
      return <AreaField label="Text" name="statement.value" value={draft.text} help="In the sheet’s own words." error={error} onChange={(event) => change({ text: event.target.value })} />
  }
}

function RangeFields({ draft, change, fields, units }: DraftPart & { units: readonly string[] }) {
  const error = fields['statement.value'] ?? fields['statement.value.min']
  return (
    <div className="grid gap-4 sm:grid-cols-3">
      <TextField label="At least" name="statement.value.min" inputMode="decimal" value={draft.min} error={error} help="Both the same for a single figure; one alone for a bound." onChange={(event) => change({ min: event.target.value })} />
      <TextField label="At most" name="statement.value.max" inputMode="decimal" value={draft.max} error={fields['statement.value.max']} onChange={(event) => change({ max: event.target.value })} />
      <SelectField label="Unit, as stated" name="statement.value.unit" value={draft.unit} error={fields['statement.value.unit']} onChange={(event) => change({ unit: event.target.value })}>
        {units.map((unit) => (
          <option key={unit} value={unit}>
            {unitText(unit as Parameters<typeof unitText>[0])}
          </option>
        ))}
      </SelectField>
    </div>
  )
}

const conditions = [
  ['temperature', 'At temperature', ['°F', '°C']],
  ['mass', 'At mass', ['g', 'kg', 'lb']],
  ['volume', 'At volume', ['gal', 'L', 'mL']],
  ['film', 'At film', ['mil', 'µm', 'mm']],
] as const

function ConditionFields({ draft, change, fields }: DraftPart) {
  const { property } = draft
  return (
    <details open={conditions.some(([name]) => draft[name] !== '') || draft.next !== ''}>
      <summary className="cursor-pointer font-semibold">Conditions the value holds at</summary>
      <div className="mt-2 grid gap-4 sm:grid-cols-2">
        {conditions.map(([name, label, units]) => (
          <div key={name} className="flex items-start gap-1">
            <TextField label={label} name={`statement.at.${name}.value`} inputMode="decimal" value={draft[name]} error={fields[`statement.at.${name}.value`]} className="flex-1" onChange={(event) => change({ [name]: event.target.value })} />
            <select aria-label={`Unit, ${label}`} className="mt-7 min-h-9 border border-pencil bg-card px-1" value={draft[`${name}Unit`]} onChange={(event) => change({ [`${name}Unit`]: event.target.value })}>
              {units.map((unit) => (
                <option key={unit}>{unit}</option>
              ))}
            </select>
          </div>
        ))}
        {property === 'recoatWindow' && <TextField label="Before which next coat" name="statement.at.next" value={draft.next} help="Only where the sheet names one." onChange={(event) => change({ next: event.target.value })} />}
        {property === 'filmThickness' && (
          <SelectField label="Measured" name="statement.film" value={draft.wetOrDry} onChange={(event) => change({ wetOrDry: event.target.value })}>
            <option value="">wet or dry not stated</option>
            <option value="wet">wet</option>
            <option value="dry">dry</option>
          </SelectField>
        )}
        {property === 'applicationTemperature' && (
          <SelectField label="Of" name="statement.of" value={draft.of} onChange={(event) => change({ of: event.target.value })}>
            <option value="">air, slab and material alike</option>
            <option value="air">air</option>
            <option value="slab">slab</option>
            <option value="material">material</option>
          </SelectField>
        )}
        {property === 'voc' && (
          <SelectField label="State" name="statement.thinned" value={draft.thinned} onChange={(event) => change({ thinned: event.target.value })}>
            <option value="">as mixed</option>
            <option value="yes">with the thinner the sheet allows</option>
          </SelectField>
        )}
      </div>
    </details>
  )
}
