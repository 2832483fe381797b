import { useState } from 'react'
import { type Specification, specificationEndpoints as wire } from '../../../shared/api/specifications.ts'
import { useSubmit } from '../../lib/form.ts'
import { Button } from '../../ui/button.tsx'
import { TextField } from '../../ui/field.tsx'
import { ProblemSummary } from '../../ui/problem-summary.tsx'
import { useSpecificationWork } from './queries.ts'

/** Title and section number. */
export function SectionForm({ specification, onDone }: { specification: Specification; onDone: () => void }) {
  const [values, setValues] = useState({ title: specification.title, sectionNumber: specification.sectionNumber })
  const work = useSpecificationWork()
  const { submit, problems, busy } = useSubmit(wire.changeSpecification.body.omit({ version: true }), (body) =>
    work.change(specification, body),
  )
  const onSubmit = async (event: React.SubmitEvent) => {
    event.preventDefault()
    if (await submit(values)) onDone()
  }
  return (
    <form onSubmit={(event) => void onSubmit(event)} noValidate className="grid gap-3">
      <ProblemSummary problems={problems} />
      <TextField
        label="Section number"
        name="sectionNumber"
        value={values.sectionNumber}
        error={problems.fields['sectionNumber']}
        help="Like 09 67 23."
        onChange={(event) => setValues({ ...values, sectionNumber: event.target.value })}
      />
      <TextField
        label="Title"
        name="title"
        value={values.title}
        error={problems.fields['title']}
        onChange={(event) => setValues({ ...values, title: event.target.value })}
      />
      <span>
        <Button type="submit" look="primary" busy={busy}>
          Save
        </Button>
      </span>
    </form>
  )
}
