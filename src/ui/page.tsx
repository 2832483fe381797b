import { type ReactNode, useEffect } from 'react'

interface PageProps {
  title: string
  /** Under the title: status, number, conditions. */
  under?: ReactNode
  /** To the right of the title: the page's actions. */
  actions?: ReactNode
  children: ReactNode
}

/** A page with its one heading; the browser's title follows it. */
export function Page({ title, under, actions, children }: PageProps) {
  useEffect(() => {
    document.title = `${title} · Wearcourse`
  }, [title])
  return (
    <main id="main" className="mx-auto w-full max-w-[1400px] px-4 py-5 md:px-7">
      <div className="mb-4 flex flex-wrap items-start justify-between gap-3">
        <div>
          <h1 className="text-title">{title}</h1>
          {under && <div className="text-pencil">{under}</div>}
        </div>
        {actions && <div className="no-print flex flex-wrap items-center gap-2">{actions}</div>}
      </div>
      {children}
    </main>
  )
}

/** A card: surface with a hairline. */
export function Card({
  title,
  actions,
  children,
  className = '',
}: {
  title?: string
  actions?: ReactNode
  children: ReactNode
  className?: string
}) {
  return (
    <section className={`border border-rule bg-card ${className}`}>
      {(title || actions) && (
        <div className="flex flex-wrap items-center justify-between gap-2 border-b border-rule px-4 py-2">
          {title && <h2 className="text-section">{title}</h2>}
          {actions}
        </div>
      )}
      {children}
    </section>
  )
}

/** What a list says when it is empty, loading or broken. */
export function Notice({ tone = 'plain', children }: { tone?: 'plain' | 'stop' | 'caution'; children: ReactNode }) {
  const border = tone === 'stop' ? 'border-stop' : tone === 'caution' ? 'border-caution' : 'border-rule'
  return (
    <div role={tone === 'stop' ? 'alert' : 'status'} className={`border-l-4 ${border} bg-card px-4 py-3`}>
      {children}
    </div>
  )
}
