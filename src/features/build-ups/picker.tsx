import Fuse from 'fuse.js'
import { useId, useMemo, useState } from 'react'

export interface Choice {
  id: string
  name: string
  /** Maker, chemistry. */
  detail: string
  /** `#rrggbb` of a mix. */
  color?: string
}

interface PickerProps {
  label: string
  choices: readonly Choice[]
  /** What is chosen now, by name; null: nothing. */
  chosen: { id: string; name: string } | null
  onChoose: (choice: Choice | null) => void
  /** Told what is typed, so that more can be asked of the server. */
  onType?: (text: string) => void
  help?: string
  none?: string
}

const shownAtMost = 40

/** A field that finds by parts of a name, typing errors and all: type, arrows, Enter; Escape leaves it as it was. */
export function Picker({ label, choices, chosen, onChoose, onType, help, none = 'none' }: PickerProps) {
  const id = useId()
  const [text, setText] = useState<string | null>(null)
  const [place, setPlace] = useState(0)
  const fuse = useMemo(() => new Fuse(choices, { keys: ['name', 'detail'], threshold: 0.3, ignoreLocation: true }), [choices])
  const found = useMemo(
    () => (text?.trim() ? fuse.search(text, { limit: shownAtMost }).map(({ item }) => item) : choices.slice(0, shownAtMost)),
    [fuse, choices, text],
  )
  const open = text !== null
  const close = () => {
    setText(null)
    setPlace(0)
  }
  const choose = (choice: Choice | null) => {
    onChoose(choice)
    close()
  }
  const onKeyDown = (event: React.KeyboardEvent) => {
    if (event.key === 'ArrowDown' || event.key === 'ArrowUp') {
      event.preventDefault()
      if (!open) setText('')
      else setPlace((now) => Math.min(Math.max(now + (event.key === 'ArrowDown' ? 1 : -1), 0), Math.max(0, found.length - 1)))
    } else if (event.key === 'Enter' && open) {
      event.preventDefault()
      const choice = found[place]
      if (choice) choose(choice)
    } else if (event.key === 'Escape' && open) {
      event.stopPropagation()
      close()
    }
  }
  return (
    <div className="relative">
      <label htmlFor={id} className="mb-1 block font-semibold">
        {label}
      </label>
      <div className="flex gap-1">
        <input
          id={id}
          role="combobox"
          aria-expanded={open}
          aria-controls={`${id}-list`}
          aria-autocomplete="list"
          autoComplete="off"
          aria-activedescendant={open && found[place] ? `${id}-${place}` : undefined}
          aria-describedby={help ? `${id}-help` : undefined}
          className="min-h-9 w-full border border-pencil bg-card px-2 py-1"
          placeholder={none}
          value={text ?? chosen?.name ?? ''}
          onFocus={(event) => event.target.select()}
          onClick={() => setText((now) => now ?? '')}
          onBlur={close}
          onKeyDown={onKeyDown}
          onChange={(event) => {
            setText(event.target.value)
            setPlace(0)
            onType?.(event.target.value)
          }}
        />
        {chosen && (
          <button
            type="button"
            className="min-h-9 min-w-9 border border-rule text-pencil hover:text-ink"
            aria-label={`Choose no ${label.toLowerCase()}`}
            onClick={() => choose(null)}
          >
            ✕
          </button>
        )}
      </div>
      {help && (
        <p id={`${id}-help`} className="mt-1 text-small text-pencil">
          {help}
        </p>
      )}
      <ul
        id={`${id}-list`}
        role="listbox"
        aria-label={label}
        hidden={!open}
        className="absolute z-20 mt-1 max-h-72 w-full min-w-64 overflow-y-auto border border-ink bg-card"
      >
        {found.map((choice, index) => (
          // eslint-disable-next-line jsx-a11y/click-events-have-key-events -- the field above holds the focus and takes the keys
          <li
            key={choice.id}
            id={`${id}-${index}`}
            role="option"
            aria-selected={index === place}
            className={`flex cursor-pointer items-center gap-2 px-2 py-1.5 ${index === place ? 'bg-resin-wash' : ''}`}
            onPointerDown={(event) => event.preventDefault()}
            onPointerEnter={() => setPlace(index)}
            onClick={() => choose(choice)}
          >
            {choice.color && <Swatch color={choice.color} />}
            <span>
              {choice.name} <span className="text-pencil">{choice.detail}</span>
            </span>
          </li>
        ))}
        {found.length === 0 && <li className="px-2 py-1.5 text-pencil">Nothing found. Add it in the catalogue first.</li>}
      </ul>
    </div>
  )
}

/** The colour something cures to. */
function Swatch({ color }: { color: string }) {
  return (
    <svg width="14" height="14" aria-hidden="true" className="shrink-0">
      <rect width="14" height="14" fill={color} stroke="#5c676a" />
    </svg>
  )
}
