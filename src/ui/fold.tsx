import { type ReactNode, useState } from 'react'

interface FoldProps {
  summary: ReactNode
  children: ReactNode
  className?: string
  summaryClass?: string
}

/** A part that opens; what is inside is made only then, so that a long page stays quick. */
export function Fold({ summary, children, className, summaryClass = '' }: FoldProps) {
  const [open, setOpen] = useState(false)
  return (
    <details className={className} onToggle={(event) => setOpen(event.currentTarget.open)}>
      <summary className={`cursor-pointer [&::-webkit-details-marker]:hidden ${summaryClass}`}>{summary}</summary>
      {open && children}
    </details>
  )
}
