import { useState } from 'react'
import { useNavigate } from 'react-router'
import type { Box } from '../../../shared/domain/fact.ts'
import { type PlacedWord, quoteOf } from '../../../shared/domain/sheet-text.ts'
import { Button } from '../../ui/button.tsx'
import { AreaField } from '../../ui/field.tsx'
import { Notice } from '../../ui/page.tsx'
import { type PageSize, backWith, ownPage } from './marking.ts'

interface MarkPanelProps {
  revisionId: string
  page: number
  size: PageSize | undefined
  words: readonly PlacedWord[]
  box: Box | undefined
  onBox: (box: Box) => void
  returnTo: string
}

/** Beside the page while a place is marked: the words in the box, and the way back with it. */
export function MarkPanel({ revisionId, page, size, words, box, onBox, returnTo }: MarkPanelProps) {
  const navigate = useNavigate()
  if (!ownPage(returnTo))
    return <Notice tone="stop">The page that asked for this place cannot be gone back to. Open the form again and mark from there.</Notice>
  const placeBox = () => {
    if (size) onBox([size.width * 0.3, size.height * 0.3, size.width * 0.7, size.height * 0.33])
    // The box is there after the next drawing of the page.
    requestAnimationFrame(() => document.getElementById('marked-box')?.focus())
  }
  return (
    <section aria-label="Mark the place" className="border border-resin bg-card p-3 lg:p-4">
      <h2 className="text-section max-lg:sr-only">Mark the place</h2>
      <p className={`mb-2 text-pencil ${box ? 'max-lg:hidden' : ''}`}>Draw a box around the words that state the value, or tap one word.</p>
      {box ? (
        <Quote
          key={`${page} ${box.join()}`}
          words={quoteOf(words, box)}
          onUse={(quote) => void navigate(backWith(returnTo, { revisionId, page, box, quote }) ?? '/', { replace: true })}
        />
      ) : (
        <Button disabled={!size} onClick={placeBox}>
          Put a box on the page
        </Button>
      )}
      <p className="mt-3 text-small text-pencil max-lg:hidden">
        By keyboard: arrow keys move the box, Shift and arrow keys size it, with Alt in fine steps. A hit of the search can be marked, too.
      </p>
      <Button look="quiet" className="mt-2 -ml-3" onClick={() => void navigate(returnTo, { replace: true })}>
        Go back without a place
      </Button>
    </section>
  )
}

function Quote({ words, onUse }: { words: string; onUse: (quote: string) => void }) {
  const [quote, setQuote] = useState(words)
  const [error, setError] = useState<string>()
  const use = () => {
    const said = quote.trim()
    if (said === '') setError('Write the words of the sheet that state the value.')
    else onUse(said)
  }
  return (
    <>
      <AreaField
        label="The sheet’s words"
        rows={2}
        maxLength={500}
        value={quote}
        onChange={(event) => setQuote(event.target.value)}
        error={error}
        help={
          words === ''
            ? 'There is no text in this box. Write what stands there.'
            : 'As they stand in the box. Put right what was read wrongly.'
        }
      />
      <Button look="primary" className="mt-2" onClick={use}>
        Use this place
      </Button>
    </>
  )
}
