import type { Job, JobBody } from '../../../shared/api/jobs.ts'
import { formatFigure, formatRange } from '../../../shared/domain/format.ts'
import { orderList } from '../../../shared/domain/order-list.ts'
import type { CourseQuantity } from '../../../shared/domain/quantities.ts'
import { FigureView, QuantityText } from '../../ui/figure-view.tsx'
import { Card, Notice } from '../../ui/page.tsx'
import { useUnitSystem } from '../../ui/unit-system.tsx'
import { useEvaluated } from './evaluated.ts'
import { OrderCard } from './order-card.tsx'

/** What the floor takes, course by course and bay by bay, and what is to be ordered for it. */
export function QuantitiesCards({ body, job }: { body: JobBody; job: Job | undefined }) {
  const worked = useEvaluated(body, job)
  if (!worked) return null
  if (body.bays.length === 0) {
    return (
      <Card title="Quantities">
        <Notice>Add a bay with its area to see what the floor takes.</Notice>
      </Card>
    )
  }
  return (
    <>
      <Card title="Quantities">
        {body.conditions.texture === null && (
          <p className="px-4 pt-3 text-pencil">The texture of the slab is not measured: the resin that it takes is not counted.</p>
        )}
        {[...worked.quantities].reverse().map((course) => (
          <CourseTable key={course.courseId} course={course} />
        ))}
      </Card>
      <OrderCard order={orderList(worked.quantities)} />
    </>
  )
}

const terms = ['film', 'texture', 'joints', 'spalls', 'loss'] as const
const termNames = { film: 'Film', texture: 'Texture', joints: 'Joints', spalls: 'Spalls', loss: 'Loss' } as const

function CourseTable({ course }: { course: CourseQuantity }) {
  const { system } = useUnitSystem()
  const shown = terms.filter((term) => course.bays.some((bay) => bay[term] !== null))
  return (
    <details className="border-b border-rule px-4 py-3 last:border-b-0">
      <summary className="flex cursor-pointer flex-wrap items-baseline justify-between gap-x-4">
        <span>
          <span className="font-semibold">{course.title}</span> <span className="text-pencil">{course.mix.name}</span>
        </span>
        <span className="text-right">
          {formatFigure(course.total, system)} <span className="text-pencil">mixed</span>
        </span>
      </summary>
      <div className="mt-2 overflow-x-auto">
        <table className="w-full text-right text-small">
          <thead>
            <tr className="border-b border-rule text-pencil">
              <th scope="col" className="py-1 text-left font-normal">
                Bay
              </th>
              <th scope="col" className="font-normal">
                Area
              </th>
              {shown.map((term) => (
                <th key={term} scope="col" className="font-normal">
                  {termNames[term]}
                </th>
              ))}
              <th scope="col" className="font-normal">
                Total
              </th>
            </tr>
          </thead>
          <tbody>
            {course.bays.map((bay) => (
              <tr key={bay.bayId} className="border-b border-rule">
                <th scope="row" className="py-1 text-left font-normal">
                  {bay.name}
                </th>
                <td>
                  <QuantityText {...bay.area} />
                </td>
                {shown.map((term) => {
                  const figure = bay[term]
                  return <td key={term}>{figure ? <FigureView figure={figure} /> : '–'}</td>
                })}
                <td>
                  <FigureView figure={bay.total} />
                </td>
              </tr>
            ))}
          </tbody>
        </table>
      </div>
      <CourseParts course={course} />
    </details>
  )
}

const splitWords = { allowed: 'The sheet allows part kits.', forbidden: 'The sheet forbids part kits: whole kits for each bay.' } as const

/** Components, sand and kits of a course. */
function CourseParts({ course }: { course: CourseQuantity }) {
  const { packing } = course
  const word =
    packing.partKits in splitWords
      ? splitWords[packing.partKits as keyof typeof splitWords]
      : 'No sheet says whether kits may be split: whole kits for each bay.'
  return (
    <div className="mt-2 text-small">
      {course.parts.map((part) => (
        <div key={part.part}>
          {course.parts.length > 1 && `${part.part}: `}
          {part.name}, <FigureView figure={part.volume} />, <FigureView figure={part.mass} />
        </div>
      ))}
      {course.aggregates.map((sand) => (
        <div key={`${sand.use} ${sand.product.id}`}>
          {sand.product.name} as {sand.use}: <FigureView figure={sand.mass} />
        </div>
      ))}
      <p>
        {packing.plan
          ? `${packing.plan.lines.map(({ pack, count }) => `${count} × ${formatRange({ min: pack.size.value, max: pack.size.value, unit: pack.size.unit })}`).join(' + ')}, ${formatRange({ min: packing.plan.leftover.value, max: packing.plan.leftover.value, unit: packing.plan.leftover.unit })} left over.`
          : 'No pack size is stated, or the amount is not known: kits cannot be counted.'}{' '}
        <span className="text-pencil">{word}</span>
      </p>
    </div>
  )
}
