import { useState } from 'react'
import { type BuildUp, buildUpEndpoints } from '../../../shared/api/build-ups.ts'
import type { Stage } from '../../../shared/domain/build-up.ts'
import { stageNames } from '../../../shared/domain/course.ts'
import { useSubmit } from '../../lib/form.ts'
import { Button } from '../../ui/button.tsx'
import { TextField } from '../../ui/field.tsx'
import { ProblemSummary } from '../../ui/problem-summary.tsx'
import { useBuildUpChanges } from './queries.ts'

/** Rows of stages that floors of the trade are made of, from the slab upward. They name no mix and no figure. */
const skeletons: { id: string; name: string; stages: Stage[] }[] = [
  { id: 'empty', name: 'Nothing yet', stages: [] },
  { id: 'film', name: 'Two coats', stages: ['prep', 'prime', 'top'] },
  { id: 'slurry', name: 'Slurry floor over spalls and joints', stages: ['prep', 'fill', 'slurry', 'grind', 'prime', 'top'] },
  { id: 'broadcast', name: 'Broadcast floor', stages: ['prep', 'prime', 'broadcast', 'broadcast', 'seal', 'top'] },
  { id: 'flow', name: 'Self-levelling floor', stages: ['prep', 'prime', 'body', 'top'] },
  { id: 'screed', name: 'Trowelled screed with cove', stages: ['prep', 'prime', 'body', 'seal', 'top', 'cove'] },
]

/** Begins a build-up: a name, and nothing or a row of stages to fill in. */
export function NewBuildUpForm({ onMade }: { onMade: (buildUp: BuildUp) => void }) {
  const { add } = useBuildUpChanges()
  const [name, setName] = useState('')
  const [chosen, setChosen] = useState('slurry')
  const { submit, problems, busy } = useSubmit(buildUpEndpoints.addBuildUp.body, add)
  const onSubmit = async (event: React.SubmitEvent) => {
    event.preventDefault()
    const made = await submit({ name, stages: skeletons.find(({ id }) => id === chosen)?.stages ?? [] })
    if (made) onMade(made)
  }
  return (
    <form onSubmit={(event) => void onSubmit(event)} noValidate>
      <ProblemSummary problems={problems} />
      <TextField
        label="Name"
        name="name"
        value={name}
        error={problems.fields['name']}
        help="What people will look for: the use, the kind, the thickness."
        onChange={(event) => setName(event.target.value)}
        className="mb-4"
      />
      <fieldset className="mb-4">
        <legend className="mb-1 font-semibold">Begin with</legend>
        {skeletons.map(({ id, name: words, stages }) => (
          <label key={id} className="flex min-h-9 items-baseline gap-2 py-1">
            <input
              type="radio"
              name="skeleton"
              value={id}
              checked={chosen === id}
              onChange={() => setChosen(id)}
              className="accent-resin"
            />
            <span>
              {words}{' '}
              <span className="text-small text-pencil">{stages.map((stage) => stageNames[stage].name.toLowerCase()).join(', ')}</span>
            </span>
          </label>
        ))}
      </fieldset>
      <Button type="submit" look="primary" busy={busy}>
        Begin
      </Button>
    </form>
  )
}
