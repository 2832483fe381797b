import type { DraftPart } from './draft-part.ts'
import { definitionOf } from '../../../shared/domain/property.ts'
import { AreaField, SelectField, TextField } from '../../ui/field.tsx'
import { ConditionFields } from './condition-fields.tsx'
import { RangeFields } from './range-fields.tsx'
import { type ValueDraft, unitsFor } from './value-text.ts'

/** The inputs of a value, by the form of its property, with its conditions. */
export function ValueFields({ parts, ...part }: DraftPart & { parts: readonly string[] }) {
  const { draft, change, fields } = part
  const { form, byPart } = definitionOf(draft.property)
  return (
    <>
      {byPart && parts.length > 1 && (
        <SelectField
          label="Said of"
          name="statement.part"
          value={draft.part}
          error={fields['statement.part']}
          onChange={(event) => change({ part: event.target.value as ValueDraft['part'] })}
          className="max-w-xs"
        >
          <option value="mixed">the mix as a whole</option>
          {parts.map((letter) => (
            <option key={letter} value={letter}>
              part {letter}
            </option>
          ))}
        </SelectField>
      )}
      <FormFields {...part} />
      {(form === 'quantity' || form === 'window') && <ConditionFields key={draft.property} {...part} />}
    </>
  )
}

/** Words that a standard sets are chosen, not typed. */
const choices: Partial<Record<ValueDraft['property'], readonly string[]>> = {
  signalWord: ['Danger', 'Warning'],
  packingGroup: ['I', 'II', 'III'],
}
const examples: Partial<Record<ValueDraft['property'], string>> = {
  unNumber: 'UN2735',
  transportClass: '8',
  emergencyPhone: '1-800-555-0141',
}

function FormFields(part: DraftPart) {
  const { draft, change, fields } = part
  const said = {
    name: 'statement.value',
    value: draft.text,
    error: fields['statement.value'],
    onChange: (event: { target: { value: string } }) => change({ text: event.target.value }),
  }
  const { form, label } = definitionOf(draft.property)
  switch (form) {
    case 'quantity':
    case 'window':
      return <RangeFields {...part} units={unitsFor(draft.property)} isWindow={form === 'window'} />
    case 'ratio':
      return (
        <div className="grid gap-4 sm:grid-cols-2">
          <TextField {...said} label="Ratio" help="Parts in the order A, B, C, as 2 : 1." autoComplete="off" />
          <SelectField
            label="Basis"
            name="statement.value.basis"
            value={draft.basis}
            onChange={(event) => change({ basis: event.target.value })}
          >
            <option value="volume">by volume</option>
            <option value="weight">by weight</option>
            <option value="">not stated</option>
          </SelectField>
        </div>
      )
    case 'codes':
      return <AreaField {...said} label="Codes" help="As H315, H317 or P305+P351+P338, with commas or spaces between." />
    case 'substance':
      return (
        <>
          <div className="grid gap-4 sm:grid-cols-2">
            <TextField {...said} label="Substance" help="As printed." autoComplete="off" />
            <TextField
              label="CAS number"
              name="statement.value.cas"
              value={draft.cas}
              error={fields['statement.value.cas']}
              help="Its check digit is proved. Leave empty where none is stated."
              autoComplete="off"
              onChange={(event) => change({ cas: event.target.value.trim() })}
            />
          </div>
          <RangeFields {...part} units={['%']} isWindow={false} />
        </>
      )
    case 'date':
      return (
        <TextField
          {...said}
          label="Date"
          help="Year, year and month, or day: 2024, 2024-03, 2024-03-18."
          className="max-w-xs"
          autoComplete="off"
        />
      )
    case 'flag':
      return (
        <SelectField
          label={label}
          name="statement.value"
          value={draft.is}
          error={said.error}
          className="max-w-xs"
          onChange={(event) => change({ is: event.target.value })}
        >
          <option value="yes">yes</option>
          <option value="no">no</option>
        </SelectField>
      )
    case 'text':
      return choices[draft.property] ? (
        <SelectField {...said} label={label} className="max-w-xs">
          <option value="">Choose</option>
          {choices[draft.property]?.map((choice) => (
            <option key={choice}>{choice}</option>
          ))}
        </SelectField>
      ) : (
        <AreaField {...said} label={label} rows={2} help="In the sheet’s own words." placeholder={examples[draft.property]} />
      )
  }
}
