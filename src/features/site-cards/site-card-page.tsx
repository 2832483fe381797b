import { useParams } from 'react-router'
import { sentenceOf } from '../../lib/api.ts'
import { Asking } from '../../ui/asking.tsx'
import { CardScreen } from './card-screen.tsx'
import { useSiteCard } from './queries.ts'

/** What a crew sees of one job. */
export function SiteCardPage() {
  const { jobId = '' } = useParams()
  const card = useSiteCard(jobId)
  return (
    <Asking query={card} says={sentenceOf}>
      {(data) => <CardScreen key={data.jobId} card={data} />}
    </Asking>
  )
}
