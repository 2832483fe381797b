import { type SyntheticEvent, useEffect, useState } from 'react'
import { Button } from '../../ui/button.tsx'

interface ViewToolbarProps {
  page: number
  pages: number
  onPage: (page: number) => void
  zoom: number
  onZoom: (zoom: number) => void
}

const zooms = [0.5, 0.75, 1, 1.25, 1.5, 2, 3]

/** Steps from page to page, a jump to one, and the size. */
export function ViewToolbar({ page, pages, onPage, zoom, onZoom }: ViewToolbarProps) {
  const at = zooms.indexOf(zoom)
  return (
    <div
      role="toolbar"
      aria-label="Page and size"
      className="sticky top-0 z-10 flex flex-wrap items-center gap-x-2 gap-y-2 border border-rule bg-card px-2 py-2 sm:gap-x-4 sm:px-3"
    >
      <span className="flex items-center gap-1">
        <Button aria-label="Previous page" disabled={page <= 1} onClick={() => onPage(page - 1)}>
          ←
        </Button>
        <PageJump page={page} pages={pages} onPage={onPage} />
        <Button aria-label="Next page" disabled={page >= pages} onClick={() => onPage(page + 1)}>
          →
        </Button>
      </span>
      <span className="flex items-center gap-1">
        <Button aria-label="Smaller" disabled={at <= 0} onClick={() => onZoom(zooms[at - 1] ?? 1)}>
          −
        </Button>
        <Button aria-label="Larger" disabled={at >= zooms.length - 1} onClick={() => onZoom(zooms[at + 1] ?? 1)}>
          +
        </Button>
        <Button aria-label="Fit the width" disabled={zoom === 1} onClick={() => onZoom(1)}>
          Fit
        </Button>
        <span role="status" className="w-14 text-right text-pencil max-sm:sr-only">
          {Math.round(zoom * 100)} %
        </span>
      </span>
    </div>
  )
}

function PageJump({ page, pages, onPage }: Pick<ViewToolbarProps, 'page' | 'pages' | 'onPage'>) {
  const [text, setText] = useState(String(page))
  useEffect(() => setText(String(page)), [page])
  const jump = (event: SyntheticEvent) => {
    event.preventDefault()
    const wanted = Math.round(Number(text))
    if (Number.isFinite(wanted) && wanted >= 1) onPage(Math.min(wanted, pages))
    else setText(String(page))
  }
  return (
    <form onSubmit={jump} className="flex items-center gap-1">
      <label>
        <span className="sr-only">Page</span>
        <input
          inputMode="numeric"
          value={text}
          onChange={(event) => setText(event.target.value)}
          onBlur={jump}
          className="min-h-9 w-12 border border-pencil bg-card px-2 py-1 text-right"
        />
      </label>
      <span className="text-pencil">of {pages}</span>
    </form>
  )
}
