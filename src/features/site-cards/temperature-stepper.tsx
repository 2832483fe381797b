import { formatNumber, unitText } from '../../../shared/domain/format.ts'
import type { Quantity } from '../../../shared/domain/units.ts'
import { TouchButton } from './touch-button.tsx'

/** The slab's temperature as measured, by taps alone. */
export function TemperatureStepper({ value, onChange }: { value: Quantity; onChange: (value: Quantity) => void }) {
  const step = (by: number) => onChange({ value: Math.round(value.value) + by, unit: value.unit })
  return (
    <section
      aria-label="Slab temperature"
      className="grid grid-cols-[64px_minmax(0,1fr)_64px] items-center gap-3 border-y-2 border-ink py-3"
    >
      <TouchButton aria-label="One degree colder" onClick={() => step(-1)}>
        −
      </TouchButton>
      <p className="text-center" aria-live="polite">
        <span className="block text-body">Slab, as measured</span>
        <span className="text-site-figure font-bold">
          {formatNumber(value.value, 1)} {unitText(value.unit)}
        </span>
      </p>
      <TouchButton aria-label="One degree warmer" onClick={() => step(1)}>
        +
      </TouchButton>
    </section>
  )
}
