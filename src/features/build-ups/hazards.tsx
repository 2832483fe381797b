import type { HazardSummary } from '../../../shared/domain/evaluation.ts'
import { Pictogram } from '../../ui/pictogram.tsx'

/** Hazards as the safety sheets state them, with whose they are. What no sheet states is said, never passed over. */
export function Hazards({ hazards, title = 'Hazards' }: { hazards: HazardSummary; title?: string }) {
  const { signalWord, pictograms, statements, notStated } = hazards
  return (
    <div>
      <p className="mb-1 font-semibold">
        {title}
        {signalWord && `: ${signalWord}`}
      </p>
      {pictograms.length > 0 && (
        <div className="mb-2 flex flex-wrap gap-2">
          {pictograms.map((code) => (
            <Pictogram key={code} code={code} />
          ))}
        </div>
      )}
      <ul>
        {statements.map(({ code, text, from }) => (
          <li key={code} title={from.join(', ')}>
            <span className="text-pencil">{code}</span> {text}
          </li>
        ))}
      </ul>
      {notStated.length > 0 && (
        <p className="mt-1 text-pencil">
          No hazard statements on any loaded safety sheet for {notStated.join(', ')}: their hazards are not known, not absent.
        </p>
      )}
      {statements.length === 0 && notStated.length === 0 && (
        <p className="text-pencil">No hazard statements on the loaded safety sheets.</p>
      )}
      <Protection hazards={hazards} />
    </div>
  )
}

function Protection({ hazards }: { hazards: HazardSummary }) {
  const kinds = [
    ['Gloves', hazards.gloves],
    ['Eyes', hazards.eyes],
    ['Breathing', hazards.breathing],
  ] as const
  return (
    <dl className="mt-2">
      {kinds.map(([label, lines]) => (
        <div key={label} className="flex gap-2">
          <dt className="w-20 shrink-0 text-pencil">{label}</dt>
          <dd>{lines.length > 0 ? lines.map(({ text, from }) => `${text} (${from})`).join('; ') : 'not stated'}</dd>
        </div>
      ))}
    </dl>
  )
}
