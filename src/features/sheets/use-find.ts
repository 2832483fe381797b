import { useCallback } from 'react'
import { useSearchParams } from 'react-router'
import type { Box } from '../../../shared/domain/fact.ts'
import { useHits } from './queries.ts'

export interface Finding {
  q: string
  setQ: (q: string) => void
  hits: { page: number; boxes: Box[]; excerpt: string }[]
  more: boolean
  /** Index of the hit gone to. */
  current: number
  goTo: (index: number) => void
  step: (by: 1 | -1) => void
  pending: boolean
  error: unknown
}

/** The phrase looked for and the hit gone to; both in the address. */
export function useFind(revisionId: string): Finding {
  const [search, setSearch] = useSearchParams()
  const q = search.get('q') ?? ''
  const query = useHits(revisionId, q)
  const hits = q === '' ? [] : (query.data?.hits ?? [])
  const current = Math.min(Math.max(0, Number(search.get('hit') ?? 1) - 1 || 0), Math.max(0, hits.length - 1))
  const setQ = useCallback(
    (next: string) =>
      setSearch(
        (before) => {
          const after = new URLSearchParams(before)
          if (next) after.set('q', next)
          else after.delete('q')
          after.delete('hit')
          return after
        },
        { replace: true, preventScrollReset: true },
      ),
    [setSearch],
  )
  const goTo = (index: number) => {
    const hit = hits[index]
    if (!hit) return
    setSearch(
      (before) => {
        const after = new URLSearchParams(before)
        after.set('hit', String(index + 1))
        after.set('page', String(hit.page))
        after.delete('box')
        return after
      },
      { replace: true, preventScrollReset: true },
    )
  }
  return {
    q,
    setQ,
    hits,
    more: query.data?.more ?? false,
    current,
    goTo,
    pending: query.isFetching,
    error: query.error,
    // The first step after a search goes to the first hit, wherever the page stands.
    step: (by) => goTo(search.has('hit') ? (current + by + hits.length) % hits.length : by === 1 ? 0 : hits.length - 1),
  }
}
