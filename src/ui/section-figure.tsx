import { memo, useId } from 'react'
import { type SectionModel, type SectionOptions, sectionOf } from '../../shared/drawing/section.ts'
import type { SectionLayer } from '../../shared/drawing/section-layer.ts'
import { Drawing } from './drawing.tsx'

interface SectionDrawingProps {
  model: SectionModel
  /** The course that is pointed at, here or in its row. */
  lit?: string | null
  onLight?: (courseId: string | null) => void
  /** Goes to the course's row. */
  onPick?: (courseId: string) => void
  className?: string
}

/** The floor cut through. Each course can be pointed at and reached by keyboard; in words it reads from the top down. */
export function SectionDrawing({ model, lit = null, onLight, onPick, className }: SectionDrawingProps) {
  const about = useId()
  const interactive = onLight !== undefined
  return (
    <svg
      width={model.width}
      height={model.height}
      viewBox={`0 0 ${model.width} ${model.height}`}
      className={className}
      role={interactive ? 'group' : 'img'}
      aria-label={interactive ? 'Section through the floor' : model.alternative}
      {...(interactive ? { 'aria-describedby': about } : {})}
    >
      {interactive && <desc id={about}>{model.alternative}</desc>}
      <Drawing shapes={model.shapes} lit={lit} />
      {interactive &&
        [...model.layers].reverse().map((layer) => (
          <path
            key={layer.id}
            d={layer.outline}
            role="button"
            tabIndex={0}
            aria-label={layer.says}
            stroke={layer.id === lit ? '#a8571a' : 'transparent'}
            strokeWidth={2.5}
            fill={layer.id === lit ? '#f6e7d6' : 'transparent'}
            fillOpacity={layer.id === lit ? 0.35 : 0}
            className="cursor-pointer outline-none"
            onPointerEnter={() => onLight(layer.id)}
            onPointerLeave={() => onLight(null)}
            onFocus={() => onLight(layer.id)}
            onBlur={() => onLight(null)}
            onClick={() => onPick?.(layer.id)}
            onKeyDown={(event) => {
              if (event.key !== 'Enter' && event.key !== ' ') return
              event.preventDefault()
              onPick?.(layer.id)
            }}
          />
        ))}
    </svg>
  )
}

interface SectionFigureProps extends SectionOptions {
  /** Bottom up. */
  layers: readonly SectionLayer[]
  className?: string
}

/** The section of some courses, to look at. */
export const SectionFigure = memo(function SectionFigure({ layers, className, ...options }: SectionFigureProps) {
  return <SectionDrawing model={sectionOf(layers, options)} {...(className ? { className } : {})} />
})

/** The section small, for lists. */
export function SmallSection({ layers }: { layers: readonly SectionLayer[] }) {
  return <SectionFigure layers={layers} width={132} height={56} unit="mil" compact className="block" />
}
