import { factsOf, ratioOf } from '../fact.ts'
import { notStated } from '../figure.ts'
import { formatNumber } from '../format.ts'
import { densityFactOf } from '../proportion.ts'
import { offRatioPercent, perHundredOfA, weightOfVolume } from '../ratio.ts'
import { rangeOf } from '../fact.ts'
import type { MixFacts } from '../mix.ts'
import { valueIn } from '../units.ts'
import { type Check, type Laid, type Verdict, resinCourses, unknown } from './check.ts'

/** Per cent of hardener that sheets round away between the two bases. Common practice; off-ratio beyond 5 % is trouble. */
const rounding = 2
const trouble = 5

function missingDensities(mix: MixFacts) {
  return mix.parts
    .filter((part) => !rangeOf(densityFactOf(mix, part)))
    .map(({ part, product }) => notStated('density', { of: product.name, part, subject: { kind: 'product', id: product.id }, ask: 'the maker, in writing' }))
}

function midDensities(mix: MixFacts): number[] {
  return mix.parts.map((part) => {
    const range = rangeOf(densityFactOf(mix, part))
    const value = range ? ((range.min ?? range.max ?? 0) + (range.max ?? range.min ?? 0)) / 2 : Number.NaN
    return range ? valueIn({ value, unit: range.unit }, 'kg/L') : Number.NaN
  })
}

function verdictOf({ course, mix }: Laid & { mix: MixFacts }): Verdict {
  const ratios = factsOf(mix.facts, 'mixRatio')
  const stated = (basis: 'volume' | 'weight') => ratios.map(ratioOf).find((ratio) => ratio?.basis === basis && ratio.parts.length === mix.parts.length)?.parts
  const [volume, weight] = [stated('volume'), stated('weight')]
  const absent = (because: string) => notStated('mixRatio', { of: mix.name, subject: { kind: 'mix', id: mix.id }, ask: 'the maker, in writing', because })
  if (!volume && !weight) return unknown(course.id, `No ratio of ${mix.name} is stated with its basis.`, [absent('no ratio with volume or weight as its basis')])
  if (!volume || !weight) {
    const missing = missingDensities(mix)
    if (missing.length > 0) return unknown(course.id, `The ratio of ${mix.name} is stated by ${volume ? 'volume' : 'weight'} only, and the densities that would give the other are not all stated.`, missing)
    return { courseId: course.id, status: 'met', says: `The ratio is stated by ${volume ? 'volume' : 'weight'} only; the other basis follows from the stated densities.` }
  }
  const missing = missingDensities(mix)
  if (missing.length > 0) return unknown(course.id, 'Both bases are stated, but not the densities that tie them.', missing)
  const byVolume = perHundredOfA(weightOfVolume(volume, midDensities(mix)))
  const byWeight = perHundredOfA(weight)
  const off = byWeight.slice(1).map((part, index) => offRatioPercent(byVolume[index + 1] ?? Number.NaN, part))
  const worst = off.reduce((most, one) => (Math.abs(one) > Math.abs(most) ? one : most), 0)
  const status = Math.abs(worst) <= rounding ? 'met' : Math.abs(worst) <= trouble ? 'caution' : 'stop'
  const parts = (list: number[]) => list.map((part) => formatNumber(part, 1)).join(' : ')
  return {
    courseId: course.id,
    status,
    says: `By volume through the densities ${parts(byVolume)} by weight; the sheet says ${parts(byWeight)}: ${worst >= 0 ? '+' : '−'}${formatNumber(Math.abs(worst), 1)} % hardener.`,
    todo: 'Do not mix by either until the maker says in writing which ratio is right.',
    figures: [],
  }
}

export const ratioBasesAgree: Check = {
  id: 'ratio-bases-agree',
  title: 'Ratio by volume and by weight agree',
  needs: ['mixRatio', 'density of each part'],
  source: 'conservation of mass; 2 % for rounding and 5 % for trouble are common practice',
  run: (floor) => resinCourses(floor).flatMap((laid) => (laid.mix && laid.mix.parts.length > 1 ? [verdictOf({ ...laid, mix: laid.mix })] : [])),
}
