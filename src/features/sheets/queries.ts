import { keepPreviousData, queryOptions, useMutation, useQuery, useQueryClient } from '@tanstack/react-query'
import type * as z from 'zod'
import { type Sheet, sheetEndpoints as wire } from '../../../shared/api/sheets.ts'
import { addressOf, call } from '../../lib/api.ts'

const keys = {
  all: ['sheets'],
  list: ['sheets', 'list'],
  one: (id: string) => ['sheets', 'one', id],
  revision: (id: string) => ['sheets', 'revision', id],
  page: (id: string, page: number) => ['sheets', 'page', id, page],
  hits: (id: string, q: string) => ['sheets', 'hits', id, q],
  subjects: (q: string) => ['sheets', 'subjects', q],
} as const

export type SheetsWanted = z.input<typeof wire.listSheets.query>

export function useSheets(query: SheetsWanted) {
  return useQuery({
    queryKey: [...keys.list, query],
    queryFn: ({ signal }) => call(wire.listSheets, { query, signal }),
    placeholderData: keepPreviousData,
  })
}

export function useSheet(sheetId: string) {
  return useQuery({ queryKey: keys.one(sheetId), queryFn: ({ signal }) => call(wire.readSheet, { params: { sheetId }, signal }) })
}

export function useRevision(revisionId: string) {
  return useQuery({
    queryKey: keys.revision(revisionId),
    queryFn: ({ signal }) => call(wire.readRevision, { params: { revisionId }, signal }),
  })
}

/** Words of a page never change, so they are asked for once. */
export function pageWordsOptions(revisionId: string, page: number) {
  return queryOptions({
    queryKey: keys.page(revisionId, page),
    queryFn: ({ signal }) => call(wire.readPage, { params: { revisionId, page }, signal }),
    staleTime: Infinity,
  })
}

export function useHits(revisionId: string, q: string) {
  return useQuery({
    queryKey: keys.hits(revisionId, q),
    queryFn: ({ signal }) => call(wire.searchRevision, { params: { revisionId }, query: { q }, signal }),
    enabled: q !== '',
    staleTime: Infinity,
    placeholderData: (before, query) => (query?.queryKey[2] === revisionId ? before : undefined),
  })
}

export function useSubjectChoices(q: string, enabled: boolean) {
  return useQuery({
    queryKey: keys.subjects(q),
    queryFn: ({ signal }) => call(wire.listSubjects, { query: { q }, signal }),
    enabled,
    placeholderData: keepPreviousData,
  })
}

/** Where the PDF of a revision is fetched from. */
export function fileAddress(revisionId: string): string {
  return addressOf(wire.downloadRevision, { params: { revisionId } })
}

/** Changes to sheets. What the server answers is what the pages show next. */
export function useSheetChanges() {
  const client = useQueryClient()
  const keep = async (sheet: Sheet) => {
    client.setQueryData(keys.one(sheet.id), sheet)
    // Records of products and mixes name their sheets, too; words and hits of a page never change.
    await client.invalidateQueries({
      predicate: ({ queryKey: [feature, what] }) => feature !== 'sheets' || what === 'list' || what === 'revision',
    })
    return sheet
  }
  const change = async ({ sheetId, ...body }: { sheetId: string } & z.input<typeof wire.changeSheet.body>) =>
    keep(await call(wire.changeSheet, { params: { sheetId }, body }))
  const move = async ({ revisionId, sheetId }: { revisionId: string; sheetId: string }) =>
    keep(await call(wire.moveRevision, { params: { revisionId }, body: { sheetId } }))
  const confirmDate = useMutation({ mutationFn: change })
  return { change, move, confirmDate }
}

/** Lists of sheets are out of date: something was uploaded. */
export function useForgetLists() {
  const client = useQueryClient()
  return () => client.invalidateQueries({ queryKey: keys.all })
}
