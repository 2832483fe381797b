import { useId } from 'react'
import type { Quantity, Unit } from '../../shared/domain/units.ts'
import { NumberField } from './number-field.tsx'

interface QuantityFieldProps<U extends Unit> {
  label: string
  /** Address of the value in the form; the unit is at the same address. */
  name: string
  value: Quantity<U> | null
  onChange: (value: Quantity<U> | null) => void
  units: readonly U[]
  help?: string
  error?: string | undefined
  className?: string
  disabled?: boolean
}

/** A number with the unit it is stated in beside it. Changing the unit does not convert: the number is what was read. */
export function QuantityField<U extends Unit>({ label, name, value, onChange, units, className = '', ...rest }: QuantityFieldProps<U>) {
  const id = useId()
  const unit = value?.unit ?? units[0]
  return (
    <div className={`flex items-start gap-1 ${className}`}>
      <NumberField
        {...rest}
        label={label}
        name={name}
        className="min-w-0 flex-1"
        value={value?.value ?? null}
        onChange={(number) => onChange(number === null || !unit ? null : { value: number, unit })}
      />
      {units.length > 1 ? (
        <select
          id={id}
          aria-label={`Unit of ${label}`}
          className="mt-7 min-h-9 border border-pencil bg-card px-1"
          value={unit}
          disabled={rest.disabled}
          onChange={(event) => value && onChange({ value: value.value, unit: event.target.value as U })}
        >
          {units.map((one) => (
            <option key={one}>{one}</option>
          ))}
        </select>
      ) : (
        <span className="mt-7 flex min-h-9 items-center px-1 text-pencil">{unit}</span>
      )}
    </div>
  )
}
