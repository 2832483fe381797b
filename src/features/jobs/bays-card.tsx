import type { JobBody } from '../../../shared/api/jobs.ts'
import { type Bay } from '../../../shared/domain/job.ts'
import { convert } from '../../../shared/domain/units.ts'
import { Button } from '../../ui/button.tsx'
import { TextField } from '../../ui/field.tsx'
import { Card, Notice } from '../../ui/page.tsx'
import { QuantityField } from '../../ui/quantity-field.tsx'
import type { JobFormPart } from './job-form-part.ts'
import { JointFields } from './joint-fields.tsx'
import { freshBayId } from './job-body.ts'

/** Total area in the unit of the first bay. */
function totalOf(bays: JobBody['bays']): string {
  const unit = bays[0]?.area.unit ?? 'ft²'
  const total = bays.reduce((sum, bay) => sum + convert(bay.area, unit).value, 0)
  return `${total.toLocaleString('en-US', { maximumFractionDigits: 1 })} ${unit}`
}

/** The parts the floor is poured in, each with its joints and spalls as surveyed. */
export function BaysCard({ body, change, fields, disabled }: JobFormPart) {
  const { bays } = body
  const put = (index: number, bay: Bay) => change({ bays: bays.map((one, at) => (at === index ? bay : one)) })
  const add = () => {
    const last = bays.at(-1)
    change({
      bays: [
        ...bays,
        { id: freshBayId(bays), name: `Bay ${bays.length + 1}`, area: last?.area ?? { value: 500, unit: 'ft²' }, joints: [], spalls: null },
      ],
    })
  }
  return (
    <Card title="Bays" actions={<span className="text-pencil">{bays.length > 0 && `${bays.length}, ${totalOf(bays)} in all`}</span>}>
      {bays.length === 0 && <Notice>No bays yet. Quantities need at least one with its area.</Notice>}
      {fields['bays'] && <p className="px-4 pt-3 font-semibold text-stop">{fields['bays']}</p>}
      <ol>
        {bays.map((bay, index) => (
          <li key={bay.id} className="border-b border-rule px-4 py-3">
            <div className="flex flex-wrap items-start gap-3">
              <TextField
                label="Bay"
                name={`bays.${index}.name`}
                value={bay.name}
                disabled={disabled}
                error={fields[`bays.${index}.name`]}
                className="w-32"
                onChange={(event) => put(index, { ...bay, name: event.target.value })}
              />
              <QuantityField
                label="Area"
                name={`bays.${index}.area.value`}
                value={bay.area}
                units={['ft²', 'm²']}
                disabled={disabled}
                className="w-44"
                error={fields[`bays.${index}.area.value`]}
                onChange={(area) => area && put(index, { ...bay, area })}
              />
              {!disabled && (
                <Button look="quiet" className="mt-7" onClick={() => change({ bays: bays.filter((_, at) => at !== index) })}>
                  Remove
                </Button>
              )}
            </div>
            <JointFields bay={bay} prefix={`bays.${index}`} fields={fields} disabled={disabled} onChange={(next) => put(index, next)} />
          </li>
        ))}
      </ol>
      {!disabled && (
        <div className="p-4">
          <Button onClick={add}>Add a bay</Button>
        </div>
      )}
    </Card>
  )
}
