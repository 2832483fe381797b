import { type RefObject, useState } from 'react'
import { type Stage, stages } from '../../../shared/domain/build-up.ts'
import { stageNames } from '../../../shared/domain/course.ts'
import { Button } from '../../ui/button.tsx'
import { CourseEditor } from './course-editor.tsx'
import { CourseFigures } from './course-figures.tsx'
import { CourseRow } from './course-row.tsx'
import type { BuilderView } from './builder-view.ts'
import { courseId } from './work.ts'

interface CourseListProps {
  view: BuilderView
  list: RefObject<HTMLOListElement | null>
  lit: string | null
  onLight: (courseId: string | null) => void
  open: string | null
  onOpen: (courseId: string | null) => void
}

/** The courses, the wearing course on top, each with its panel; a draft's can be moved by button, by Alt and arrows, and by drag. */
export function CourseList({ view, list, lit, onLight, open, onOpen }: CourseListProps) {
  const { work, input, evaluation, dispatch, fields } = view
  const [dragged, setDragged] = useState<string | null>(null)
  const [over, setOver] = useState<string | null>(null)
  const falling = work.courses.map((course, index) => ({ course, index })).reverse()
  const drop = (id: string) => {
    const to = work.courses.findIndex((course) => course.id === id)
    if (dragged && to >= 0) dispatch?.({ kind: 'move', id: dragged, to })
    setDragged(null)
    setOver(null)
  }
  return (
    <ol ref={list} className="min-w-0 list-none self-start">
      {falling.map(({ course, index }) => (
        <li
          key={course.id}
          className={`break-inside-avoid border-b border-rule ${over === course.id && dragged !== course.id ? 'outline-2 -outline-offset-2 outline-resin' : ''} ${dragged === course.id ? 'opacity-50' : ''}`}
          onDragOver={(event) => {
            if (!dragged) return
            event.preventDefault()
            setOver(course.id)
          }}
          onDrop={() => drop(course.id)}
        >
          <div className="flex items-stretch">
            {dispatch && <DragHandle id={course.id} onDrag={setDragged} />}
            <div className="min-w-0 flex-1">
              <CourseRow
                course={course}
                number={index + 1}
                result={evaluation.courses.find((one) => one.courseId === course.id)}
                mix={course.mixId ? input.mixes[course.mixId] : undefined}
                findings={evaluation.findings.filter((finding) => finding.courseId === course.id)}
                open={open === course.id}
                lit={lit === course.id}
                onToggle={() => onOpen(open === course.id ? null : course.id)}
                onLight={(on) => onLight(on ? course.id : null)}
                {...(dispatch
                  ? {
                      onChange: (change) => dispatch({ kind: 'change', id: course.id, change }),
                      onMove: (by: 1 | -1) => dispatch({ kind: 'move', id: course.id, to: index + by }),
                    }
                  : {})}
              />
            </div>
          </div>
          {open === course.id && <CoursePanel view={view} index={index} fields={fieldsOf(fields, index)} onOpen={onOpen} />}
        </li>
      ))}
      {work.courses.length === 0 && (
        <li className="px-4 py-6 text-pencil">
          No courses yet. A floor begins at the slab: add its preparation first, then what goes on it.
        </li>
      )}
      {dispatch && (
        <li className="no-print px-4 py-3">
          <AddCourse
            onAdd={(stage) => {
              const id = courseId()
              dispatch({ kind: 'add', stage, id, at: work.courses.length })
              onOpen(id)
            }}
          />
        </li>
      )}
    </ol>
  )
}

/** The problems of one course, by its own fields. */
function fieldsOf(fields: Record<string, string>, index: number): Record<string, string> {
  const start = `courses.${index}.`
  return Object.fromEntries(
    Object.entries(fields).flatMap(([name, says]) => (name.startsWith(start) ? [[name.slice(start.length), says]] : [])),
  )
}

function DragHandle({ id, onDrag }: { id: string; onDrag: (id: string | null) => void }) {
  return (
    <span
      draggable
      aria-hidden="true"
      title="Drag to move"
      className="no-print hidden w-4 shrink-0 cursor-grab items-center justify-center text-pencil select-none lg:flex"
      onDragStart={(event) => {
        event.dataTransfer.effectAllowed = 'move'
        event.dataTransfer.setData('text/plain', id)
        onDrag(id)
      }}
      onDragEnd={() => onDrag(null)}
    >
      ⠿
    </span>
  )
}

function AddCourse({ onAdd }: { onAdd: (stage: Stage) => void }) {
  return (
    <div className="flex flex-wrap items-center gap-x-3 gap-y-1">
      <span className="font-semibold">Add on top</span>
      {stages.map((stage) => (
        <button key={stage} type="button" className="min-h-8 text-resin underline-offset-4 hover:underline" onClick={() => onAdd(stage)}>
          {stageNames[stage].name.toLowerCase()}
        </button>
      ))}
    </div>
  )
}

interface CoursePanelProps {
  view: BuilderView
  index: number
  fields: Record<string, string>
  onOpen: (courseId: string | null) => void
}

function CoursePanel({ view, index, fields, onOpen }: CoursePanelProps) {
  const { work, input, evaluation, dispatch } = view
  const course = work.courses[index]
  if (!course) return null
  const result = evaluation.courses.find((one) => one.courseId === course.id)
  const edit = (change: Parameters<typeof CourseEditor>[0]['onChange'] extends (change: infer C) => void ? C : never) =>
    dispatch?.({ kind: 'change', id: course.id, change })
  return (
    <div id={`panel-${course.id}`} className="border-t border-rule bg-paper/60 px-4 py-4 lg:pl-14">
      {dispatch && (
        <>
          <CourseEditor course={course} facts={input} onChange={edit} fields={fields} />
          <CourseActions view={view} index={index} onOpen={onOpen} />
        </>
      )}
      {!dispatch && course.note && <p className="mb-3">{course.note}</p>}
      {result && <CourseFigures result={result} />}
    </div>
  )
}

function CourseActions({ view, index, onOpen }: Pick<CoursePanelProps, 'view' | 'index' | 'onOpen'>) {
  const { work, dispatch } = view
  const course = work.courses[index]
  if (!course || !dispatch) return null
  const { id } = course
  return (
    <div className="no-print my-4 flex flex-wrap gap-2 border-b border-rule pb-4">
      <Button
        disabled={index === work.courses.length - 1}
        onClick={() => dispatch({ kind: 'move', id, to: index + 1 })}
        title="Alt and arrow up"
      >
        Move up
      </Button>
      <Button disabled={index === 0} onClick={() => dispatch({ kind: 'move', id, to: index - 1 })} title="Alt and arrow down">
        Move down
      </Button>
      <Button
        onClick={() => {
          const newId = courseId()
          dispatch({ kind: 'duplicate', id, newId })
          onOpen(newId)
        }}
      >
        Duplicate
      </Button>
      <Button
        onClick={() => {
          const newId = courseId()
          dispatch({ kind: 'add', stage: course.stage, id: newId, at: index })
          onOpen(newId)
        }}
      >
        Add one beneath
      </Button>
      <Button
        look="stop"
        className="ml-auto"
        onClick={() => {
          dispatch({ kind: 'remove', id })
          onOpen(null)
        }}
      >
        Remove
      </Button>
    </div>
  )
}
