import { useQuery } from '@tanstack/react-query'
import { useParams, useSearchParams } from 'react-router'
import { sentenceOf } from '../../lib/api.ts'
import { useCan } from '../../lib/user.ts'
import { Asking } from '../../ui/asking.tsx'
import { DraftBuilder } from './draft-builder.tsx'
import { FixedBuilder } from './fixed-builder.tsx'
import { buildUpOptions } from './queries.ts'

/** A build-up opened at the version in the address, or at its newest. */
export function BuilderPage() {
  const { buildUpId = '' } = useParams()
  const [search] = useSearchParams()
  const asked = Number(search.get('version'))
  const query = useQuery({
    ...buildUpOptions(buildUpId, Number.isInteger(asked) && asked > 0 ? asked : undefined),
    refetchOnMount: 'always',
  })
  const mayDraft = useCan('build-up:draft')
  return (
    <Asking query={query} says={sentenceOf}>
      {(buildUp) =>
        buildUp.opened.status === 'draft' && mayDraft ? (
          <DraftBuilder key={buildUp.opened.id} buildUp={buildUp} />
        ) : (
          <FixedBuilder key={buildUp.opened.id} buildUp={buildUp} />
        )
      }
    </Asking>
  )
}
