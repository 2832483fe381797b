import { useState } from 'react'
import type { Course } from '../../../shared/domain/build-up.ts'
import type { CourseResult } from '../../../shared/domain/evaluation.ts'
import { formatFigure, formatRange } from '../../../shared/domain/format.ts'
import type { Bay } from '../../../shared/domain/job.ts'
import type { MixFacts } from '../../../shared/domain/mix.ts'
import { packsOfMix, partKitsOf } from '../../../shared/domain/packs.ts'
import { type Pail, pailOf } from '../../../shared/domain/pail.ts'
import { BigFigure, WhyMissing } from './big-figure.tsx'
import { TouchButton } from './touch-button.tsx'

const shares = [
  { share: 1, name: 'Full kit' },
  { share: 1 / 2, name: '½ kit' },
  { share: 1 / 3, name: '⅓ kit' },
  { share: 1 / 4, name: '¼ kit' },
]

interface MixPanelProps {
  course: Course
  mix: MixFacts
  result: CourseResult
  bay: Bay | undefined
}

/** What goes into this pail, by volume and on the scale, and how far it must go. */
export function MixPanel({ course, mix, result, bay }: MixPanelProps) {
  const packs = packsOfMix(mix)
  const partKits = partKitsOf(mix)
  const [chosen, setChosen] = useState(0)
  const [share, setShare] = useState(1)
  const pack = packs[chosen] ?? packs[0]
  const allowed = partKits === 'allowed' ? share : 1
  return (
    <section aria-label="This pail">
      <h2 className="text-site">{mix.name}</h2>
      <Ratio mix={mix} result={result} />
      {packs.length > 1 && (
        <div className="my-3 grid grid-cols-2 gap-3">
          {packs.map((one, index) => (
            <TouchButton
              key={`${one.size.value} ${one.size.unit}`}
              strong={index === chosen}
              aria-pressed={index === chosen}
              onClick={() => setChosen(index)}
            >
              {formatRange({ min: one.size.value, max: one.size.value, unit: one.size.unit })} kit
            </TouchButton>
          ))}
        </div>
      )}
      {!pack && <p className="my-2 font-semibold">No kit size is stated. Mix by the ratio above and ask the office.</p>}
      {pack && (
        <>
          {partKits === 'allowed' ? (
            <div className="my-3 grid grid-cols-4 gap-3">
              {shares.map((one) => (
                <TouchButton
                  key={one.name}
                  strong={one.share === allowed}
                  aria-pressed={one.share === allowed}
                  className="px-1"
                  onClick={() => setShare(one.share)}
                >
                  {one.name}
                </TouchButton>
              ))}
            </div>
          ) : (
            <p className="my-2 border-l-4 border-caution pl-3 font-semibold">
              {partKits === 'forbidden'
                ? 'Full kits only: the sheet forbids splitting.'
                : 'Full kits only: no sheet says that kits may be split.'}
            </p>
          )}
          <PailTable pail={pailOf({ course, mix, result, pack, share: allowed })} bay={bay} />
        </>
      )}
    </section>
  )
}

function Ratio({ mix, result }: { mix: MixFacts; result: CourseResult }) {
  if (mix.parts.length === 1) return <p className="text-body">One part, nothing to add.</p>
  return (
    <p className="text-body">
      {mix.parts.map(({ part }) => part).join(' : ')} is {result.ratioByVolume ?? 'not stated'} by volume,{' '}
      {result.ratioByWeight ?? 'not stated'} by weight
    </p>
  )
}

function PailTable({ pail, bay }: { pail: Pail; bay: Bay | undefined }) {
  return (
    <>
      <table className="w-full">
        <caption className="sr-only">Amounts for this pail</caption>
        <thead className="text-body text-[#3c4649]">
          <tr>
            <th scope="col" className="text-left font-normal">
              Part
            </th>
            <th scope="col" className="text-right font-normal">
              On the scale
            </th>
            <th scope="col" className="text-right font-normal">
              By volume
            </th>
          </tr>
        </thead>
        <tbody>
          {pail.parts.map((part) => (
            <tr key={part.part} className="border-t border-ink align-baseline">
              <th scope="row" className="py-2 pr-2 text-left font-semibold">
                {pail.parts.length > 1 && `${part.part} `}
                <span className="block text-body font-normal">{part.name}</span>
              </th>
              <td className="text-right whitespace-nowrap">
                <BigFigure figure={part.mass} />
              </td>
              <td className="pl-3 text-right whitespace-nowrap">
                <BigFigure figure={part.volume} large={part.mass.kind === 'not-stated'} />
              </td>
            </tr>
          ))}
          {pail.sand && (
            <tr className="border-t border-ink align-baseline">
              <th scope="row" className="py-2 text-left font-semibold">
                Sand
                <span className="block text-body font-normal">after the liquids are mixed</span>
              </th>
              <td className="text-right whitespace-nowrap">
                <BigFigure figure={pail.sand} />
              </td>
              <td />
            </tr>
          )}
        </tbody>
      </table>
      <p className="mt-2 border-t-2 border-ink pt-2">
        Covers <BigFigure figure={pail.covers} large={false} />
        {bay && pail.covers.kind !== 'not-stated' && (
          <span className="text-body">
            {' '}
            of {bay.area.value.toLocaleString('en-US')} {bay.area.unit} in {bay.name}
          </span>
        )}
        <WhyMissing figure={pail.covers} />
      </p>
      {pail.parts.some(({ mass }) => mass.kind === 'not-stated') && (
        <p className="text-body">
          On the scale: {formatFigure(pail.parts.find(({ mass }) => mass.kind === 'not-stated')?.mass ?? pail.covers)}; a density is
          missing.
        </p>
      )}
    </>
  )
}
