import { useState } from 'react'
import { sentenceOf } from '../../lib/api.ts'
import { Button } from '../../ui/button.tsx'
import { useCatalogueChanges } from './queries.ts'

/** Takes a value out after asking once; the history keeps it. */
export function RemoveValue({ factId, onRemoved }: { factId: string; onRemoved: () => void }) {
  const { endFact } = useCatalogueChanges()
  const [asking, setAsking] = useState(false)
  const [busy, setBusy] = useState(false)
  const [error, setError] = useState<string>()
  const remove = async () => {
    setBusy(true)
    try {
      await endFact(factId)
      onRemoved()
    } catch (thrown) {
      setError(sentenceOf(thrown))
      setBusy(false)
    }
  }
  if (!asking)
    return (
      <Button look="quiet" className="ml-auto" onClick={() => setAsking(true)}>
        Remove this value
      </Button>
    )
  return (
    <span className="ml-auto flex flex-wrap items-center gap-2" role="group" aria-label="Remove this value">
      {error ? <span className="font-semibold text-stop">{error}</span> : <span>Remove it? The history keeps it.</span>}
      <Button look="stop" busy={busy} onClick={() => void remove()}>
        Remove
      </Button>
      <Button onClick={() => setAsking(false)}>Keep</Button>
    </span>
  )
}
