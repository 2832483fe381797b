import { useParams } from 'react-router'
import { sentenceOf } from '../../lib/api.ts'
import { Asking } from '../../ui/asking.tsx'
import { JobEditor } from './job-editor.tsx'
import { useJob } from './queries.ts'

/** One job: its bays and conditions, what the floor takes, and what goes out of the house. */
export function JobPage() {
  const { jobId = '' } = useParams()
  const job = useJob(jobId)
  return (
    <Asking query={job} says={sentenceOf}>
      {(data) => <JobEditor key={data.id} job={data} />}
    </Asking>
  )
}

/** A job that is about to be opened. */
export function NewJobPage() {
  return <JobEditor job={undefined} />
}
