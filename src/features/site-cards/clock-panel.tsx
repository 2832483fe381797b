import { useEffect, useState } from 'react'
import type { CourseResult } from '../../../shared/domain/evaluation.ts'
import type { Figure } from '../../../shared/domain/figure.ts'
import { valueIn } from '../../../shared/domain/units.ts'
import { clockWindow } from '../../../shared/domain/window.ts'
import { BigFigure, WhyMissing } from './big-figure.tsx'
import { TouchButton } from './touch-button.tsx'

interface ClockPanelProps {
  /** Job, bay and course: what the times kept on this phone belong to. */
  place: string
  result: CourseResult
  zone: string
}

/** An instant kept on this phone; it survives a closed page, for clocks run on absolute time. */
function useKeptInstant(name: string) {
  const key = `wearcourse.clock ${name}`
  const [instant, setInstant] = useState<number | null>(() => {
    const kept = Number(localStorage.getItem(key))
    return kept > 0 ? kept : null
  })
  const keep = (next: number | null) => {
    setInstant(next)
    if (next === null) localStorage.removeItem(key)
    else localStorage.setItem(key, String(next))
  }
  return [instant, keep] as const
}

function useNow(running: boolean): number {
  const [now, setNow] = useState(() => Date.now())
  useEffect(() => {
    if (!running) return
    const timer = window.setInterval(() => setNow(Date.now()), 1000)
    return () => window.clearInterval(timer)
  }, [running])
  return now
}

/** The pail's clock and the bay's window, as clock times. */
export function ClockPanel({ place, result, zone }: ClockPanelProps) {
  const [mixed, setMixed] = useKeptInstant(`mixed ${place}`)
  const [laid, setLaid] = useKeptInstant(`laid ${place}`)
  return (
    <section aria-label="Clocks" className="grid gap-3">
      <PailClock potLife={result.potLife} mixed={mixed} onMixed={setMixed} />
      <WindowClock window={result.window} laid={laid} onLaid={setLaid} zone={zone} />
    </section>
  )
}

const minutesAndSeconds = (ms: number) => {
  const seconds = Math.max(0, Math.ceil(ms / 1000))
  return `${Math.floor(seconds / 60)}:${String(seconds % 60).padStart(2, '0')}`
}

function PailClock({ potLife, mixed, onMixed }: { potLife: Figure; mixed: number | null; onMixed: (at: number | null) => void }) {
  const now = useNow(mixed !== null)
  const known = potLife.kind === 'not-stated' ? undefined : (potLife.value.min ?? potLife.value.max)
  const limit =
    potLife.kind === 'not-stated' || known === undefined ? undefined : valueIn({ value: known, unit: potLife.value.unit }, 's') * 1000
  const left = mixed !== null && limit !== undefined ? mixed + limit - now : undefined
  const over = left !== undefined && left <= 0
  return (
    <div className={`border-2 p-3 ${over ? 'border-stop' : 'border-ink'}`}>
      <p className="text-body">Pot life at this temperature</p>
      <BigFigure figure={potLife} />
      <WhyMissing figure={potLife} />
      {potLife.kind === 'fact' && potLife.condition && <span className="block text-body">{potLife.condition}</span>}
      <p className="text-body">A full pail is shorter than the sheet’s small mass. Pour at once and spread.</p>
      {left !== undefined && (
        <p role="timer" className={`mt-1 ${over ? 'text-stop' : ''}`}>
          <span className="text-site-figure font-bold">{minutesAndSeconds(left)}</span>{' '}
          {over ? '■ Time is over. Do not use this pail.' : 'left in the pail'}
        </p>
      )}
      <div className="mt-2 grid grid-cols-2 gap-3">
        <TouchButton strong onClick={() => onMixed(Date.now())}>
          {mixed === null ? 'Mixed now' : 'New pail, mixed now'}
        </TouchButton>
        <TouchButton disabled={mixed === null} onClick={() => onMixed(null)}>
          Pail is poured
        </TouchButton>
      </div>
    </div>
  )
}

const quarter = 15 * 60_000

function WindowClock({
  window: figure,
  laid,
  onLaid,
  zone,
}: {
  window: Figure
  laid: number | null
  onLaid: (at: number | null) => void
  zone: string
}) {
  const times = laid !== null && figure.kind !== 'not-stated' ? clockWindow(figure.value, { start: laid, zone }) : undefined
  return (
    <div className="border-2 border-ink p-3">
      <p className="text-body">Next coat after laying this one</p>
      <BigFigure figure={figure} />
      <WhyMissing figure={figure} />
      {laid !== null && (
        <p className="text-body">
          Laid {new Intl.DateTimeFormat('en-GB', { weekday: 'short', hour: '2-digit', minute: '2-digit', timeZone: zone }).format(laid)}
        </p>
      )}
      {times && (
        <p className="mt-1">
          From <strong className="text-site-figure">{times.opens?.text ?? 'not stated'}</strong>
          <span className="block">
            until <strong className="text-site-figure">{times.closes?.text ?? 'not stated'}</strong>
          </span>
        </p>
      )}
      <div className="mt-2 grid grid-cols-3 gap-3">
        <TouchButton strong className="col-span-3" onClick={() => onLaid(Date.now())}>
          Laid now
        </TouchButton>
        <TouchButton disabled={laid === null} onClick={() => laid !== null && onLaid(laid - quarter)}>
          15 min earlier
        </TouchButton>
        <TouchButton disabled={laid === null} onClick={() => laid !== null && onLaid(laid + quarter)}>
          15 min later
        </TouchButton>
        <TouchButton disabled={laid === null} onClick={() => onLaid(null)}>
          Clear
        </TouchButton>
      </div>
    </div>
  )
}
