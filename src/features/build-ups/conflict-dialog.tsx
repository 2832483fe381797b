import { useState } from 'react'
import type { BuildUp } from '../../../shared/api/build-ups.ts'
import { sentenceOf } from '../../lib/api.ts'
import { Button } from '../../ui/button.tsx'
import { Dialog } from '../../ui/dialog.tsx'
import { Notice } from '../../ui/page.tsx'

interface ConflictDialogProps {
  open: boolean
  onClose: () => void
  /** What the server said: who saved. */
  says: string
  loadTheirs: () => Promise<void>
  keepMine: () => Promise<BuildUp>
  onKept: (buildUp: BuildUp) => void
}

/** Two people on one draft: neither is overwritten. */
export function ConflictDialog({ open, onClose, says, loadTheirs, keepMine, onKept }: ConflictDialogProps) {
  const [problem, setProblem] = useState<string>()
  const [busy, setBusy] = useState(false)
  const run = async (work: () => Promise<void>) => {
    setBusy(true)
    setProblem(undefined)
    try {
      await work()
    } catch (error) {
      setProblem(sentenceOf(error))
    } finally {
      setBusy(false)
    }
  }
  return (
    <Dialog title="Someone else saved this draft" open={open} onClose={onClose}>
      {problem && <Notice tone="stop">{problem}</Notice>}
      <p className="mb-3">{says} Your work since your last save is still here and has not been written over theirs.</p>
      <div className="flex flex-wrap gap-2">
        <Button look="primary" busy={busy} onClick={() => void run(async () => onKept(await keepMine()))}>
          Keep mine as a new draft
        </Button>
        <Button busy={busy} onClick={() => void run(loadTheirs)}>
          Load theirs and drop mine
        </Button>
      </div>
    </Dialog>
  )
}
