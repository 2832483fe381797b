import type { Quantity } from '../../../shared/domain/units.ts'
import { vocPlaces } from '../../../shared/reference/voc-limits.ts'
import { SelectField } from '../../ui/field.tsx'
import { NumberField } from '../../ui/number-field.tsx'
import { Card } from '../../ui/page.tsx'
import { QuantityField } from '../../ui/quantity-field.tsx'
import type { JobFormPart } from './job-form-part.ts'

const degrees = ['°F', '°C'] as const
type Degrees = Quantity<'°F' | '°C'>

/** What was measured or is expected on this floor, and how much is lost on the way to it. */
export function ConditionsCard({ body, change, fields, disabled }: JobFormPart) {
  const { conditions, loss } = body
  const set = (part: Partial<typeof conditions>) => change({ conditions: { ...conditions, ...part } })
  const error = (name: string) => fields[`conditions.${name}`] ?? fields[`conditions.${name}.value`]
  return (
    <Card title="Conditions">
      <div className="grid gap-4 p-4 sm:grid-cols-2">
        <QuantityField
          label="Slab temperature"
          name="conditions.slabTemperature.value"
          value={conditions.slabTemperature as Degrees}
          units={degrees}
          disabled={disabled}
          error={error('slabTemperature')}
          onChange={(slabTemperature) => slabTemperature && set({ slabTemperature })}
        />
        <QuantityField
          label="Air temperature"
          name="conditions.airTemperature.value"
          value={conditions.airTemperature as Degrees}
          units={degrees}
          disabled={disabled}
          error={error('airTemperature')}
          onChange={(airTemperature) => airTemperature && set({ airTemperature })}
        />
        <NumberField
          label="Humidity of the air"
          name="conditions.relativeHumidity"
          unit="% RH"
          value={conditions.relativeHumidity}
          disabled={disabled}
          error={error('relativeHumidity')}
          onChange={(relativeHumidity) => relativeHumidity !== null && set({ relativeHumidity })}
        />
        <NumberField
          label="Humidity in the slab"
          name="conditions.substrateRelativeHumidity"
          unit="% RH"
          help="ASTM F2170. Empty: not measured."
          value={conditions.substrateRelativeHumidity}
          disabled={disabled}
          error={error('substrateRelativeHumidity')}
          onChange={(substrateRelativeHumidity) => set({ substrateRelativeHumidity })}
        />
        <QuantityField
          label="Moisture emission rate"
          name="conditions.moistureEmission.value"
          units={['lb/1000 ft²·24 h', 'g/m²·24 h']}
          help="ASTM F1869. Empty: not measured."
          value={conditions.moistureEmission as Quantity<'lb/1000 ft²·24 h'> | null}
          disabled={disabled}
          error={error('moistureEmission')}
          onChange={(moistureEmission) => set({ moistureEmission })}
        />
        <QuantityField
          label="Texture of the prepared slab"
          name="conditions.texture.value"
          units={['mil', 'mm', 'µm']}
          help="Mean depth by sand patch (ASTM E965). Empty: not measured."
          value={conditions.texture as Quantity<'mil'> | null}
          disabled={disabled}
          error={error('texture')}
          onChange={(texture) => set({ texture })}
        />
        <SelectField
          label="VOC rules of"
          name="conditions.vocPlace"
          value={conditions.vocPlace ?? ''}
          disabled={disabled}
          error={error('vocPlace')}
          onChange={(event) => set({ vocPlace: event.target.value || null })}
        >
          <option value="">No place chosen</option>
          {vocPlaces.map((place) => (
            <option key={place.id} value={place.id}>
              {place.name}
            </option>
          ))}
        </SelectField>
        <div className="flex items-start gap-2">
          <NumberField
            label="Loss"
            name="loss.percent"
            unit="%"
            className="w-28"
            value={loss.percent}
            disabled={disabled}
            error={fields['loss.percent']}
            onChange={(percent) => percent !== null && change({ loss: { ...loss, percent } })}
          />
          <SelectField
            label="Loss is meant as"
            name="loss.convention"
            value={loss.convention}
            disabled={disabled}
            className="flex-1"
            onChange={(event) => change({ loss: { ...loss, convention: event.target.value === 'added' ? 'added' : 'lost' } })}
          >
            <option value="lost">a fraction lost (÷ {(1 - loss.percent / 100).toFixed(2)})</option>
            <option value="added">an addition (× {(1 + loss.percent / 100).toFixed(2)})</option>
          </SelectField>
        </div>
      </div>
    </Card>
  )
}
