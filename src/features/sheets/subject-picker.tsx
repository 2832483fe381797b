import { useDeferredValue, useId, useState } from 'react'
import type { Subject, SubjectRef } from '../../../shared/api/sheets.ts'
import { useSubjectChoices } from './queries.ts'

interface SubjectPickerProps {
  value: Subject[]
  onChange: (value: Subject[]) => void
  error?: string | undefined
}

export function refOf({ kind, id }: Subject): SubjectRef {
  return kind === 'product' ? { productId: id } : { mixId: id }
}

/** Products and mixes that a sheet speaks of: those chosen, and a search for more. */
export function SubjectPicker({ value, onChange, error }: SubjectPickerProps) {
  const id = useId()
  const [q, setQ] = useState('')
  const [open, setOpen] = useState(false)
  const [active, setActive] = useState(0)
  const choices = useSubjectChoices(useDeferredValue(q.trim()), open)
  const offered = (choices.data?.items ?? []).filter((choice) => !value.some((chosen) => chosen.id === choice.id))
  const current = offered[Math.min(active, offered.length - 1)]
  const choose = (choice: Subject) => {
    onChange([...value, choice])
    setQ('')
    setActive(0)
    setOpen(false)
  }
  const onKey = (event: React.KeyboardEvent) => {
    if (event.key === 'ArrowDown' || event.key === 'ArrowUp') {
      event.preventDefault()
      setOpen(true)
      setActive((now) => Math.max(0, Math.min(offered.length - 1, now + (event.key === 'ArrowDown' ? 1 : -1))))
    } else if (event.key === 'Enter' && open && current) {
      event.preventDefault()
      choose(current)
    } else if (event.key === 'Escape' && open) {
      event.stopPropagation()
      setOpen(false)
    }
  }
  return (
    <div>
      <label htmlFor={id} className="mb-1 block font-semibold">
        Products and mixes it speaks of
      </label>
      {value.length > 0 && (
        <ul className="mb-1 flex flex-wrap gap-1">
          {value.map((subject) => (
            <li key={subject.id} className="flex items-center gap-1 border border-rule bg-paper pl-2">
              {subject.name} <span className="text-pencil">{subject.kind}</span>
              <button
                type="button"
                className="min-h-8 min-w-8 text-pencil hover:text-stop"
                aria-label={`Take ${subject.name} off`}
                onClick={() => onChange(value.filter((one) => one.id !== subject.id))}
              >
                ✕
              </button>
            </li>
          ))}
        </ul>
      )}
      <div className="relative">
        <input
          id={id}
          name="subjects"
          role="combobox"
          aria-expanded={open}
          aria-controls={`${id}-list`}
          aria-autocomplete="list"
          autoComplete="off"
          aria-activedescendant={open && current ? `${id}-${current.id}` : undefined}
          aria-describedby={error ? `${id}-error` : undefined}
          placeholder="Search by name or maker"
          value={q}
          className={`min-h-9 w-full border bg-card px-2 py-1 placeholder:text-pencil ${error ? 'border-2 border-stop' : 'border-pencil'}`}
          onChange={(event) => {
            setQ(event.target.value)
            setActive(0)
            setOpen(true)
          }}
          onFocus={() => setOpen(true)}
          onClick={() => setOpen(true)}
          onBlur={() => setOpen(false)}
          onKeyDown={onKey}
        />
        {open && (
          <ul
            id={`${id}-list`}
            role="listbox"
            aria-label="Products and mixes"
            className="absolute z-20 max-h-64 w-full overflow-y-auto border border-ink bg-card"
          >
            {offered.map((choice) => (
              <li
                key={choice.id}
                id={`${id}-${choice.id}`}
                role="option"
                aria-selected={choice === current}
                className={`flex min-h-9 cursor-pointer items-center justify-between gap-3 px-2 py-1 ${choice === current ? 'bg-resin-wash' : ''}`}
                onPointerDown={(event) => {
                  event.preventDefault()
                  choose(choice)
                }}
              >
                <span>
                  {choice.name} <span className="text-pencil">{choice.maker}</span>
                </span>
                <span className="text-pencil">{choice.kind}</span>
              </li>
            ))}
            {offered.length === 0 && (
              <li className="px-2 py-2 text-pencil">
                {choices.isPending ? 'Searching …' : 'No product or mix of this name. It can be attached later.'}
              </li>
            )}
          </ul>
        )}
      </div>
      {error && (
        <p id={`${id}-error`} className="mt-1 font-semibold text-stop">
          {error}
        </p>
      )}
    </div>
  )
}
