import type { Course } from '../../../shared/domain/build-up.ts'
import { dryStages } from '../../../shared/domain/build-up.ts'
import { stageNames } from '../../../shared/domain/course.ts'
import type { CourseResult } from '../../../shared/domain/evaluation.ts'
import type { Finding, FindingStatus } from '../../../shared/domain/finding.ts'
import { formatWindowFigure } from '../../../shared/domain/format.ts'
import type { MixFacts } from '../../../shared/domain/mix.ts'
import { FigureView } from '../../ui/figure-view.tsx'
import { StatusMark } from '../../ui/status-mark.tsx'
import { CourseInputs } from './course-inputs.tsx'

export interface CourseRowProps {
  course: Course
  /** Counted from the slab. */
  number: number
  result: CourseResult | undefined
  mix: MixFacts | undefined
  findings: readonly Finding[]
  open: boolean
  lit: boolean
  /** Absent where nothing may be changed. */
  onChange?: (change: Partial<Course>) => void
  onToggle: () => void
  onLight: (on: boolean) => void
  /** Up is toward the wearing course. */
  onMove?: (by: 1 | -1) => void
}

const marked: FindingStatus[] = ['stop', 'caution', 'unknown']
export const isDry = (course: Course) => (dryStages as readonly string[]).includes(course.stage)

/** One course in a line: what it is, how thick, how long it can be worked and when the next may follow. */
export function CourseRow(props: CourseRowProps) {
  const { course, number, mix, findings, open, lit, onToggle, onLight, onMove } = props
  const statuses = marked.filter((status) => findings.some((finding) => finding.status === status))
  return (
    // eslint-disable-next-line jsx-a11y/no-static-element-interactions -- a key more for what the panel's buttons do, from anywhere in the row
    <div
      data-course={course.id}
      id={`course-${course.id}`}
      className={`grid grid-cols-[34px_minmax(0,1fr)_auto] items-center gap-x-2 gap-y-1 px-2 py-2 sm:px-3 lg:grid-cols-[34px_minmax(0,1fr)_134px_92px_118px_34px] lg:py-3 ${lit ? 'bg-resin-wash' : ''}`}
      onPointerEnter={() => onLight(true)}
      onPointerLeave={() => onLight(false)}
      onFocus={() => onLight(true)}
      onBlur={() => onLight(false)}
      onKeyDown={(event) => {
        if (!event.altKey || !onMove || (event.key !== 'ArrowUp' && event.key !== 'ArrowDown')) return
        event.preventDefault()
        onMove(event.key === 'ArrowUp' ? 1 : -1)
      }}
    >
      <span className="self-start pt-0.5 text-right text-pencil lg:self-center lg:pt-0">{number}</span>
      <div className="min-w-0">
        <button
          type="button"
          aria-expanded={open}
          aria-controls={`panel-${course.id}`}
          onClick={onToggle}
          className="text-left font-semibold break-words hover:underline"
        >
          {course.title}
        </button>
        <p className="text-small text-pencil">{described(course, mix)}</p>
        {statuses.length > 0 && (
          <span className="mt-0.5 flex gap-2 text-small">
            {statuses.map((status) => (
              <StatusMark key={status} status={status} />
            ))}
          </span>
        )}
      </div>
      <button
        type="button"
        onClick={onToggle}
        tabIndex={-1}
        aria-hidden="true"
        className="no-print min-h-8 min-w-8 self-start text-pencil hover:text-ink lg:order-last lg:self-center"
      >
        {open ? '▴' : '▾'}
      </button>
      <RowFigures {...props} />
    </div>
  )
}

function RowFigures({ course, result, onChange }: CourseRowProps) {
  if (isDry(course)) {
    return (
      <div className="col-start-2 text-small lg:col-span-3 lg:col-start-auto lg:text-right lg:text-body">
        {course.preparation?.profile ? `CSP ${course.preparation.profile}` : <span className="text-pencil">no profile asked for</span>}
      </div>
    )
  }
  return (
    <div className="col-span-2 col-start-2 flex flex-wrap items-start justify-between gap-x-4 gap-y-1 lg:contents">
      <div className="lg:text-right">
        {onChange ? <CourseInputs course={course} result={result} onChange={onChange} /> : <FixedFilm result={result} />}
      </div>
      <div className="flex flex-col items-end gap-1 sm:contents">
        <Labelled label="pot life">{result && <FigureView figure={result.potLife} />}</Labelled>
        <Labelled label="window for the next">
          {result && <FigureView figure={result.window} text={formatWindowFigure(result.window)} />}
        </Labelled>
      </div>
    </div>
  )
}

function FixedFilm({ result }: { result: CourseResult | undefined }) {
  if (!result) return null
  return (
    <div className="flex flex-col gap-1.5 lg:items-end">
      <span>
        <FigureView figure={result.wetFilm} /> wet
      </span>
      <span className="text-small text-pencil">
        <FigureView figure={result.spreadRate} />
      </span>
    </div>
  )
}

function Labelled({ label, children }: { label: string; children: React.ReactNode }) {
  return (
    <div className="text-right">
      {children}
      <div className="text-small text-pencil">{label}</div>
    </div>
  )
}

/** What lies under the title: the mix, the method, or what is still to be chosen. */
function described(course: Course, mix: MixFacts | undefined): string {
  const sand = [course.filler && 'filled', course.broadcast && (course.broadcast.toRefusal ? 'broadcast to refusal' : 'broadcast')].filter(
    Boolean,
  )
  if (isDry(course)) return course.preparation?.method ?? `${stageNames[course.stage].name}: no method chosen`
  if (course.mixId && !mix) return 'Loading the mix …'
  return [mix ? `${mix.name}, ${mix.maker}` : 'no mix chosen', ...sand].join(', ')
}
