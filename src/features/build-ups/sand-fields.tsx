import { useState } from 'react'
import type { Course } from '../../../shared/domain/build-up.ts'
import type { Quantity } from '../../../shared/domain/units.ts'
import { QuantityField } from '../../ui/quantity-field.tsx'
import { AggregatePicker } from './catalogue-pickers.tsx'
import type { Choice } from './picker.tsx'

interface SandFieldsProps {
  course: Course
  nameOf: (productId: string) => string
  error: string | undefined
  onChange: (change: Partial<Course>) => void
}

/** A sand that was chosen but has no amount yet: it counts only with one. */
function useChosen(productId: string | undefined, nameOf: (productId: string) => string) {
  const [pending, setPending] = useState<Choice | null>(null)
  return { pending, setPending, chosen: productId ? { id: productId, name: nameOf(productId) } : pending }
}

const waiting = 'Give the amount: without it the sand is not counted.'

/** Sand mixed into the resin, by mass per volume of mixed liquid. */
export function FillerFields({ course, nameOf, error, onChange }: SandFieldsProps) {
  const { filler } = course
  const { pending, setPending, chosen } = useChosen(filler?.productId, nameOf)
  const choose = (choice: Choice | null) => {
    if (filler) onChange({ filler: choice && { ...filler, productId: choice.id } })
    setPending(filler ? null : choice)
  }
  const amount = (loading: Quantity<'lb/gal' | 'kg/L'> | null) => {
    if (!chosen) return
    setPending(loading ? null : { ...chosen, detail: '' })
    onChange({ filler: loading && { productId: chosen.id, loading } })
  }
  return (
    <>
      <AggregatePicker label="Sand in the pail" chosen={chosen} onChoose={choose} />
      <QuantityField
        label="Sand per mixed resin"
        name={`loading-${course.id}`}
        units={['lb/gal', 'kg/L'] as const}
        disabled={!chosen}
        help={pending ? waiting : ''}
        value={filler ? (filler.loading as Quantity<'lb/gal' | 'kg/L'>) : null}
        error={error}
        onChange={amount}
      />
    </>
  )
}

/** Sand thrown on the wet film, by mass per area. */
export function BroadcastFields({ course, nameOf, error, onChange }: SandFieldsProps) {
  const { broadcast } = course
  const { pending, setPending, chosen } = useChosen(broadcast?.productId, nameOf)
  const choose = (choice: Choice | null) => {
    if (broadcast) onChange({ broadcast: choice && { ...broadcast, productId: choice.id } })
    setPending(broadcast ? null : choice)
  }
  const amount = (rate: Quantity<'lb/ft²' | 'kg/m²'> | null) => {
    if (!chosen) return
    setPending(rate ? null : { ...chosen, detail: '' })
    onChange({ broadcast: rate && { productId: chosen.id, rate, toRefusal: broadcast?.toRefusal ?? false } })
  }
  return (
    <>
      <AggregatePicker label="Sand broadcast" chosen={chosen} onChoose={choose} />
      <div>
        <QuantityField
          label="Broadcast rate"
          name={`rate-${course.id}`}
          units={['lb/ft²', 'kg/m²'] as const}
          disabled={!chosen}
          help={pending ? waiting : ''}
          value={broadcast ? (broadcast.rate as Quantity<'lb/ft²' | 'kg/m²'>) : null}
          error={error}
          onChange={amount}
        />
        <label className="mt-2 flex items-center gap-2">
          <input
            type="checkbox"
            className="size-5 accent-resin"
            disabled={!broadcast}
            checked={broadcast?.toRefusal ?? false}
            onChange={(event) => broadcast && onChange({ broadcast: { ...broadcast, toRefusal: event.target.checked } })}
          />
          To refusal
        </label>
      </div>
    </>
  )
}
