import type { Course } from '../../../shared/domain/build-up.ts'
import type { Bay } from '../../../shared/domain/job.ts'
import { TouchButton } from './touch-button.tsx'

interface CoursePickerProps {
  courses: readonly Course[]
  courseId: string
  onCourse: (id: string) => void
  bays: readonly Bay[]
  bayId: string
  onBay: (id: string) => void
}

/** The course and the bay at hand, one step back or on at a time. */
export function CoursePicker({ courses, courseId, onCourse, bays, bayId, onBay }: CoursePickerProps) {
  return (
    <>
      <Stepper
        what="course"
        items={courses.map(({ id, title }, index) => ({ id, name: title, under: `Course ${index + 1} of ${courses.length}` }))}
        current={courseId}
        onPick={onCourse}
      />
      {bays.length > 0 && (
        <Stepper
          what="bay"
          current={bayId}
          onPick={onBay}
          items={bays.map(({ id, name, area }) => ({ id, name, under: `${area.value.toLocaleString('en-US')} ${area.unit}` }))}
        />
      )}
    </>
  )
}

interface StepperProps {
  what: string
  items: { id: string; name: string; under: string }[]
  current: string
  onPick: (id: string) => void
}

function Stepper({ what, items, current, onPick }: StepperProps) {
  const at = items.findIndex(({ id }) => id === current)
  const item = items[at]
  const step = (by: number) => {
    const next = items[at + by]
    if (next) onPick(next.id)
  }
  return (
    <div className="grid grid-cols-[64px_minmax(0,1fr)_64px] items-center gap-3">
      <TouchButton aria-label={`Previous ${what}`} disabled={at <= 0} onClick={() => step(-1)}>
        ‹
      </TouchButton>
      <p className="text-center" aria-live="polite">
        <span className="block font-semibold">{item?.name}</span>
        <span className="block text-body text-[#3c4649]">{item?.under}</span>
      </p>
      <TouchButton aria-label={`Next ${what}`} disabled={at >= items.length - 1} onClick={() => step(1)}>
        ›
      </TouchButton>
    </div>
  )
}
