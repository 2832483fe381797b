import { useQuery, useQueryClient } from '@tanstack/react-query'
import { type SpecSummary, type Specification, specificationEndpoints as wire } from '../../../shared/api/specifications.ts'
import { call } from '../../lib/api.ts'

const keys = {
  ofJob: (jobId: string) => ['specifications', 'job', jobId],
  one: (id: string) => ['specifications', id],
  issue: (id: string, number: number) => ['specifications', id, 'issues', number],
} as const

export function useSpecificationsOf(jobId: string) {
  return useQuery({ queryKey: keys.ofJob(jobId), queryFn: ({ signal }) => call(wire.listSpecifications, { params: { jobId }, signal }) })
}

export function useSpecification(specificationId: string) {
  return useQuery({
    queryKey: keys.one(specificationId),
    queryFn: ({ signal }) => call(wire.readSpecification, { params: { specificationId }, signal }),
  })
}

/** An issue never changes: what was read once is kept. */
export function useIssue(specificationId: string, number: number) {
  return useQuery({
    queryKey: keys.issue(specificationId, number),
    queryFn: ({ signal }) => call(wire.readIssue, { params: { specificationId, number }, signal }),
  })
}

/** Begins, renames and issues; every list that shows a specification asks again. */
export function useSpecificationWork() {
  const client = useQueryClient()
  const changed = async () => client.invalidateQueries({ queryKey: ['specifications'] })
  return {
    add: async (jobId: string) => {
      const made = await call(wire.addSpecification, { params: { jobId }, body: {} })
      await changed()
      return made
    },
    change: async (
      { id, version }: Pick<SpecSummary, 'id' | 'version'>,
      body: { title: string; sectionNumber: string },
    ): Promise<Specification> => {
      const kept = await call(wire.changeSpecification, { params: { specificationId: id }, body: { ...body, version } })
      client.setQueryData(keys.one(id), kept)
      await changed()
      return kept
    },
    issue: async ({ id, version }: Pick<SpecSummary, 'id' | 'version'>) => {
      const made = await call(wire.issueSpecification, { params: { specificationId: id }, body: { version } })
      await changed()
      return made
    },
  }
}

/** Addresses of the files, for links that save them. */
export const files = {
  draft: (id: string, kind: 'docx' | 'pdf') => `/api/specifications/${id}/draft.${kind}`,
  issue: (id: string, number: number, kind: 'docx' | 'pdf') => `/api/specifications/${id}/issues/${number}/files/${kind}`,
}
