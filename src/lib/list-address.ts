import { useCallback } from 'react'
import { useSearchParams } from 'react-router'

/** State of a list in the address: search, order, place and filters, so that a list can be linked, reloaded and gone back to. */
export interface ListAddress {
  q: string
  sort: string
  cursor: string | undefined
  filter: (name: string) => string
  /** Changes any of it; anything but a step to another page goes back to the first. */
  set: (changes: Record<string, string | undefined>) => void
}

export function useListAddress(defaultSort: string): ListAddress {
  const [search, setSearch] = useSearchParams()
  const set = useCallback(
    (changes: Record<string, string | undefined>) => {
      setSearch(
        (before) => {
          const after = new URLSearchParams(before)
          if (!('cursor' in changes)) after.delete('cursor')
          for (const [name, value] of Object.entries(changes)) {
            if (value) after.set(name, value)
            else after.delete(name)
          }
          return after
        },
        { replace: !('cursor' in changes) },
      )
    },
    [setSearch],
  )
  return {
    q: search.get('q') ?? '',
    sort: search.get('sort') ?? defaultSort,
    cursor: search.get('cursor') ?? undefined,
    filter: (name) => search.get(name) ?? '',
    set,
  }
}
