import { useState } from 'react'
import { unitText } from '../../../shared/domain/format.ts'
import { conditionDimensions } from '../../../shared/domain/statement.ts'
import { unitsOf } from '../../../shared/domain/units.ts'
import { SelectField, TextField } from '../../ui/field.tsx'
import type { DraftPart } from './draft-part.ts'
import { type ConditionName, conditionNames } from './value-text.ts'

const labels: Record<ConditionName, string> = {
  temperature: 'At a temperature of',
  mass: 'In a mass of',
  volume: 'In a volume of',
  relativeHumidity: 'At a relative humidity of',
  film: 'At a film of',
}

/** What a value holds at: a table cell's temperature, a pot life's mass; and what only some properties say beside their value. */
export function ConditionFields(part: DraftPart) {
  const { draft, change, fields } = part
  const [open, setOpen] = useState(conditionNames.some((name) => draft.at[name].value !== '') || draft.next !== '')
  return (
    <>
      <BesideFields {...part} />
      <details open={open} onToggle={(event) => setOpen(event.currentTarget.open)}>
        <summary className="cursor-pointer font-semibold">Conditions it holds at</summary>
        <div className="mt-2 grid gap-4 sm:grid-cols-2">
          {conditionNames.map((name) => (
            <div key={name} className="flex items-start gap-1">
              <TextField
                label={labels[name]}
                name={`statement.at.${name}.value`}
                inputMode="decimal"
                autoComplete="off"
                value={draft.at[name].value}
                error={fields[`statement.at.${name}.value`]}
                className="flex-1"
                onChange={(event) => change({ at: { ...draft.at, [name]: { ...draft.at[name], value: event.target.value } } })}
              />
              <select
                aria-label={`Unit: ${labels[name]}`}
                className="mt-[26px] min-h-9 border border-pencil bg-card px-1"
                value={draft.at[name].unit}
                onChange={(event) => change({ at: { ...draft.at, [name]: { ...draft.at[name], unit: event.target.value } } })}
              >
                {unitsOf(conditionDimensions[name]).map((unit) => (
                  <option key={unit} value={unit}>
                    {unitText(unit)}
                  </option>
                ))}
              </select>
            </div>
          ))}
          <TextField
            label="Before which next coat"
            name="statement.at.next"
            value={draft.next}
            error={fields['statement.at.next']}
            help="Only where the sheet names one."
            autoComplete="off"
            onChange={(event) => change({ next: event.target.value })}
          />
        </div>
      </details>
    </>
  )
}

function BesideFields({ draft, change, fields }: DraftPart) {
  if (draft.property === 'filmThickness')
    return (
      <SelectField
        label="Measured"
        name="statement.film"
        value={draft.wetOrDry}
        error={fields['statement.film']}
        className="max-w-xs"
        onChange={(event) => change({ wetOrDry: event.target.value })}
      >
        <option value="">wet or dry not stated</option>
        <option value="wet">wet</option>
        <option value="dry">dry</option>
      </SelectField>
    )
  if (draft.property === 'applicationTemperature')
    return (
      <SelectField
        label="Asked of"
        name="statement.of"
        value={draft.of}
        error={fields['statement.of']}
        className="max-w-xs"
        onChange={(event) => change({ of: event.target.value })}
      >
        <option value="">air, slab and material alike</option>
        <option value="air">the air</option>
        <option value="slab">the slab</option>
        <option value="material">the material</option>
      </SelectField>
    )
  if (draft.property === 'voc')
    return (
      <SelectField
        label="State"
        name="statement.thinned"
        value={draft.thinned}
        error={fields['statement.thinned']}
        className="max-w-xs"
        onChange={(event) => change({ thinned: event.target.value })}
      >
        <option value="">as mixed</option>
        <option value="yes">with the thinner the sheet allows</option>
      </SelectField>
    )
  return null
}
