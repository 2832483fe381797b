import { type Course, type EvaluationInput, preparationMethods, stages } from '../../../shared/domain/build-up.ts'
import { stageNames } from '../../../shared/domain/course.ts'
import { AreaField, SelectField, TextField } from '../../ui/field.tsx'
import { NumberField } from '../../ui/number-field.tsx'
import { QuantityField } from '../../ui/quantity-field.tsx'
import { MixPicker } from './catalogue-pickers.tsx'
import { isDry } from './course-row.tsx'
import { BroadcastFields, FillerFields } from './sand-fields.tsx'

interface CourseEditorProps {
  course: Course
  facts: Pick<EvaluationInput, 'mixes' | 'products'>
  onChange: (change: Partial<Course>) => void
  /** What the last save refused, by field of the course. */
  fields: Record<string, string>
}

/** All that can be said of a course. Every change counts at once. */
export function CourseEditor({ course, facts, onChange, fields }: CourseEditorProps) {
  const dry = isDry(course)
  return (
    <div className="grid gap-4 sm:grid-cols-2">
      <TextField
        label="Title"
        name={`title-${course.id}`}
        value={course.title}
        maxLength={120}
        error={fields['title']}
        onChange={(event) => onChange({ title: event.target.value })}
      />
      <SelectField
        label="Stage"
        name={`stage-${course.id}`}
        value={course.stage}
        onChange={(event) => onChange({ stage: stages.find((stage) => stage === event.target.value) ?? course.stage })}
      >
        {stages.map((stage) => (
          <option key={stage} value={stage}>
            {stageNames[stage].name}
          </option>
        ))}
      </SelectField>
      {dry ? (
        <PreparationFields course={course} onChange={onChange} />
      ) : (
        <WetFields course={course} facts={facts} onChange={onChange} fields={fields} />
      )}
      <NumberField
        label="Starts"
        name={`start-${course.id}`}
        unit="h"
        value={course.startsAfter}
        help="Hours after the floor’s first course. Empty: as soon as the course beneath allows."
        error={fields['startsAfter']}
        onChange={(startsAfter) => onChange({ startsAfter })}
      />
      <AreaField
        label="Note"
        name={`note-${course.id}`}
        rows={2}
        value={course.note}
        error={fields['note']}
        onChange={(event) => onChange({ note: event.target.value })}
      />
    </div>
  )
}

type FieldsProps = Pick<CourseEditorProps, 'course' | 'onChange'>

function PreparationFields({ course, onChange }: FieldsProps) {
  const { preparation } = course
  return (
    <>
      <SelectField
        label="Method"
        name={`method-${course.id}`}
        value={preparation?.method ?? ''}
        onChange={(event) => {
          const method = preparationMethods.find((one) => one === event.target.value)
          onChange({ preparation: method ? { ...preparation, method } : null })
        }}
      >
        <option value="">none chosen</option>
        {preparationMethods.map((method) => (
          <option key={method}>{method}</option>
        ))}
      </SelectField>
      <SelectField
        label="Concrete surface profile"
        name={`profile-${course.id}`}
        value={preparation?.profile ?? ''}
        disabled={!preparation}
        help={preparation ? undefined : 'Choose a method first.'}
        onChange={(event) => {
          if (!preparation) return
          const { method } = preparation
          onChange({ preparation: event.target.value ? { method, profile: Number(event.target.value) } : { method } })
        }}
      >
        <option value="">not asked for</option>
        {Array.from({ length: 10 }, (_, index) => (
          <option key={index} value={index + 1}>
            CSP {index + 1}
          </option>
        ))}
      </SelectField>
    </>
  )
}

function WetFields({ course, facts, onChange, fields }: CourseEditorProps) {
  const { thickness, spreadRate } = course
  const name = (id: string) => facts.products[id]?.name ?? 'Loading …'
  return (
    <>
      <div className="sm:col-span-2">
        <MixPicker
          chosen={course.mixId ? { id: course.mixId, name: facts.mixes[course.mixId]?.name ?? 'Loading …' } : null}
          onChoose={(mixId) => onChange({ mixId })}
        />
      </div>
      <div className="flex items-start gap-2">
        <QuantityField
          label="Thickness"
          name={`thickness-${course.id}`}
          className="flex-1"
          units={['mil', 'in', 'µm', 'mm'] as const}
          value={thickness}
          error={fields['thickness']}
          onChange={(value) =>
            onChange(value ? { thickness: { ...value, film: thickness?.film ?? 'wet' }, spreadRate: null } : { thickness: null })
          }
        />
        <SelectField
          label="Film"
          name={`film-${course.id}`}
          value={thickness?.film ?? 'wet'}
          disabled={!thickness}
          onChange={(event) => thickness && onChange({ thickness: { ...thickness, film: event.target.value === 'dry' ? 'dry' : 'wet' } })}
        >
          <option>wet</option>
          <option>dry</option>
        </SelectField>
      </div>
      <QuantityField
        label="Or spread rate"
        name={`spread-${course.id}`}
        units={['ft²/gal', 'm²/L'] as const}
        value={spreadRate}
        error={fields['spreadRate']}
        help="Either gives the other."
        onChange={(value) => onChange(value ? { spreadRate: value, thickness: null } : { spreadRate: null })}
      />
      <FillerFields course={course} nameOf={name} error={fields['filler.loading'] ?? fields['filler.loading.value']} onChange={onChange} />
      <BroadcastFields
        course={course}
        nameOf={name}
        error={fields['broadcast.rate'] ?? fields['broadcast.rate.value']}
        onChange={onChange}
      />
    </>
  )
}
