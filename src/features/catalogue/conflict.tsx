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

const isSame = (a: unknown, b: unknown) => JSON.stringify(a) === JSON.stringify(b)

/** What someone else saved, with what was typed here on top: fields that nobody touched here follow theirs. */
export function merged<D extends object>(began: D, { mine, theirs }: { mine: D; theirs: D }): D {
  const typed = Object.entries(mine).filter(([name, value]) => !isSame(value, began[name as keyof D]))
  return { ...theirs, ...Object.fromEntries(typed) }
}

export interface Difference {
  label: string
  theirs: string
  /** Null where nothing was changed here. */
  mine: string | null
}

/** What someone else saved beside what was typed here. What was not changed here follows what is saved. */
export function ConflictNotice({ differences, onMine, onTheirs }: { differences: Difference[]; onMine: () => void; onTheirs: () => void }) {
  return (
    <Notice tone="caution">
      <p className="mb-2 font-semibold">Someone else has saved this record meanwhile.</p>
      {differences.length > 0 ? (
        <table className="mb-2 w-full max-w-2xl border-collapse text-left">
          <thead className="text-pencil">
            <tr>
              <th scope="col" className="py-1 pr-4 font-normal">
                Field
              </th>
              <th scope="col" className="py-1 pr-4 font-normal">
                Saved now
              </th>
              <th scope="col" className="py-1 font-normal">
                Typed here
              </th>
            </tr>
          </thead>
          <tbody>
            {differences.map(({ label, theirs, mine }) => (
              <tr key={label} className="border-t border-rule align-top">
                <th scope="row" className="py-1 pr-4 font-semibold">
                  {label}
                </th>
                <td className="py-1 pr-4 break-words">{theirs || <span className="text-pencil">empty</span>}</td>
                <td className="py-1 break-words">
                  {mine === null ? <span className="text-pencil">not changed</span> : mine || <span className="text-pencil">empty</span>}
                </td>
              </tr>
            ))}
          </tbody>
        </table>
      ) : (
        <p className="mb-3">It says the same as what is typed here.</p>
      )}
      <div className="flex flex-wrap gap-2">
        <Button onClick={onMine}>Keep what I typed, then save again</Button>
        <Button onClick={onTheirs}>Take what is saved</Button>
      </div>
    </Notice>
  )
}
