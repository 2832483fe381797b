import { type Fact, factsOf, rangeOf, ratioOf } from '../fact.ts'
import { figureOfFact } from '../figure.ts'
import { formatNumber } from '../format.ts'
import type { MixFacts } from '../mix.ts'
import { densityFactOf } from '../proportion.ts'
import { offRatioPercent, perHundredOfA, weightOfVolume } from '../ratio.ts'
import { valueIn } from '../units.ts'
import { type Check, type LaidMix, type Verdict, mixCourses, unknown, unstatedOfMix } from './check.ts'

/** Per cent of hardener that sheets round away between the two bases. Common practice; off-ratio beyond 5 % is trouble. */
const rounding = 2
const trouble = 5

interface PartDensity {
  name: string
  part: MixFacts['parts'][number]['part']
  productId: string
  fact: Fact | undefined
  /** kg/L, the middle of the stated range; undefined when an end is missing. */
  middle: number | undefined
}

function densitiesOf(mix: MixFacts): PartDensity[] {
  return mix.parts.map((part) => {
    const fact = densityFactOf(mix, part)
    const range = rangeOf(fact)
    const known = range?.min !== undefined && range.max !== undefined
    const middle = known ? valueIn({ value: ((range.min ?? 0) + (range.max ?? 0)) / 2, unit: range.unit }, 'kg/L') : undefined
    return { name: part.product.name, part: part.part, productId: part.product.id, fact, middle }
  })
}

function missingOf({ name, part, productId }: PartDensity) {
  return {
    property: 'density' as const,
    part,
    of: name,
    subject: { kind: 'product' as const, id: productId },
    ask: 'the maker, in writing',
  }
}

const basisOf = { volume: 'by volume', weight: 'by weight' } as const

/** A ratio that has nothing to be held against. */
function oneBasis({ course, mix }: LaidMix, stated: 'volume' | 'weight' | undefined): Verdict {
  if (!stated) {
    const because = 'no ratio with volume or weight as its basis'
    return unknown(course.id, `No ratio of ${mix.name} is stated with its basis.`, [unstatedOfMix('mixRatio', mix, because)])
  }
  const other = stated === 'volume' ? 'weight' : 'volume'
  const lacking = densitiesOf(mix).filter(({ middle }) => middle === undefined)
  const says =
    lacking.length === 0
      ? `The sheet of ${mix.name} gives the ratio ${basisOf[stated]} only. Through the densities it can be measured ${basisOf[other]} too, but no sheet confirms it.`
      : `The sheet of ${mix.name} gives the ratio ${basisOf[stated]} only, and the densities that would give the other are not all stated.`
  return {
    ...unknown(course.id, says, [unstatedOfMix('mixRatio', mix, `the ratio is not stated ${basisOf[other]}`), ...lacking.map(missingOf)]),
    todo: `Measure ${basisOf[stated]}, as the sheet says, or ask the maker for the ratio ${basisOf[other]}, in writing.`,
  }
}

function verdictOf(laid: LaidMix): Verdict {
  const { course, mix } = laid
  const ratios = factsOf(mix.facts, 'mixRatio').map(ratioOf)
  const stated = (basis: 'volume' | 'weight') =>
    ratios.flatMap((ratio) => (ratio?.basis === basis && ratio.parts.length === mix.parts.length ? [ratio.parts] : []))
  const [volumes, weights] = [stated('volume'), stated('weight')]
  if (volumes.length === 0 || weights.length === 0)
    return oneBasis(laid, volumes.length > 0 ? 'volume' : weights.length > 0 ? 'weight' : undefined)
  const densities = densitiesOf(mix)
  const lacking = densities.filter(({ middle }) => middle === undefined)
  const figures = densities.flatMap(({ part, fact }) => (fact ? [{ label: `density of part ${part}`, figure: figureOfFact(fact) }] : []))
  if (lacking.length > 0) {
    const says = `Both ratios of ${mix.name} are stated, but not the densities that tie them.`
    return { ...unknown(course.id, says, lacking.map(missingOf)), figures }
  }
  const kilograms = densities.map(({ middle }) => middle ?? Number.NaN)
  const pairs = volumes.flatMap((volume) =>
    weights.map((weight) => pairOf(perHundredOfA(weightOfVolume(volume, kilograms)), perHundredOfA(weight))),
  )
  const [worst] = pairs.sort((a, b) => Math.abs(b.off) - Math.abs(a.off))
  if (!worst) return oneBasis(laid, undefined)
  const parts = (list: readonly number[]) => list.map((part) => formatNumber(part, 1)).join(' : ')
  const off = Math.abs(worst.off)
  return {
    courseId: course.id,
    status: off <= rounding ? 'met' : off <= trouble ? 'caution' : 'stop',
    says: `By volume through the densities ${parts(worst.byVolume)} by weight; the sheet says ${parts(worst.byWeight)}: ${worst.off >= 0 ? '+' : '−'}${formatNumber(off, 1)} % of part ${worst.part}.`,
    todo: 'Do not mix by either until the maker says in writing which ratio is right.',
    figures,
  }
}

/** How far the part that is furthest off is off when it is measured by volume instead of by weight. */
function pairOf(byVolume: number[], byWeight: number[]) {
  const off = byWeight.map((part, index) => offRatioPercent(byVolume[index] ?? Number.NaN, part))
  const at = off.reduce((most, one, index) => (Math.abs(one) > Math.abs(off[most] ?? 0) ? index : most), 1)
  return { byVolume, byWeight, off: off[at] ?? 0, part: ['A', 'B', 'C'][at] ?? 'B' }
}

export const ratioBasesAgree: Check = {
  id: 'ratio-bases-agree',
  title: 'Ratio by volume and by weight agree',
  needs: ['mix ratio by volume and by weight', 'density of each part'],
  source: 'conservation of mass; 2 % for rounding and 5 % for trouble are common practice',
  severity: 'Stop beyond 5 % of a part: off-ratio resin stays soft. Caution from 2 %, what sheets round away.',
  run: (floor) => mixCourses(floor).flatMap((laid) => (laid.mix.parts.length > 1 ? [verdictOf(laid)] : [])),
}
