import type { Course } from '../../../shared/domain/build-up.ts'
import { isDry } from '../../../shared/domain/course-result.ts'
import type { HazardSummary } from '../../../shared/domain/evaluation.ts'
import { Pictogram } from '../../ui/pictogram.tsx'

/** What to wear and what it does to you, from the safety sheets of everything handled in this course. */
export function WearPanel({ course, hazards }: { course: Course; hazards: HazardSummary | null }) {
  const dusty = isDry(course) || course.filler !== null || course.broadcast !== null
  return (
    <section aria-label="Wear" className="grid gap-4 p-4">
      {hazards ? <FromSheets hazards={hazards} /> : <p>Nothing is handled in this course whose safety sheet could be asked.</p>}
      {dusty && (
        <p className="border-l-4 border-caution pl-3">
          <strong>Dust.</strong> Grinding, blasting and tipping sand raise silica dust. Use the shroud, the extraction and the vacuum that
          belong to the tool (29 CFR 1926.1153 Table 1, or an exposure assessment). No dry sweeping, no compressed air. Your competent
          person decides on breathing protection.
        </p>
      )}
      <p className="text-body">
        New rash, tight chest, cough: stop, get out, tell the foreman and occupational health. Sensitisation is permanent. A mask that
        suffices is chosen by the competent person, never by this card.
      </p>
    </section>
  )
}

function FromSheets({ hazards }: { hazards: HazardSummary }) {
  const kinds = [
    ['Gloves', hazards.gloves],
    ['Eyes', hazards.eyes],
    ['Breathing', hazards.breathing],
  ] as const
  return (
    <>
      <dl className="grid gap-3">
        {kinds.map(([name, lines]) => (
          <div key={name} className="border-b border-ink pb-2">
            <dt className="text-body">{name}</dt>
            <dd className="font-semibold">
              {lines.length === 0 && 'not stated on any loaded safety sheet'}
              {lines.map(({ text, from }) => (
                <span key={`${from} ${text}`} className="block">
                  {text} <span className="text-body font-normal">({from})</span>
                </span>
              ))}
            </dd>
          </div>
        ))}
      </dl>
      <div>
        {hazards.signalWord && <p className="text-site-figure font-bold">{hazards.signalWord}</p>}
        <div className="my-2 flex flex-wrap gap-3">
          {hazards.pictograms.map((code) => (
            <Pictogram key={code} code={code} size={72} />
          ))}
        </div>
        <ul className="grid gap-1">
          {hazards.statements.map(({ code, text, from }) => (
            <li key={code}>
              {text} <span className="text-body">({from.join(', ')})</span>
            </li>
          ))}
        </ul>
      </div>
      {hazards.notStated.length > 0 && (
        <p className="border-l-4 border-stop pl-3 font-semibold">
          No safety sheet with hazards is loaded for {hazards.notStated.join(', ')}. What they do is not known here. Do not open them; call
          the office.
        </p>
      )}
    </>
  )
}
