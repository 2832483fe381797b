import type { Bay } from '../../../shared/domain/job.ts'
import { Button } from '../../ui/button.tsx'
import { QuantityField } from '../../ui/quantity-field.tsx'

interface JointFieldsProps {
  bay: Bay
  prefix: string
  fields: Record<string, string>
  disabled: boolean
  onChange: (bay: Bay) => void
}

const lengths = ['ft', 'm'] as const
const sections = ['in', 'mm'] as const
const areas = ['ft²', 'm²'] as const
type Joint = Bay['joints'][number]

/** Joints by length, width and depth; spalls by area and mean depth. Empty means none was surveyed. */
export function JointFields({ bay, prefix, fields, disabled, onChange }: JointFieldsProps) {
  const put = (index: number, joint: Joint) => onChange({ ...bay, joints: bay.joints.map((one, at) => (at === index ? joint : one)) })
  const add = () =>
    onChange({
      ...bay,
      joints: [
        ...bay.joints,
        { length: { value: 100, unit: 'ft' }, width: { value: 0.1875, unit: 'in' }, depth: { value: 2, unit: 'in' } },
      ],
    })
  const summary =
    [
      bay.joints.length > 0 && (bay.joints.length === 1 ? 'joints of one size' : `joints of ${bay.joints.length} sizes`),
      bay.spalls && 'spalls',
    ]
      .filter(Boolean)
      .join(', ') || 'none surveyed'
  return (
    <details className="mt-2">
      <summary className="cursor-pointer text-pencil">Joints and spalls: {summary}</summary>
      <div className="mt-2 grid gap-3">
        {bay.joints.map((joint, index) => (
          <div key={index} className="flex flex-wrap items-start gap-2">
            <QuantityField
              label="Length"
              name={`${prefix}.joints.${index}.length`}
              value={joint.length as { value: number; unit: 'ft' }}
              units={lengths}
              disabled={disabled}
              className="w-32"
              error={fields[`${prefix}.joints.${index}.length.value`]}
              onChange={(length) => length && put(index, { ...joint, length })}
            />
            <QuantityField
              label="Width"
              name={`${prefix}.joints.${index}.width`}
              value={joint.width as { value: number; unit: 'in' }}
              units={sections}
              disabled={disabled}
              className="w-32"
              error={fields[`${prefix}.joints.${index}.width.value`]}
              onChange={(width) => width && put(index, { ...joint, width })}
            />
            <QuantityField
              label="Depth"
              name={`${prefix}.joints.${index}.depth`}
              value={joint.depth as { value: number; unit: 'in' }}
              units={sections}
              disabled={disabled}
              className="w-32"
              error={fields[`${prefix}.joints.${index}.depth.value`]}
              onChange={(depth) => depth && put(index, { ...joint, depth })}
            />
            {!disabled && (
              <Button
                look="quiet"
                className="mt-7"
                onClick={() => onChange({ ...bay, joints: bay.joints.filter((_, at) => at !== index) })}
              >
                Remove
              </Button>
            )}
          </div>
        ))}
        {bay.spalls && (
          <div className="flex flex-wrap items-start gap-2">
            <QuantityField
              label="Spalled area"
              name={`${prefix}.spalls.area`}
              value={bay.spalls.area as { value: number; unit: 'ft²' }}
              units={areas}
              disabled={disabled}
              className="w-40"
              onChange={(area) => area && bay.spalls && onChange({ ...bay, spalls: { ...bay.spalls, area } })}
            />
            <QuantityField
              label="Mean depth"
              name={`${prefix}.spalls.meanDepth`}
              value={bay.spalls.meanDepth as { value: number; unit: 'in' }}
              units={sections}
              disabled={disabled}
              className="w-32"
              onChange={(meanDepth) => meanDepth && bay.spalls && onChange({ ...bay, spalls: { ...bay.spalls, meanDepth } })}
            />
            {!disabled && (
              <Button look="quiet" className="mt-7" onClick={() => onChange({ ...bay, spalls: null })}>
                Remove
              </Button>
            )}
          </div>
        )}
        {!disabled && (
          <span className="flex gap-2">
            <Button onClick={add}>Add joints</Button>
            {!bay.spalls && (
              <Button
                onClick={() => onChange({ ...bay, spalls: { area: { value: 10, unit: 'ft²' }, meanDepth: { value: 0.25, unit: 'in' } } })}
              >
                Add spalls
              </Button>
            )}
          </span>
        )}
      </div>
    </details>
  )
}
