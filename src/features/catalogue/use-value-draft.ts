import { useEffect, useState } from 'react'
import { useLocation, useParams, useSearchParams } from 'react-router'
import type { Fact } from '../../../shared/domain/fact.ts'
import { type Property, propertyNames } from '../../../shared/domain/property.ts'
import { type ValueDraft, draftOf } from './value-text.ts'

function propertyIn(search: URLSearchParams): Property {
  const asked = search.get('property')
  return propertyNames.find((name) => name === asked) ?? 'density'
}

/** What was kept under a key, if it has the shape that the form has now. */
function keptUnder(key: string, like: ValueDraft): ValueDraft | undefined {
  try {
    const kept = JSON.parse(sessionStorage.getItem(key) ?? 'null') as ValueDraft | null
    return kept && Object.keys(like).every((name) => name in kept) ? kept : undefined
  } catch {
    return undefined
  }
}

/**
 * What is typed of a value. It is kept for the tab under the record's address while the page of the sheet is open for marking; the marked place
 * comes back in the address: `?resume=1&revision=…&page=…&box=l,t,r,b&quote=…`.
 */
export function useValueDraft(fact: Fact | undefined) {
  const { pathname } = useLocation()
  const { factId } = useParams()
  const [search] = useSearchParams()
  const key = `wearcourse.value ${pathname}`
  const [began] = useState(() => draftOf(fact?.property ?? propertyIn(search), fact))
  const [draft, setDraft] = useState<ValueDraft>(() => {
    const marked = search.get('revision')
    const kept = marked !== null || search.has('resume') ? (keptUnder(key, began) ?? began) : began
    if (marked === null) return kept
    return {
      ...kept,
      how: 'stated',
      revisionId: marked,
      page: search.get('page') ?? '1',
      box: search.get('box') ?? '',
      quote: search.get('quote') ?? kept.quote,
    }
  })
  useEffect(() => sessionStorage.setItem(key, JSON.stringify(draft)), [key, draft])
  return {
    draft,
    dirty: JSON.stringify(draft) !== JSON.stringify(factId ? began : draftOf(draft.property)),
    change: (part: Partial<ValueDraft>) => setDraft((before) => ({ ...before, ...part })),
    forget: () => sessionStorage.removeItem(key),
  }
}
