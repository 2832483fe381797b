import { useCallback, useDeferredValue, useMemo, useRef, useState } from 'react'
import type { VersionSummary } from '../../../shared/api/build-ups.ts'
import { sectionLayers } from '../../../shared/drawing/section-layer.ts'
import { Card } from '../../ui/page.tsx'
import type { BuilderView } from './builder-view.ts'
import { CourseList } from './course-list.tsx'
import { FindingsPanel } from './findings-panel.tsx'
import { Hazards } from './hazards.tsx'
import { PrintedSection, SectionColumn } from './section-column.tsx'
import { TimelineCard } from './timeline-card.tsx'
import { TotalsBlock } from './totals-block.tsx'

interface BuilderBodyProps {
  view: BuilderView
  version: VersionSummary
  reasons: Readonly<Record<string, string>>
}

/** The sheet itself: section, courses, checks and title block, and the timeline beneath. */
export function BuilderBody({ view, version, reasons }: BuilderBodyProps) {
  const { work, input, evaluation } = view
  const [lit, setLit] = useState<string | null>(null)
  const [open, setOpen] = useState<string | null>(null)
  const list = useRef<HTMLOListElement>(null)
  // what is typed shows at once; the figures and the checks follow as soon as there is time
  const reckoned = useMemo(() => ({ work, input, evaluation }), [work, input, evaluation])
  const later = useDeferredValue(reckoned)
  const layers = useMemo(() => sectionLayers({ ...later.input, courses: later.work.courses }, later.evaluation), [later])
  const titles = useMemo(() => Object.fromEntries(later.work.courses.map(({ id, title }) => [id, title])), [later])
  const pick = useCallback((id: string) => {
    setOpen(id)
    document.querySelector<HTMLElement>(`#course-${CSS.escape(id)} button`)?.focus()
  }, [])
  return (
    <>
      <PrintedSection layers={layers} />
      <div className="mt-4 grid border border-rule bg-card md:grid-cols-[270px_minmax(0,1fr)] xl:grid-cols-[340px_minmax(0,1fr)_310px] print:block">
        <SectionColumn layers={layers} rows={list} lit={lit} onLight={setLit} onPick={pick} />
        <CourseList view={view} list={list} lit={lit} onLight={setLit} open={open} onOpen={setOpen} />
        <div className="border-t border-rule px-4 py-3 md:col-span-2 xl:col-span-1 xl:border-t-0 xl:border-l">
          <FindingsPanel findings={later.evaluation.findings} titles={titles} lit={lit} onLight={setLit} reasons={reasons} />
          <TotalsBlock totals={later.evaluation.totals} version={version} />
        </div>
      </div>
      {work.courses.length > 0 && (
        <>
          <TimelineCard {...later} lit={lit} onLight={setLit} />
          <Card title="Hazards of the whole floor" className="mt-4 break-inside-avoid">
            <div className="p-4">
              <Hazards hazards={later.evaluation.hazards} title="Taken together" />
            </div>
          </Card>
        </>
      )}
    </>
  )
}
