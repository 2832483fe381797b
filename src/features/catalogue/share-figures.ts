import { type Fact, factsOf, ratioOf } from '../../../shared/domain/fact.ts'
import { type Figure, notStated } from '../../../shared/domain/figure.ts'
import { formatNumber, formatRange } from '../../../shared/domain/format.ts'
import type { MixFacts } from '../../../shared/domain/mix.ts'
import { densityFactOf, ratiosOf } from '../../../shared/domain/proportion.ts'
import { sharesOf } from '../../../shared/domain/ratio.ts'

type Basis = 'volume' | 'weight'

const numbers = (parts: readonly number[]) => parts.map((part) => formatNumber(part, 3))

/** The fact of a mix that states its ratio by a basis, for the parts it has. */
function statedRatio(mix: MixFacts, basis: Basis): Fact | undefined {
  return factsOf(mix.facts, 'mixRatio').find((fact) => ratioOf(fact)?.basis === basis && ratioOf(fact)?.parts.length === mix.parts.length)
}

/** What a share was worked out from: the ratio as stated, and the densities where the ratio stated is of the other basis. */
function sourcesOf(mix: MixFacts, basis: Basis) {
  const stated = statedRatio(mix, basis)
  if (stated) return { facts: [{ label: `Ratio by ${basis}`, fact: stated }], through: undefined }
  const other = basis === 'volume' ? 'weight' : 'volume'
  const ratio = statedRatio(mix, other)
  const densities = mix.parts.flatMap((part) => {
    const fact = densityFactOf(mix, part)
    return fact ? [{ label: `Density of part ${part.part}, ${formatRange(fact.value as Parameters<typeof formatRange>[0])}`, fact }] : []
  })
  return { facts: [...(ratio ? [{ label: `Ratio by ${other}`, fact: ratio }] : []), ...densities], through: other }
}

/** Share of each part of a mix by volume or weight, with its sum: part ÷ sum of the parts. */
export function shareFigures(mix: MixFacts, basis: Basis): Figure[] {
  const parts = ratiosOf(mix)[basis]
  if (!parts)
    return mix.parts.map(() =>
      notStated('mixRatio', {
        of: mix.name,
        subject: { kind: 'mix', id: mix.id },
        ask: 'the maker, in writing',
        because: `no ratio by ${basis}`,
      }),
    )
  const { facts, through } = sourcesOf(mix, basis)
  const written = numbers(parts)
  const worked = through ? `; parts by ${basis} from the ratio by ${through} ${basis === 'weight' ? '× densities' : '÷ densities'}` : ''
  return sharesOf(parts).map((share, index): Figure => ({
    kind: 'computed',
    value: { min: share * 100, max: share * 100, unit: '%' },
    working: {
      formula: `part ÷ sum of the parts by ${basis}${worked}`,
      sum: `${written[index] ?? ''} ÷ (${written.join(' + ')}) = ${formatNumber(share * 100, 1)} %`,
      source: through ? 'Conservation of mass' : 'The ratio as stated',
    },
    from: facts.map(({ label, fact }) => ({ label, factId: fact.id, origin: fact.origin })),
  }))
}
