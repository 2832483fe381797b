import { memo, useLayoutEffect, useMemo, useState } from 'react'
import type { EvaluationInput } from '../../../shared/domain/build-up.ts'
import type { Evaluation } from '../../../shared/domain/evaluation.ts'
import type { TimelineRow } from '../../../shared/drawing/timeline.ts'
import { Card } from '../../ui/page.tsx'
import { TimelineFigure } from '../../ui/timeline-figure.tsx'
import type { Work } from './work.ts'

/** Fits Letter and A4 between their margins at the size of the page's own words. */
const printWidth = 690

interface TimelineCardProps {
  work: Work
  input: EvaluationInput
  evaluation: Evaluation
  lit: string | null
  onLight: (courseId: string | null) => void
}

/** Hours across, courses down, as wide as the page. */
export const TimelineCard = memo(function TimelineCard({ work, input, evaluation, lit, onLight }: TimelineCardProps) {
  const [box, setBox] = useState<HTMLElement | null>(null)
  const [width, setWidth] = useState(0)
  useLayoutEffect(() => {
    if (!box) return
    const measure = () => setWidth(Math.floor(box.clientWidth))
    const observer = new ResizeObserver(measure)
    observer.observe(box)
    measure()
    return () => observer.disconnect()
  }, [box])
  const rows = useMemo(
    () =>
      work.courses.flatMap(({ id, title, mixId }, index): TimelineRow[] => {
        const entry = evaluation.timeline.find((one) => one.courseId === id)
        return entry ? [{ id, number: index + 1, title, color: mixId ? (input.mixes[mixId]?.color ?? null) : null, entry }] : []
      }),
    [work, input, evaluation],
  )
  return (
    <Card title="Timeline" className="mt-4 break-inside-avoid">
      <div className="px-3 py-2">
        <div className="hidden print:block">
          <TimelineFigure rows={rows} width={printWidth} />
        </div>
        <div ref={setBox} className="min-h-24 overflow-hidden print:hidden">
          {width > 0 && <TimelineFigure rows={rows} width={width} narrow={width < 620} lit={lit} onLight={onLight} />}
        </div>
        <p className="mt-1 text-small text-pencil">
          Hours from the start of the first course, at the temperatures above. Bar: working time. Bracket: window for the next course, from
          the sheets’ own tables. Marks: when feet and wheels may return.
        </p>
      </div>
    </Card>
  )
})
