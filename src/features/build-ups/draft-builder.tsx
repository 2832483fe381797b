import { useQueryClient } from '@tanstack/react-query'
import { useEffect, useState } from 'react'
import { useBlocker, useNavigate } from 'react-router'
import type { BuildUp } from '../../../shared/api/build-ups.ts'
import { paths } from '../../lib/paths.ts'
import { Button } from '../../ui/button.tsx'
import { Dialog } from '../../ui/dialog.tsx'
import { BuilderBody } from './builder-body.tsx'
import { BuilderFrame } from './builder-frame.tsx'
import { ConditionsBar } from './conditions-bar.tsx'
import { ConditionsSummary } from './conditions-summary.tsx'
import { ConflictDialog } from './conflict-dialog.tsx'
import { buildUpOptions, useBuildUpChanges } from './queries.ts'
import { SaveMark } from './save-mark.tsx'
import { type Draft, useDraft } from './use-draft.ts'

/** A draft at work. */
export function DraftBuilder({ buildUp }: { buildUp: BuildUp }) {
  const draft = useDraft(buildUp)
  const { work, history, dispatch, input, evaluation, autosave } = draft
  useUndoKeys(dispatch)
  const { state } = autosave
  const [deciding, setDeciding] = useState(true)
  const fields = state.kind === 'failed' ? state.fields : {}
  return (
    <BuilderFrame
      buildUp={buildUp}
      evaluation={evaluation}
      conditions={work.conditions}
      titles={Object.fromEntries(work.courses.map(({ id, title }) => [id, title]))}
      beforeLeaving={autosave.flush}
      version={autosave.version}
      marks={
        <SaveMark
          state={state}
          titles={work.courses.map(({ title }) => title)}
          onRetry={() => (state.kind === 'conflict' ? setDeciding(true) : void autosave.flush())}
        />
      }
      actions={
        <>
          <Button disabled={history.past.length === 0} onClick={() => dispatch({ kind: 'undo' })} title="Control and z">
            Undo
          </Button>
          <Button disabled={history.future.length === 0} onClick={() => dispatch({ kind: 'redo' })} title="Control, shift and z">
            Redo
          </Button>
        </>
      }
    >
      <div className="print:hidden">
        <ConditionsBar conditions={work.conditions} onChange={(change) => dispatch({ kind: 'conditions', change })} />
      </div>
      <div className="hidden print:block">
        <ConditionsSummary conditions={work.conditions} />
      </div>
      <BuilderBody view={{ work, input, evaluation, dispatch, fields }} version={buildUp.opened} reasons={buildUp.opened.releaseReasons} />
      <Conflict buildUp={buildUp} draft={draft} open={deciding} onClose={() => setDeciding(false)} />
      <LeavingPrompt dirty={autosave.dirty} flush={autosave.flush} />
    </BuilderFrame>
  )
}

function Conflict({ buildUp, draft, open, onClose }: { buildUp: BuildUp; draft: Draft; open: boolean; onClose: () => void }) {
  const client = useQueryClient()
  const navigate = useNavigate()
  const { addDraft } = useBuildUpChanges()
  const { state, adopt, version } = draft.autosave
  const { number } = buildUp.opened
  return (
    <ConflictDialog
      open={open && state.kind === 'conflict'}
      onClose={onClose}
      says={state.kind === 'conflict' ? state.says : ''}
      loadTheirs={async () => {
        const theirs = await client.query({ ...buildUpOptions(buildUp.id, number), staleTime: 0 })
        client.setQueryData(buildUpOptions(buildUp.id, undefined).queryKey, (now) => (now?.opened.number === number ? theirs : now))
        draft.load(theirs)
      }}
      keepMine={() => addDraft.mutateAsync({ buildUpId: buildUp.id, from: number, work: draft.work })}
      onKept={(made) => {
        adopt({ work: draft.work, version: version(), at: made.opened.updatedAt })
        // after the state above has settled, so that nothing counts as unsaved any more
        setTimeout(() => void navigate(paths.buildUp(made.id, made.opened.number)), 0)
      }}
    />
  )
}

/** Control and z takes back, with shift does again; inside a field the field's own undo comes first. */
function useUndoKeys(dispatch: Draft['dispatch']) {
  useEffect(() => {
    const onKey = (event: KeyboardEvent) => {
      const typing = (event.target as HTMLElement).closest('input, textarea, select, dialog')
      if (typing || !(event.ctrlKey || event.metaKey) || event.key.toLowerCase() !== 'z') return
      event.preventDefault()
      dispatch({ kind: event.shiftKey ? 'redo' : 'undo' })
    }
    window.addEventListener('keydown', onKey)
    return () => window.removeEventListener('keydown', onKey)
  }, [dispatch])
}

/** Leaving saves first; only what cannot be saved is asked about. */
function LeavingPrompt({ dirty, flush }: { dirty: boolean; flush: () => Promise<boolean> }) {
  const blocker = useBlocker(
    ({ currentLocation, nextLocation }) =>
      dirty && currentLocation.pathname + currentLocation.search !== nextLocation.pathname + nextLocation.search,
  )
  const [asking, setAsking] = useState(false)
  useEffect(() => {
    if (blocker.state !== 'blocked') return
    void flush().then((saved) => (saved ? blocker.proceed() : setAsking(true)))
  }, [blocker, flush])
  useEffect(() => {
    if (!dirty) return
    const warn = (event: BeforeUnloadEvent) => event.preventDefault()
    window.addEventListener('beforeunload', warn)
    return () => window.removeEventListener('beforeunload', warn)
  }, [dirty])
  const stay = () => {
    setAsking(false)
    blocker.reset?.()
  }
  return (
    <Dialog title="Leave without saving" open={asking} onClose={stay}>
      <p className="mb-3">The last changes could not be saved. If you leave now they are lost.</p>
      <div className="flex gap-2">
        <Button look="primary" onClick={stay}>
          Stay
        </Button>
        <Button
          look="stop"
          onClick={() => {
            setAsking(false)
            blocker.proceed?.()
          }}
        >
          Leave and lose them
        </Button>
      </div>
    </Dialog>
  )
}
