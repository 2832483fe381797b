import { useCallback, useEffect, useLayoutEffect, useRef, useState } from 'react'
import { buildUpEndpoints as wire } from '../../../shared/api/build-ups.ts'
import { AppError } from '../../../shared/api/errors.ts'
import { sentenceOf } from '../../lib/api.ts'
import type { Work } from './work.ts'

export type SaveState =
  | { kind: 'saved'; at: string }
  | { kind: 'waiting' }
  | { kind: 'saving' }
  /** Not kept: `says` why. Fields by address (`courses.2.title`) where one is wrong. */
  | { kind: 'failed'; says: string; fields: Record<string, string> }
  /** Someone else has saved since. */
  | { kind: 'conflict'; says: string }

interface AutosaveOptions {
  work: Work
  /** The work and edit counter as the server last gave them. */
  loaded: { work: Work; version: number; at: string }
  save: (work: Work, version: number) => Promise<{ version: number; updatedAt: string }>
}

/** After the last key. A save is on its way within 2 s of it. */
const delay = 900
const retryAfter = [4000, 8000, 15_000, 30_000]

/**
 * Keeps a draft while it is edited: one save at a time, the newest work always last, and what fails is tried again and never lost.
 */
export function useAutosave({ work, loaded, save }: AutosaveOptions) {
  const [state, setState] = useState<SaveState>({ kind: 'saved', at: loaded.at })
  const [keptWork, setKeptWork] = useState(loaded.work)
  const latest = useRef({ work, save })
  useLayoutEffect(() => {
    latest.current = { work, save }
  }, [work, save])
  const kept = useRef({ work: loaded.work, version: loaded.version, failures: 0 })
  const running = useRef<Promise<boolean> | null>(null)
  const halted = useRef(false)

  const flush = useCallback((): Promise<boolean> => {
    running.current ??= (async () => {
      try {
        while (latest.current.work !== kept.current.work && !halted.current) {
          const attempt = latest.current.work
          const parsed = wire.saveDraft.body.safeParse({ ...attempt, version: kept.current.version })
          if (!parsed.success) {
            setState({
              kind: 'failed',
              says: 'Something entered is not right.',
              fields: Object.fromEntries(parsed.error.issues.map((issue) => [issue.path.join('.'), issue.message])),
            })
            return false
          }
          setState({ kind: 'saving' })
          const { version, updatedAt } = await latest.current.save(attempt, kept.current.version)
          kept.current = { work: attempt, version, failures: 0 }
          setKeptWork(attempt)
          setState({ kind: 'saved', at: updatedAt })
        }
        return !halted.current
      } catch (error) {
        kept.current.failures += 1
        if (error instanceof AppError && error.code === 'conflict') {
          halted.current = true
          setState({ kind: 'conflict', says: error.message })
        } else setState({ kind: 'failed', says: sentenceOf(error), fields: error instanceof AppError ? (error.fields ?? {}) : {} })
        return false
      } finally {
        running.current = null
      }
    })()
    return running.current
  }, [])

  const dirty = work !== keptWork
  useEffect(() => {
    if (!dirty || halted.current) return
    setState((now) => (now.kind === 'saving' ? now : { kind: 'waiting' }))
    const timer = setTimeout(() => void flush(), delay)
    return () => clearTimeout(timer)
  }, [work, dirty, flush])

  useEffect(() => {
    if (state.kind !== 'failed' || Object.keys(state.fields).length > 0) return
    const timer = setTimeout(() => void flush(), retryAfter[Math.min(kept.current.failures, retryAfter.length) - 1] ?? delay)
    return () => clearTimeout(timer)
  }, [state, flush])

  useEffect(() => {
    const onHidden = () => document.visibilityState === 'hidden' && void flush()
    const onOnline = () => void flush()
    document.addEventListener('visibilitychange', onHidden)
    window.addEventListener('online', onOnline)
    return () => {
      document.removeEventListener('visibilitychange', onHidden)
      window.removeEventListener('online', onOnline)
    }
  }, [flush])

  /** Takes what the server has now as saved: after theirs was loaded. */
  const adopt = useCallback((next: { work: Work; version: number; at: string }) => {
    halted.current = false
    kept.current = { work: next.work, version: next.version, failures: 0 }
    setKeptWork(next.work)
    setState({ kind: 'saved', at: next.at })
  }, [])

  const version = useCallback(() => kept.current.version, [])
  return { state, dirty, flush, adopt, version }
}
