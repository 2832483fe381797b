import { useState } from 'react'
import { TextField } from './field.tsx'

interface NumberFieldProps {
  label: string
  name: string
  /** Null when empty. */
  value: number | null
  onChange: (value: number | null) => void
  unit?: string
  help?: string
  error?: string | undefined
  className?: string
  disabled?: boolean
}

/** The number a person typed, with a decimal comma or point and thousands marks; undefined when it is none. */
export function numberOf(text: string): number | null | undefined {
  const plain = text.trim().replace(/\s/g, '')
  if (plain === '') return null
  const american = /^[+-]?\d{1,3}(,\d{3})+(\.\d+)?$/.test(plain) ? plain.replaceAll(',', '') : plain.replace(',', '.')
  return /^[+-]?(\d+\.?\d*|\.\d+)$/.test(american) ? Number(american) : undefined
}

/** An input for a number: what was typed stays as typed; what is no number is said at once on leaving the field. */
export function NumberField({ value, onChange, error, ...rest }: NumberFieldProps) {
  const [text, setText] = useState(value === null ? '' : String(value))
  const [seen, setSeen] = useState(value)
  const [left, setLeft] = useState(false)
  if (value !== seen) {
    setSeen(value)
    if (numberOf(text) !== value) setText(value === null ? '' : String(value))
  }
  const wrong = left && numberOf(text) === undefined ? 'This is not a number.' : undefined
  const onText = (next: string) => {
    setText(next)
    const number = numberOf(next)
    if (number !== undefined) {
      setSeen(number)
      onChange(number)
    }
  }
  return (
    <TextField
      {...rest}
      inputMode="decimal"
      autoComplete="off"
      value={text}
      error={error ?? wrong}
      onBlur={() => setLeft(true)}
      onChange={(event) => onText(event.target.value)}
    />
  )
}
