import { useState } from 'react'
import type * as z from 'zod'
import { useSubmit } from '../../lib/form.ts'
import { Button } from '../../ui/button.tsx'
import { AreaField, TextField } from '../../ui/field.tsx'
import { ProblemSummary } from '../../ui/problem-summary.tsx'

interface NameFormProps<S extends z.ZodType> {
  schema: S
  /** What is sent besides the name. */
  rest: Record<string, unknown>
  name: string
  /** Given: the note may be changed too. */
  note?: string
  send: (body: z.output<S>) => Promise<unknown>
  verb: string
  onDone: () => void
}

/** A name for a build-up: renaming it, or naming its copy. */
export function NameForm<S extends z.ZodType>({ schema, rest, name, note, send, verb, onDone }: NameFormProps<S>) {
  const [values, setValues] = useState({ name, note: note ?? '' })
  const { submit, problems, busy } = useSubmit(schema, async (body) => {
    await send(body)
    return true
  })
  const onSubmit = async (event: React.SubmitEvent) => {
    event.preventDefault()
    if (await submit({ ...rest, name: values.name, ...(note === undefined ? {} : { note: values.note }) })) onDone()
  }
  return (
    <form onSubmit={(event) => void onSubmit(event)} noValidate>
      <ProblemSummary problems={problems} />
      <TextField
        label="Name"
        name="name"
        value={values.name}
        error={problems.fields['name']}
        onChange={(event) => setValues({ ...values, name: event.target.value })}
        className="mb-3"
      />
      {note !== undefined && (
        <AreaField
          label="Note"
          name="note"
          value={values.note}
          error={problems.fields['note']}
          onChange={(event) => setValues({ ...values, note: event.target.value })}
          className="mb-3"
        />
      )}
      <Button type="submit" look="primary" busy={busy}>
        {verb}
      </Button>
    </form>
  )
}
