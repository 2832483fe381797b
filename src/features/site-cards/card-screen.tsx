import { useEffect, useMemo, useState } from 'react'
import type { JobBuildUp } from '../../../shared/api/jobs.ts'
import type { SiteCard } from '../../../shared/api/site-cards.ts'
import { isDry } from '../../../shared/domain/course-result.ts'
import { evaluate } from '../../../shared/domain/evaluate.ts'
import { formatRange } from '../../../shared/domain/format.ts'
import type { Quantity } from '../../../shared/domain/units.ts'
import { ClockPanel } from './clock-panel.tsx'
import { CoursePicker } from './course-picker.tsx'
import { FirstAidPanel } from './first-aid-panel.tsx'
import { MixPanel } from './mix-panel.tsx'
import { PrepPanel } from './prep-panel.tsx'
import { SheetsPanel } from './sheets-panel.tsx'
import { TemperatureStepper } from './temperature-stepper.tsx'
import { WearPanel } from './wear-panel.tsx'

const views = { mix: 'Mix', wear: 'Wear', aid: 'First aid', sheets: 'Sheets' } as const
type View = keyof typeof views

/** One screen for the course at hand, readable at arm's length; what to wear, first aid and the sheets are one tap away. */
export function CardScreen({ card }: { card: SiteCard }) {
  useEffect(() => {
    document.title = `${card.name} · site card · Wearcourse`
  }, [card.name])
  return (
    <main id="main" className="mx-auto max-w-xl bg-card pb-28 text-site">
      <header className="border-b-2 border-ink px-4 py-3">
        <h1 className="text-[22px] leading-7">{card.name}</h1>
        <p className="text-body text-[#3c4649]">
          {card.site}
          <br />
          Card as of {new Date(card.asOf).toLocaleString([], { dateStyle: 'medium', timeStyle: 'short' })}
        </p>
      </header>
      {card.buildUp ? (
        <CardBody card={card} buildUp={card.buildUp} />
      ) : (
        <p className="p-4">No floor is chosen for this job yet. Call the office.</p>
      )}
    </main>
  )
}

function CardBody({ card, buildUp }: { card: SiteCard; buildUp: JobBuildUp }) {
  const [slab, setSlab] = useState<Quantity>(card.conditions.slabTemperature)
  const [courseId, setCourseId] = useState(
    () => (buildUp.input.courses.find((course) => !isDry(course)) ?? buildUp.input.courses[0])?.id ?? '',
  )
  const [bayId, setBayId] = useState(card.bays[0]?.id ?? '')
  const [view, setView] = useState<View>('mix')
  const input = useMemo(
    () => ({ ...buildUp.input, conditions: { ...buildUp.input.conditions, slabTemperature: slab } }),
    [buildUp.input, slab],
  )
  const evaluation = useMemo(() => evaluate(input), [input])
  const course = input.courses.find(({ id }) => id === courseId)
  const result = evaluation.courses.find((one) => one.courseId === courseId)
  const mix = course?.mixId ? input.mixes[course.mixId] : undefined
  const bay = card.bays.find(({ id }) => id === bayId)
  if (!course || !result) return <p className="p-4">This floor has no courses. Call the office.</p>
  return (
    <>
      {buildUp.status === 'withdrawn' && (
        <p className="border-b-2 border-stop bg-card p-4 font-semibold text-stop">
          ■ The office has withdrawn this floor. Hold the work and call.
        </p>
      )}
      <div className="grid gap-3 px-4 pt-3">
        <CoursePicker courses={input.courses} courseId={courseId} onCourse={setCourseId} bays={card.bays} bayId={bayId} onBay={setBayId} />
      </div>
      {view === 'mix' && (
        <div className="grid gap-4 p-4">
          {!isDry(course) && <TemperatureStepper value={slab} onChange={setSlab} />}
          {mix ? (
            <>
              <MixPanel course={course} mix={mix} result={result} bay={bay} />
              <ClockPanel
                key={`${card.jobId} ${bayId} ${courseId}`}
                place={`${card.jobId} ${bayId} ${courseId}`}
                result={result}
                zone={card.timeZone}
              />
            </>
          ) : (
            <PrepPanel course={course} />
          )}
          {course.note && <p className="border-l-4 border-ink pl-3">{course.note}</p>}
          <p className="text-body text-[#3c4649]">
            Worked out at a slab of {formatRange({ min: slab.value, max: slab.value, unit: slab.unit })}. The sheet, the label and the
            competent person decide.
          </p>
        </div>
      )}
      {view === 'wear' && <WearPanel course={course} hazards={result.hazards} />}
      {view === 'aid' && <FirstAidPanel hazards={result.hazards} firm={card.firm} />}
      {view === 'sheets' && <SheetsPanel course={course} input={input} />}
      <nav aria-label="Card" className="no-print fixed inset-x-0 bottom-0 border-t-2 border-ink bg-card">
        <div className="mx-auto grid max-w-xl grid-cols-4 gap-3 p-3">
          {(Object.keys(views) as View[]).map((one) => (
            <button
              key={one}
              type="button"
              aria-pressed={view === one}
              onClick={() => setView(one)}
              className={`min-h-[64px] rounded-touch border-2 border-ink px-1 text-[17px] font-semibold ${view === one ? 'bg-ink text-white' : 'bg-card text-ink'}`}
            >
              {views[one]}
            </button>
          ))}
        </div>
      </nav>
    </>
  )
}
