import { type ComponentType, type ReactNode, createContext, useContext } from 'react'
import type { Citation } from '../../shared/domain/fact.ts'

interface CitationLinkProps {
  citation: Citation
  children: ReactNode
  className?: string
}

/** How a citation opens its page; the frame provides a link of its router. */
export const CitationLinkContext = createContext<ComponentType<CitationLinkProps> | undefined>(undefined)

/** Words with a dotted underline that open the sheet's page with the box drawn. */
export function CitationLink({ citation, children }: CitationLinkProps) {
  const Link = useContext(CitationLinkContext)
  const className = 'border-b border-dotted border-resin hover:bg-resin-wash'
  if (!Link) return <span className={className}>{children}</span>
  return (
    <Link citation={citation} className={className}>
      {children}
    </Link>
  )
}
