import { useId, useMemo } from 'react'
import { type TimelineOptions, type TimelineRow, timelineOf } from '../../shared/drawing/timeline.ts'
import { Drawing } from './drawing.tsx'

interface TimelineFigureProps extends TimelineOptions {
  rows: readonly TimelineRow[]
  lit?: string | null
  onLight?: (courseId: string | null) => void
}

/** Hours across, courses down; the course pointed at elsewhere is lit here too. */
export function TimelineFigure({ rows, lit = null, onLight, width, narrow, clock }: TimelineFigureProps) {
  const model = useMemo(
    () => timelineOf(rows, { width, ...(narrow === undefined ? {} : { narrow }), ...(clock ? { clock } : {}) }),
    [rows, width, narrow, clock],
  )
  const about = useId()
  return (
    <svg
      width={model.width}
      height={model.height}
      viewBox={`0 0 ${model.width} ${model.height}`}
      className="h-auto max-w-full"
      role="img"
      aria-labelledby={about}
    >
      <title id={about}>{model.alternative}</title>
      {model.rows.map((row) => (
        <rect
          key={row.id}
          x={0}
          y={row.top}
          width={model.width}
          height={row.bottom - row.top}
          fill={row.id === lit ? '#f6e7d6' : 'transparent'}
          fillOpacity={0.6}
          onPointerEnter={() => onLight?.(row.id)}
          onPointerLeave={() => onLight?.(null)}
        />
      ))}
      <g pointerEvents="none">
        <Drawing shapes={model.shapes} lit={lit} />
      </g>
    </svg>
  )
}
