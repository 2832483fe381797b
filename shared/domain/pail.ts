import type { Course } from './build-up.ts'
import type { CourseResult } from './evaluation.ts'
import { factsOf } from './fact.ts'
import { type Figure, notStated } from './figure.ts'
import { formatNumber, formatRange } from './format.ts'
import type { Pack } from './kits.ts'
import type { MixFacts } from './mix.ts'
import { type PartQuantity, partQuantities } from './part-quantities.ts'
import { fillerMass } from './sand-quantities.ts'
import { type Quantity, quantity, valueIn } from './units.ts'
import { inDimension } from './volume-or-mass.ts'
import { computed, greatestOf, point, sourceOf, sourcesOf } from './working.ts'

/** What goes into one pail: a kit, or a share of one. */
export interface Pail {
  /** Mixed liquid resin. */
  liquid: Figure
  parts: PartQuantity[]
  /** Sand that is stirred in; null when the course has none. */
  sand: Figure | null
  /** Floor that it must cover at the course's thickness. */
  covers: Figure
}

interface PailGiven {
  course: Course
  mix: MixFacts
  result: CourseResult
  pack: Pack
  /** 1 for a full kit. Whether a share may be taken is for the sheet to say (`partKitsOf`). */
  share: number
}

const shown = (amount: Quantity) => formatRange(point(amount))

/** The kit's liquid in gallons for kits sold in US units, else in litres. */
function liquidOf({ mix, pack, share }: PailGiven): Figure {
  const unit = pack.size.unit === 'gal' || pack.size.unit === 'lb' || pack.size.unit === 'oz' ? 'gal' : 'L'
  const whole = inDimension(pack.size, { unit, mix })
  if (!whole)
    return notStated('density', {
      of: mix.name,
      subject: { kind: 'mix', id: mix.id },
      ask: 'the maker, in writing',
      because: 'the kit is stated by weight',
    })
  const amount = quantity(whole.value * share, unit)
  const facts = factsOf(mix.facts, 'packSize').filter((fact) => pack.items.some(({ factId }) => factId === fact.id))
  const part = share === 1 ? '' : ` × ${formatNumber(share * 100, 1)} %`
  return computed(
    amount,
    {
      formula: share === 1 ? 'full kit' : 'share of a kit',
      sum: `${shown(pack.size)}${part} = ${shown(amount)}`,
      source: 'the pack sizes stated',
    },
    facts.map((fact) => sourceOf('pack size', fact)),
  )
}

/** Floor covered: liquid ÷ liquid per area. */
function coversOf(liquid: Figure, { resinPerArea }: CourseResult): Figure {
  if (liquid.kind === 'not-stated') return liquid
  if (resinPerArea.kind === 'not-stated') return resinPerArea
  const us = resinPerArea.value.unit === 'gal'
  const per = greatestOf(resinPerArea.value)
  const amount = valueIn(greatestOf(liquid.value), per.unit)
  const area = quantity((amount / per.value) * (us ? 1000 : 100), us ? 'ft²' : 'm²')
  const sum = `${formatRange(liquid.value)} ÷ ${shown(per)} per ${us ? '1,000 ft²' : '100 m²'} = ${shown(area)}`
  return computed(
    area,
    { formula: 'area = liquid resin ÷ liquid resin per area', sum, source: 'the build-up, before loss and texture' },
    sourcesOf('kit', liquid),
  )
}

/** The mix for one pail: each part by volume and on the scale, the sand, and how far it must go. */
export function pailOf(given: PailGiven): Pail {
  const { course, mix, result } = given
  const liquid = liquidOf(given)
  return {
    liquid,
    parts: partQuantities(mix, { total: liquid, proportions: result.proportions }),
    sand: course.filler ? fillerMass(course.filler.loading, liquid) : null,
    covers: coversOf(liquid, result),
  }
}
