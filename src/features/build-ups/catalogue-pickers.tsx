import { useState } from 'react'
import { type Choice, Picker } from './picker.tsx'
import { useChoices } from './queries.ts'

type Chosen = { id: string; name: string } | null

/** Finds a mix of the catalogue. */
export function MixPicker({ chosen, onChoose }: { chosen: Chosen; onChoose: (mixId: string | null) => void }) {
  const [typed, setTyped] = useState('')
  const all = useChoices('').data?.mixes ?? []
  const near = useChoices(typed).data?.mixes ?? []
  const choices = joined(all, near).map(({ id, name, maker, chemistry, color }) => ({ id, name, detail: `${maker}, ${chemistry}`, color }))
  return (
    <Picker
      label="Mix"
      none="type part of its name"
      choices={choices}
      chosen={chosen}
      onType={setTyped}
      onChoose={(choice) => onChoose(choice?.id ?? null)}
    />
  )
}

/** Finds a sand of the catalogue. */
export function AggregatePicker({ label, chosen, onChoose }: { label: string; chosen: Chosen; onChoose: (choice: Choice | null) => void }) {
  const [typed, setTyped] = useState('')
  const all = useChoices('').data?.aggregates ?? []
  const near = useChoices(typed).data?.aggregates ?? []
  const choices = joined(all, near).map(({ id, name, maker }) => ({ id, name, detail: maker }))
  return <Picker label={label} choices={choices} chosen={chosen} onType={setTyped} onChoose={onChoose} />
}

/** What was loaded at first and what the server found for the words typed, each once. */
function joined<T extends { id: string }>(all: readonly T[], near: readonly T[]): T[] {
  const seen = new Set(all.map(({ id }) => id))
  return [...all, ...near.filter(({ id }) => !seen.has(id))]
}
