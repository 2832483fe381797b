import { keepPreviousData, useQuery, useQueryClient } from '@tanstack/react-query'
import { buildUpEndpoints } from '../../../shared/api/build-ups.ts'
import { type Job, type JobBody, jobEndpoints as wire } from '../../../shared/api/jobs.ts'
import { call } from '../../lib/api.ts'

const keys = { all: ['jobs'], list: ['jobs', 'list'], one: (id: string) => ['jobs', id] } as const

export function useJobs(query: Record<string, string | undefined>) {
  return useQuery({
    queryKey: [...keys.list, query],
    queryFn: ({ signal }) => call(wire.listJobs, { query: query, signal }),
    placeholderData: keepPreviousData,
  })
}

export function useJob(jobId: string) {
  return useQuery({ queryKey: keys.one(jobId), queryFn: ({ signal }) => call(wire.readJob, { params: { jobId }, signal }) })
}

/** Opens a job or saves one; the job as the server has it then is what every page shows. */
export function useSaveJob() {
  const client = useQueryClient()
  const keep = (job: Job) => {
    client.setQueryData(keys.one(job.id), job)
    void client.invalidateQueries({ queryKey: keys.list })
    return job
  }
  return {
    add: async (body: JobBody) => keep(await call(wire.addJob, { body })),
    change: async ({ id, version }: Pick<Job, 'id' | 'version'>, body: JobBody) =>
      keep(await call(wire.changeJob, { params: { jobId: id }, body: { ...body, version } })),
    reload: (jobId: string) => client.invalidateQueries({ queryKey: keys.one(jobId) }),
  }
}

/** Build-ups that have a released version, to choose from. */
export function useReleasedBuildUps() {
  return useQuery({
    queryKey: ['build-ups', 'released'],
    queryFn: async ({ signal }) => {
      const { items } = await call(buildUpEndpoints.listBuildUps, { query: { sort: 'name', limit: 200 }, signal })
      return items.flatMap(({ id, number, name, released }) =>
        released ? [{ id, number, name, versionId: released.versionId, version: released.number }] : [],
      )
    },
  })
}
