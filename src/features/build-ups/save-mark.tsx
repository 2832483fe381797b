import type { SaveState } from './use-autosave.ts'
import { Button } from '../../ui/button.tsx'

const clock = (at: string) => new Date(at).toLocaleTimeString('en-GB', { hour: '2-digit', minute: '2-digit' })

interface SaveMarkProps {
  state: SaveState
  /** Titles of the courses in order, to say which one is meant. */
  titles: readonly string[]
  onRetry: () => void
}

/** How the draft is kept: nothing is ever lost without a word. */
export function SaveMark({ state, titles, onRetry }: SaveMarkProps) {
  const words = {
    saved: () => `saved ${clock(state.kind === 'saved' ? state.at : '')}`,
    waiting: () => 'not saved yet',
    saving: () => 'saving',
    failed: () => `not saved: ${state.kind === 'failed' ? whatFailed(state, titles) : ''}`,
    conflict: () => 'not saved: someone else has',
  }
  const bad = state.kind === 'failed' || state.kind === 'conflict'
  return (
    <span role="status" className={`flex items-center gap-2 ${bad ? 'font-semibold text-stop' : 'text-pencil'}`}>
      {words[state.kind]()}
      {state.kind === 'failed' && <Button onClick={onRetry}>Save now</Button>}
      {state.kind === 'conflict' && <Button onClick={onRetry}>Choose whose to keep</Button>}
    </span>
  )
}

/** The first problem with the course it belongs to. */
function whatFailed({ says, fields }: { says: string; fields: Record<string, string> }, titles: readonly string[]): string {
  const [first] = Object.entries(fields)
  if (!first) return says
  const index = /^courses\.(\d+)\./.exec(first[0])?.[1]
  return index === undefined
    ? first[1]
    : `course ${Number(index) + 1}${titles[Number(index)] ? `, ${titles[Number(index)]}` : ''}: ${first[1]}`
}
