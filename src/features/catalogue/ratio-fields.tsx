import { SelectField, TextField } from '../../ui/field.tsx'
import { type MixFormPart, partNames } from './mix-draft.ts'

/** The ratio of a new mix: parts, basis, and how it is known; or that nobody knows it yet. */
export function RatioFields({ draft, change, fields }: MixFormPart) {
  const letters = partNames.slice(0, draft.parts.length).join(' : ')
  return (
    <fieldset className="grid gap-4 border-t border-rule pt-3 sm:col-span-2 sm:grid-cols-2">
      <legend className="sr-only">Ratio</legend>
      <div className="flex flex-wrap gap-x-5 sm:col-span-2">
        <label className="flex min-h-9 items-center gap-2">
          <input
            type="radio"
            name="ratioKnown"
            className="h-5 w-5"
            checked={draft.ratioKnown}
            onChange={() => change({ ratioKnown: true })}
          />
          The ratio is known
        </label>
        <label className="flex min-h-9 items-center gap-2">
          <input
            type="radio"
            name="ratioKnown"
            className="h-5 w-5"
            checked={!draft.ratioKnown}
            onChange={() => change({ ratioKnown: false })}
          />
          Nobody has stated it yet
        </label>
      </div>
      {draft.ratioKnown && (
        <>
          <TextField
            label={`Ratio ${letters}`}
            name="ratio.value.parts"
            value={draft.ratio}
            placeholder={draft.parts.length === 3 ? '4 : 1 : 6' : '2 : 1'}
            error={fields['ratio.value.parts']}
            help="In the order of the parts."
            autoComplete="off"
            onChange={(event) => change({ ratio: event.target.value })}
          />
          <SelectField
            label="Basis"
            name="ratio.value.basis"
            value={draft.basis}
            error={fields['ratio.value.basis']}
            onChange={(event) => change({ basis: event.target.value })}
          >
            <option value="volume">by volume</option>
            <option value="weight">by weight</option>
            <option value="">not stated</option>
          </SelectField>
          <TextField
            label="How it is known"
            name="ratio.reason"
            value={draft.reason}
            error={fields['ratio.reason']}
            placeholder="Label of the kit"
            className="sm:col-span-2"
            help="Once the data sheet is attached to the mix, the ratio can be tied to its page."
            onChange={(event) => change({ reason: event.target.value })}
          />
        </>
      )}
    </fieldset>
  )
}
