import { useEffect, useRef, useState } from 'react'
import { sentenceOf } from '../../lib/api.ts'
import { Button } from '../../ui/button.tsx'
import { TextField } from '../../ui/field.tsx'
import type { Finding } from './use-find.ts'

interface FindPanelProps {
  find: Finding
  /** In marking mode a hit can become the marked place. */
  onMark?: (() => void) | undefined
}

const typingPause = 250

/** Search in the text of all pages: n of m, next and previous, and the hits with the words around them. */
export function FindPanel({ find, onMark }: FindPanelProps) {
  const [text, setText] = useState(find.q)
  const { hits, current, q, setQ } = find
  useEffect(() => {
    if (text.trim() === q) return
    const timer = setTimeout(() => setQ(text.trim()), typingPause)
    return () => clearTimeout(timer)
  }, [text, q, setQ])
  return (
    <search className="block border border-rule bg-card p-3 lg:p-4">
      <TextField
        label="Search in this sheet"
        type="search"
        value={text}
        onChange={(event) => setText(event.target.value)}
        onKeyDown={(event) => {
          if (event.key !== 'Enter') return
          event.preventDefault()
          find.step(event.shiftKey ? -1 : 1)
        }}
      />
      {q !== '' && (
        <>
          <div className="mt-2 flex items-center justify-between gap-2">
            <span role="status" className="text-pencil">
              {find.error
                ? sentenceOf(find.error)
                : find.pending
                  ? 'Searching …'
                  : hits.length === 0
                    ? 'Nothing found.'
                    : `${current + 1} of ${hits.length}${find.more ? ' or more' : ''}`}
            </span>
            {hits.length > 0 && (
              <span className="flex gap-1">
                <Button aria-label="Previous hit" onClick={() => find.step(-1)}>
                  ↑
                </Button>
                <Button aria-label="Next hit" onClick={() => find.step(1)}>
                  ↓
                </Button>
              </span>
            )}
          </div>
          {onMark && hits.length > 0 && (
            <Button className="mt-2" onClick={onMark}>
              Mark this hit
            </Button>
          )}
          <HitList find={find} />
        </>
      )}
    </search>
  )
}

function HitList({ find: { hits, current, goTo } }: { find: Finding }) {
  const currentItem = useRef<HTMLLIElement>(null)
  useEffect(() => {
    const list = currentItem.current?.parentElement
    if (list && currentItem.current) list.scrollTop = currentItem.current.offsetTop - list.clientHeight / 2
  }, [current])
  return (
    <ol className="relative mt-2 max-h-32 overflow-y-auto lg:max-h-96">
      {hits.map((hit, index) => (
        <li key={index} ref={index === current ? currentItem : undefined}>
          <button
            type="button"
            aria-current={index === current || undefined}
            onClick={() => goTo(index)}
            className={`block w-full border-l-4 px-2 py-1 text-left text-small ${index === current ? 'border-resin bg-resin-wash' : 'border-transparent hover:bg-paper'}`}
          >
            <span className="text-pencil">Page {hit.page}</span> {hit.excerpt}
          </button>
        </li>
      ))}
    </ol>
  )
}
