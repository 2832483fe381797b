import { keepPreviousData, queryOptions, useMutation, useQuery, useQueryClient } from '@tanstack/react-query'
import type * as z from 'zod'
import { type BuildUp, buildUpEndpoints as wire } from '../../../shared/api/build-ups.ts'
import type { EvaluationInput } from '../../../shared/domain/build-up.ts'
import { call } from '../../lib/api.ts'
import type { Work } from './work.ts'

const keys = {
  all: ['build-ups'],
  list: ['build-ups', 'list'],
  one: (id: string, version: number | undefined) => ['build-ups', 'one', id, version ?? 'newest'],
  facts: (ids: string) => ['build-ups', 'facts', ids],
} as const

export function useBuildUps(query: { q: string; sort: string; cursor: string | undefined; status: string }) {
  return useQuery({
    queryKey: [...keys.list, query],
    queryFn: ({ signal }) =>
      call(wire.listBuildUps, {
        query: { ...query, status: query.status || undefined } as z.input<typeof wire.listBuildUps.query>,
        signal,
      }),
    placeholderData: keepPreviousData,
  })
}

export function buildUpOptions(id: string, version: number | undefined) {
  return queryOptions({
    queryKey: keys.one(id, version),
    queryFn: ({ signal }) => call(wire.readBuildUp, { params: { buildUpId: id }, query: { version }, signal }),
  })
}

type Facts = Pick<EvaluationInput, 'mixes' | 'products'>

/** What the catalogue knows of mixes and aggregates that the draft was not loaded with. */
export function useMoreFacts(wanted: { mixes: string[]; products: string[] }) {
  const mixes = [...wanted.mixes].sort().join()
  const products = [...wanted.products].sort().join()
  return useQuery({
    queryKey: keys.facts(`${mixes};${products}`),
    queryFn: ({ signal }): Promise<Facts> => call(wire.readCourseFacts, { query: { mixes, products }, signal }),
    enabled: mixes !== '' || products !== '',
    placeholderData: keepPreviousData,
  })
}

/** Mixes and aggregates to choose from; what is typed is asked of the server too, for catalogues longer than one answer. */
export function useChoices(typed: string) {
  return useQuery({
    queryKey: [...keys.all, 'choices', typed],
    queryFn: ({ signal }) => call(wire.listChoices, { query: { q: typed }, signal }),
    placeholderData: keepPreviousData,
    staleTime: 60_000,
  })
}

export interface Place {
  buildUpId: string
  number: number
}

/** Everything that changes build-ups. What the server answers is what the pages show next. */
export function useBuildUpChanges() {
  const client = useQueryClient()
  const keep = (buildUp: BuildUp) => {
    client.removeQueries({ queryKey: keys.one(buildUp.id, undefined) })
    void client.invalidateQueries({ queryKey: keys.all, refetchType: 'none' })
    client.setQueryData(keys.one(buildUp.id, buildUp.opened.number), buildUp)
    return buildUp
  }
  const add = async (body: z.input<typeof wire.addBuildUp.body>) => keep(await call(wire.addBuildUp, { body }))
  const rename = async (buildUpId: string, body: z.input<typeof wire.renameBuildUp.body>) => {
    const head = await call(wire.renameBuildUp, { params: { buildUpId }, body })
    client.setQueriesData<BuildUp>({ queryKey: ['build-ups', 'one', buildUpId] }, (before) => before && { ...before, ...head })
    await client.invalidateQueries({ queryKey: keys.list })
    return head
  }
  const copy = async (buildUpId: string, body: z.input<typeof wire.copyBuildUp.body>) =>
    keep(await call(wire.copyBuildUp, { params: { buildUpId }, body }))
  const addDraft = useMutation({
    mutationFn: async ({ buildUpId, ...body }: { buildUpId: string } & z.input<typeof wire.addDraft.body>) =>
      keep(await call(wire.addDraft, { params: { buildUpId }, body })),
  })
  const release = async ({ buildUpId, number }: Place, body: z.input<typeof wire.releaseVersion.body>) =>
    keep(await call(wire.releaseVersion, { params: { buildUpId, number }, body }))
  const withdraw = useMutation({
    mutationFn: async ({ buildUpId, number, version }: Place & { version: number }) =>
      keep(await call(wire.withdrawVersion, { params: { buildUpId, number }, body: { version } })),
  })
  return { add, rename, copy, addDraft, release, withdraw }
}

/** Saves a draft and keeps the page's copy of it in step. */
export function useSaveDraft({ buildUpId, number }: Place) {
  const client = useQueryClient()
  return async (work: Work, version: number) => {
    const saved = await call(wire.saveDraft, { params: { buildUpId, number }, body: { ...work, version } })
    client.setQueriesData<BuildUp>({ queryKey: ['build-ups', 'one', buildUpId] }, (before) => {
      if (before?.opened.number !== number) return before
      const changed = { version: saved.version, updatedAt: saved.updatedAt, updatedByName: saved.updatedByName }
      return { ...before, opened: { ...before.opened, ...changed, input: { ...before.opened.input, ...work } } }
    })
    void client.invalidateQueries({ queryKey: keys.list, refetchType: 'none' })
    return saved
  }
}
