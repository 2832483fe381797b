import type { ReactNode } from 'react'
import { Button } from './button.tsx'
import { Notice } from './page.tsx'

interface AskingProps<T> {
  /** The state of a TanStack query, or anything shaped like it. */
  query: { data: T | undefined; error: unknown; isPending: boolean; refetch: () => unknown }
  /** A sentence about the error. */
  says: (error: unknown) => string
  children: (data: T) => ReactNode
}

/** Loading, broken or there: the layout keeps still and the error says what to do next. */
export function Asking<T>({ query, says, children }: AskingProps<T>) {
  if (query.data !== undefined) return <>{children(query.data)}</>
  if (query.error)
    return (
      <Notice tone="stop">
        <p className="mb-2">{says(query.error)}</p>
        <Button onClick={() => void query.refetch()}>Try again</Button>
      </Notice>
    )
  return (
    <div role="status" className="min-h-40 px-4 py-3 text-pencil">
      Loading …
    </div>
  )
}
