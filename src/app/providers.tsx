import { QueryClientProvider } from '@tanstack/react-query'
import { useState } from 'react'
import { Link } from 'react-router'
import { RouterProvider } from 'react-router/dom'
import type { Citation } from '../../shared/domain/fact.ts'
import { paths } from '../lib/paths.ts'
import { createQueryClient } from '../lib/query-client.ts'
import { CitationLinkContext } from '../ui/citation-link.tsx'
import { UnitSystemProvider } from '../ui/unit-system.tsx'
import { createRouter } from './router.tsx'

function SheetPageLink({ citation, children, className }: { citation: Citation; children: React.ReactNode; className?: string }) {
  return (
    <Link
      to={paths.sheetPage(citation.revisionId, citation.page, citation.box)}
      className={className}
      title={`${citation.sheetTitle}, page ${citation.page}${citation.quote ? `: “${citation.quote}”` : ''}`}
    >
      {children}
    </Link>
  )
}

export function Providers() {
  const [queryClient] = useState(createQueryClient)
  const [router] = useState(createRouter)
  return (
    <QueryClientProvider client={queryClient}>
      <UnitSystemProvider>
        <CitationLinkContext value={SheetPageLink}>
          <RouterProvider router={router} />
        </CitationLinkContext>
      </UnitSystemProvider>
    </QueryClientProvider>
  )
}
