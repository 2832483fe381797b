import type { SiteCard } from '../../../shared/api/site-cards.ts'
import type { HazardSummary } from '../../../shared/domain/evaluation.ts'
import { firstAidOf } from '../../../shared/domain/hazard.ts'

const routes = [
  ['In the eye', /P305|P337/],
  ['On the skin', /P302|P303|P332|P333|P361|P362|P363/],
  ['Breathed in', /P304|P342|P341/],
  ['Swallowed', /P301/],
] as const

/** First aid by where it got to, in the words of the safety sheets; the hot-pail drill; whom to call. */
export function FirstAidPanel({ hazards, firm }: { hazards: HazardSummary | null; firm: SiteCard['firm'] }) {
  const aid = firstAidOf(hazards?.precautions ?? [])
  return (
    <section aria-label="First aid" className="grid gap-4 p-4">
      {routes.map(([name, codes]) => {
        const lines = aid.filter(({ code }) => codes.test(code))
        return (
          <div key={name} className="border-b border-ink pb-3">
            <h2 className="text-site font-bold">{name}</h2>
            {lines.length === 0 ? (
              <p>Not stated as a statement on the loaded safety sheets. Open section 4 of the sheet.</p>
            ) : (
              lines.map(({ code, text }) => <p key={code}>{text}</p>)
            )}
          </div>
        )
      })}
      <div className="border-2 border-stop p-3">
        <h2 className="text-site font-bold">Hot or smoking pail</h2>
        <p>
          Keep clear, fume is toxic. Do not cap it, do not put it in a bin, no water into it. Get it outside only if that is without danger;
          trained and protected people pour in dry sand. Never mix leftovers.
        </p>
      </div>
      <div>
        <h2 className="text-site font-bold">Call</h2>
        <p>The emergency number of the place first.</p>
        {hazards?.emergencyPhones.map(({ text, from }) => (
          <CallLink key={`${from} ${text}`} phone={text} who={from} />
        ))}
        {firm.phone && <CallLink phone={firm.phone} who={firm.name} />}
        {(hazards?.emergencyPhones.length ?? 0) === 0 && (
          <p className="text-body">No emergency telephone is stated on the loaded safety sheets.</p>
        )}
      </div>
    </section>
  )
}

function CallLink({ phone, who }: { phone: string; who: string }) {
  return (
    <a
      href={`tel:${phone.replace(/[^+\d]/g, '')}`}
      className="mt-3 flex min-h-[64px] flex-col justify-center rounded-touch border-2 border-ink px-4"
    >
      <span className="font-bold">{phone}</span>
      <span className="text-body">{who}</span>
    </a>
  )
}
