import { useState } from 'react'
import { AppError } from '../../../shared/api/errors.ts'
import { Button } from '../../ui/button.tsx'
import { Notice } from '../../ui/page.tsx'

/**
 * The record that a form began with, and what someone else has made of it meanwhile. The record stays the one that the form began with, however
 * often it is asked for anew, so that a change of another person is told and never overwritten unseen.
 */
export function useConflict<R extends { id: string }>(record: R | undefined, read: (id: string) => Promise<R>) {
  const [base, setBase] = useState(record)
  const [theirs, setTheirs] = useState<R>()
  /** Does the work; a conflict fetches what stands there now, then is thrown on. */
  const watch = async <T,>(work: Promise<T>): Promise<T> => {
    try {
      return await work
    } catch (error) {
      if (base && error instanceof AppError && error.code === 'conflict') setTheirs(await read(base.id))
      throw error
    }
  }
  const settle = () => {
    if (theirs) setBase(theirs)
    setTheirs(undefined)
  }
  return { base, theirs, watch, settle }
}

export interface Difference {
  label: string
  theirs: string
  mine: string
}

/** What someone else saved beside what was typed here; nothing is lost either way. */
export function ConflictNotice({ differences, onMine, onTheirs }: { differences: Difference[]; onMine: () => void; onTheirs: () => void }) {
  return (
    <Notice tone="caution">
      <p className="mb-2 font-semibold">Someone else has saved this record meanwhile.</p>
      {differences.length > 0 ? (
        <table className="mb-3 w-full max-w-2xl border-collapse text-left">
          <thead className="text-pencil">
            <tr>
              <th scope="col" className="py-1 pr-4 font-normal">Field</th>
              <th scope="col" className="py-1 pr-4 font-normal">Saved now</th>
              <th scope="col" className="py-1 font-normal">Typed here</th>
            </tr>
          </thead>
          <tbody>
            {differences.map(({ label, theirs, mine }) => (
              <tr key={label} className="border-t border-rule align-top">
                <th scope="row" className="py-1 pr-4 font-semibold">{label}</th>
                <td className="py-1 pr-4 break-words">{theirs || <span className="text-pencil">empty</span>}</td>
                <td className="py-1 break-words">{mine || <span className="text-pencil">empty</span>}</td>
              </tr>
            ))}
          </tbody>
        </table>
      ) : (
        <p className="mb-3">It says the same as what is typed here.</p>
      )}
      <div className="flex flex-wrap gap-2">
        <Button onClick={onMine}>Keep what I typed, to save it again</Button>
        <Button onClick={onTheirs}>Take what is saved</Button>
      </div>
    </Notice>
  )
}
