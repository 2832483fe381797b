import { type InputHTMLAttributes, type ReactNode, type SelectHTMLAttributes, type TextareaHTMLAttributes, useId } from 'react'

interface Framed {
  label: string
  help?: ReactNode
  error?: string | undefined
  /** Shown inside the right edge: the unit. */
  unit?: string
  className?: string
}

const control = 'w-full min-h-9 border bg-card px-2 py-1 text-ink placeholder:text-pencil'
const edge = (error: string | undefined) => (error ? 'border-stop border-2' : 'border-pencil')

function Frame({ label, help, error, className = '', id, children }: Framed & { id: string; children: ReactNode }) {
  return (
    <div className={className}>
      <label htmlFor={id} className="mb-1 block font-semibold">
        {label}
      </label>
      {children}
      {help && (
        <p id={`${id}-help`} className="mt-1 text-small text-pencil">
          {help}
        </p>
      )}
      {error && (
        <p id={`${id}-error`} className="mt-1 font-semibold text-stop">
          {error}
        </p>
      )}
    </div>
  )
}

const describedBy = (id: string, { help, error }: Framed) =>
  [error && `${id}-error`, help && `${id}-help`].filter(Boolean).join(' ') || undefined

/** A labelled input: label above, help under it, error at the field. */
export function TextField({ label, help, error, unit, className, ...input }: Framed & InputHTMLAttributes<HTMLInputElement>) {
  const made = useId()
  const id = input.id ?? made
  const framed = { label, help, error, className } as Framed
  return (
    <Frame {...framed} id={id}>
      <div className="relative">
        <input
          {...input}
          id={id}
          aria-invalid={error ? true : undefined}
          aria-describedby={describedBy(id, framed)}
          className={`${control} ${edge(error)} ${unit ? 'pr-14 text-right' : ''}`}
        />
        {unit && <span className="pointer-events-none absolute inset-y-0 right-2 flex items-center text-pencil">{unit}</span>}
      </div>
    </Frame>
  )
}

export function SelectField({ label, help, error, className, children, ...select }: Framed & SelectHTMLAttributes<HTMLSelectElement>) {
  const made = useId()
  const id = select.id ?? made
  const framed = { label, help, error, className } as Framed
  return (
    <Frame {...framed} id={id}>
      <select
        {...select}
        id={id}
        aria-invalid={error ? true : undefined}
        aria-describedby={describedBy(id, framed)}
        className={`${control} ${edge(error)}`}
      >
        {children}
      </select>
    </Frame>
  )
}

export function AreaField({ label, help, error, className, ...area }: Framed & TextareaHTMLAttributes<HTMLTextAreaElement>) {
  const made = useId()
  const id = area.id ?? made
  const framed = { label, help, error, className } as Framed
  return (
    <Frame {...framed} id={id}>
      <textarea
        rows={3}
        {...area}
        id={id}
        aria-invalid={error ? true : undefined}
        aria-describedby={describedBy(id, framed)}
        className={`${control} ${edge(error)}`}
      />
    </Frame>
  )
}
