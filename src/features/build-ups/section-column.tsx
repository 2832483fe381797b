import { type RefObject, memo, useLayoutEffect, useMemo, useState } from 'react'
import type { SectionLayer } from '../../../shared/drawing/section-layer.ts'
import type { DrawingUnit } from '../../../shared/drawing/section-words.ts'
import { sectionOf, standaloneHeight } from '../../../shared/drawing/section.ts'
import { SectionDrawing, SectionFigure } from '../../ui/section-figure.tsx'
import { useUnitSystem } from '../../ui/unit-system.tsx'

interface SectionColumnProps {
  layers: readonly SectionLayer[]
  /** The list whose rows (`data-course`) the leaders run to. */
  rows: RefObject<HTMLElement | null>
  lit: string | null
  onLight: (courseId: string | null) => void
  onPick: (courseId: string) => void
}

interface Measures {
  width: number
  height: number
  anchors: Record<string, number>
}

const sameAs = (a: Measures, b: Measures) => JSON.stringify(a) === JSON.stringify(b)
const leastHeight = 430

/** Where the heads of the rows stand beside the figure; followed as rows open and the window changes. */
function useMeasures(column: HTMLElement | null, rows: RefObject<HTMLElement | null>, layers: readonly SectionLayer[]): Measures | null {
  const [measures, setMeasures] = useState<Measures | null>(null)
  useLayoutEffect(() => {
    const list = rows.current
    if (!column || !list) return
    const measure = () => {
      const box = column.getBoundingClientRect()
      const beside = list.getBoundingClientRect().left >= box.right - 2
      const heads = [...list.querySelectorAll<HTMLElement>('[data-course]')]
      const anchors = beside
        ? Object.fromEntries(
            heads.map((head) => [
              head.dataset['course'] ?? '',
              Math.round(head.getBoundingClientRect().top + head.offsetHeight / 2 - box.top),
            ]),
          )
        : {}
      const next = {
        width: Math.floor(box.width),
        height: beside ? Math.max(leastHeight, Math.round(list.getBoundingClientRect().height)) : leastHeight - 60,
        anchors,
      }
      setMeasures((now) => (now && sameAs(now, next) ? now : next))
    }
    const observer = new ResizeObserver(measure)
    observer.observe(list)
    observer.observe(column)
    for (const head of list.querySelectorAll('[data-course]')) observer.observe(head)
    measure()
    return () => observer.disconnect()
  }, [column, rows, layers])
  return measures
}

/** Unit of the dimension lines for the units that a person wants to see. */
function drawingUnit(system: 'stated' | 'us' | 'si', layers: readonly SectionLayer[]): DrawingUnit {
  if (system !== 'si') return 'mil'
  return Math.max(0, ...layers.map((layer) => layer.thickness ?? 0)) >= 3000 ? 'mm' : 'µm'
}

/** The section beside the rows, with its leaders and its notes. */
export const SectionColumn = memo(function SectionColumn({ layers, rows, ...pointing }: SectionColumnProps) {
  const [column, setColumn] = useState<HTMLElement | null>(null)
  const { system } = useUnitSystem()
  const measures = useMeasures(column, rows, layers)
  const unit = drawingUnit(system, layers)
  const beside = measures !== null && Object.keys(measures.anchors).length > 0
  const model = useMemo(
    () =>
      measures &&
      sectionOf(layers, { width: measures.width, height: measures.height, unit, ...(beside ? { anchors: measures.anchors } : {}) }),
    [layers, measures, unit, beside],
  )
  return (
    <figure ref={setColumn} className="min-w-0 border-b border-rule md:border-r md:border-b-0 print:hidden">
      {model && <SectionDrawing model={model} {...pointing} className="block" />}
      {model && <figcaption className="border-t border-rule px-3 py-2 text-small text-pencil">{model.notes.join(' ')}</figcaption>}
    </figure>
  )
})

/** On paper the section stands by itself, with its titles, whatever the window's width was. */
export const PrintedSection = memo(function PrintedSection({ layers }: { layers: readonly SectionLayer[] }) {
  const { system } = useUnitSystem()
  return (
    <div className="mt-4 hidden break-inside-avoid print:block">
      <SectionFigure
        layers={layers}
        width={680}
        height={standaloneHeight(layers.length)}
        unit={drawingUnit(system, layers)}
        standalone
        className="h-auto max-w-full"
      />
    </div>
  )
})
