import { useState } from 'react'
import type { Conditions } from '../../../shared/domain/build-up.ts'
import { vocPlaces } from '../../../shared/reference/voc-limits.ts'
import { NumberField } from '../../ui/number-field.tsx'
import { QuantityField } from '../../ui/quantity-field.tsx'
import { SelectField } from '../../ui/field.tsx'

interface ConditionsBarProps {
  conditions: Conditions
  onChange: (change: Partial<Conditions>) => void
}

const temperatures = ['°F', '°C'] as const
const emissions = ['lb/1000 ft²·24 h', 'g/m²·24 h'] as const

/** What the floor is laid under. Everything on the page is reckoned at these. */
export function ConditionsBar({ conditions, onChange }: ConditionsBarProps) {
  return (
    <fieldset className="grid grid-cols-2 gap-x-4 gap-y-3 border border-rule bg-card px-4 py-3 md:grid-cols-4 xl:grid-cols-[repeat(4,minmax(0,1fr))_minmax(0,1.5fr)_minmax(0,1.4fr)]">
      <legend className="sr-only">Conditions</legend>
      <QuantityField
        label="Slab"
        name="slabTemperature"
        units={temperatures}
        value={conditions.slabTemperature as { value: number; unit: '°F' }}
        onChange={(value) => value && onChange({ slabTemperature: value })}
      />
      <QuantityField
        label="Air"
        name="airTemperature"
        units={temperatures}
        value={conditions.airTemperature as { value: number; unit: '°F' }}
        onChange={(value) => value && onChange({ airTemperature: value })}
      />
      <PercentField
        label="Humidity of the air"
        name="relativeHumidity"
        value={conditions.relativeHumidity}
        onChange={(value) => value !== null && onChange({ relativeHumidity: value })}
      />
      <PercentField
        label="Humidity in the slab"
        name="substrateRelativeHumidity"
        value={conditions.substrateRelativeHumidity}
        mayBeEmpty
        onChange={(value) => onChange({ substrateRelativeHumidity: value })}
      />
      <QuantityField
        label="Moisture emission"
        name="moistureEmission"
        className="col-span-2 xl:col-span-1"
        units={emissions}
        value={conditions.moistureEmission as { value: number; unit: (typeof emissions)[number] } | null}
        onChange={(value) => onChange({ moistureEmission: value })}
      />
      <SelectField
        label="VOC rules of"
        name="vocPlace"
        className="col-span-2 xl:col-span-1"
        value={conditions.vocPlace ?? ''}
        onChange={(event) => onChange({ vocPlace: event.target.value || null })}
      >
        <option value="">none chosen</option>
        {vocPlaces.map((place) => (
          <option key={place.id} value={place.id}>
            {place.name}
          </option>
        ))}
      </SelectField>
    </fieldset>
  )
}

interface PercentFieldProps {
  label: string
  name: string
  value: number | null
  mayBeEmpty?: boolean
  onChange: (value: number | null) => void
}

/** A relative humidity; what lies outside 1 to 100 is said at the field and not taken. */
function PercentField({ mayBeEmpty = false, onChange, ...rest }: PercentFieldProps) {
  const [error, setError] = useState<string>()
  const take = (value: number | null) => {
    const problem =
      value === null ? (mayBeEmpty ? undefined : 'This is needed.') : value >= 1 && value <= 100 ? undefined : 'Between 1 and 100.'
    setError(problem)
    if (!problem) onChange(value)
  }
  return <NumberField {...rest} unit="% RH" error={error} onChange={take} />
}
