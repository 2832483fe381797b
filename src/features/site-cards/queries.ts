import { keepPreviousData, useQuery } from '@tanstack/react-query'
import { siteCardEndpoints as wire } from '../../../shared/api/site-cards.ts'
import { call } from '../../lib/api.ts'

export function useSiteCards(q: string) {
  return useQuery({
    queryKey: ['site-cards', 'list', q],
    queryFn: ({ signal }) => call(wire.listSiteCards, { query: { q, sort: 'name', limit: 200 }, signal }),
    placeholderData: keepPreviousData,
  })
}

export function useSiteCard(jobId: string) {
  return useQuery({ queryKey: ['site-cards', jobId], queryFn: ({ signal }) => call(wire.readSiteCard, { params: { jobId }, signal }) })
}
