import { useState } from 'react'
import type { Course } from '../../../shared/domain/build-up.ts'
import type { CourseResult } from '../../../shared/domain/evaluation.ts'
import type { Figure } from '../../../shared/domain/figure.ts'
import { formatNumber, shownUnit, unitText } from '../../../shared/domain/format.ts'
import { type Unit, convert } from '../../../shared/domain/units.ts'
import { numberOf } from '../../ui/number-field.tsx'
import { useUnitSystem } from '../../ui/unit-system.tsx'

type Thickness = NonNullable<Course['thickness']>
type SpreadRate = NonNullable<Course['spreadRate']>

interface InlineNumberProps {
  label: string
  /** Null: nothing known; shown as an empty place to type in. */
  value: number | null
  unit: string
  /** Worked out from the other of the pair, not typed. */
  computed: boolean
  explains?: string | undefined
  onChange: (value: number | null) => void
}

/** A number typed in its place in the row. What is worked out stands in grey until typed over. */
function InlineNumber({ label, value, unit, computed, explains, onChange }: InlineNumberProps) {
  const [text, setText] = useState<string | null>(null)
  const shown = text ?? (value === null ? '' : formatNumber(value))
  const wrong = text !== null && (numberOf(text) === undefined || (numberOf(text) ?? 1) <= 0)
  return (
    <span className="inline-flex items-baseline justify-end gap-1">
      <input
        aria-label={label}
        inputMode="decimal"
        autoComplete="off"
        value={shown}
        placeholder="–"
        title={explains}
        aria-invalid={wrong || undefined}
        className={`w-16 border-b bg-transparent px-1 py-0.5 text-right hover:bg-resin-wash focus:bg-card ${wrong ? 'border-2 border-stop' : computed ? 'border-dashed border-rule text-pencil' : 'border-pencil text-ink'}`}
        onFocus={(event) => event.target.select()}
        onBlur={() => setText(null)}
        onChange={(event) => {
          setText(event.target.value)
          const number = numberOf(event.target.value)
          if (number === null || (number !== undefined && number > 0 && number <= 100_000)) onChange(number)
        }}
      />
      <span className="w-14 text-left whitespace-nowrap text-pencil">{unit}</span>
    </span>
  )
}

/** The middle of a figure in a unit; null when it is not known. */
function middleIn(figure: Figure | undefined, unit: Unit): number | null {
  if (!figure || figure.kind === 'not-stated') return null
  const { min, max } = figure.value
  const middle = min !== undefined && max !== undefined ? (min + max) / 2 : (min ?? max)
  return middle === undefined ? null : convert({ value: middle, unit: figure.value.unit }, unit).value
}

interface CourseInputsProps {
  course: Course
  result: CourseResult | undefined
  onChange: (change: Partial<Course>) => void
}

/** Thickness and spread rate side by side: either gives the other. */
export function CourseInputs({ course, result, onChange }: CourseInputsProps) {
  const { system } = useUnitSystem()
  const { thickness, spreadRate } = course
  const lengthUnit = shownUnit(
    thickness?.unit ?? (system === 'si' || spreadRate?.unit === 'm²/L' ? 'µm' : 'mil'),
    system,
  ) as Thickness['unit']
  const spreadUnit = shownUnit(
    spreadRate?.unit ?? (system === 'si' || thickness?.unit === 'µm' || thickness?.unit === 'mm' ? 'm²/L' : 'ft²/gal'),
    system,
  ) as SpreadRate['unit']
  const film = thickness?.film ?? 'wet'
  const figure = film === 'wet' ? result?.wetFilm : result?.dryFilm
  const typedLength = thickness && convert({ value: thickness.value, unit: thickness.unit }, lengthUnit).value
  const typedSpread = spreadRate && convert({ value: spreadRate.value, unit: spreadRate.unit }, spreadUnit).value
  return (
    <div className="flex flex-col items-end text-right">
      <InlineNumber
        label={`Thickness of ${course.title}, ${lengthUnit} ${film}`}
        unit={`${lengthUnit} ${film}`}
        value={typedLength ?? middleIn(figure, lengthUnit)}
        computed={!thickness}
        explains={sumOf(figure, !thickness)}
        onChange={(value) =>
          onChange(value === null ? { thickness: null } : { thickness: { value, unit: lengthUnit, film }, spreadRate: null })
        }
      />
      <InlineNumber
        label={`Spread rate of ${course.title}, ${spreadUnit}`}
        unit={unitText(spreadUnit)}
        value={typedSpread ?? middleIn(result?.spreadRate, spreadUnit)}
        computed={!spreadRate}
        explains={sumOf(result?.spreadRate, !spreadRate)}
        onChange={(value) => onChange(value === null ? { spreadRate: null } : { spreadRate: { value, unit: spreadUnit }, thickness: null })}
      />
    </div>
  )
}

const sumOf = (figure: Figure | undefined, computed: boolean) => (computed && figure?.kind === 'computed' ? figure.working.sum : undefined)
