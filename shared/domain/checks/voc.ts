import { type VocLimit, vocPlaces } from '../../reference/voc-limits.ts'
import type { Stage } from '../build-up.ts'
import { factsOf, rangeOf } from '../fact.ts'
import { figureOfFact } from '../figure.ts'
import { formatNumber, formatRange } from '../format.ts'
import { valueIn } from '../units.ts'
import { type Check, type Laid, type Verdict, notMeasured, resinCourses, unknown } from './check.ts'

/** Categories a course may be held to: a floor coating always, and what its stage is besides. */
const categoriesOf = (stage: Stage): VocLimit['category'][] => ['floor coatings', ...(stage === 'prime' ? ['primers' as const] : []), ...(stage === 'seal' ? ['sealers' as const] : [])]

/** The strictest limit in force on a day among the categories. Source of the rule: 40 CFR 59.402(b). */
function strictest(limits: readonly VocLimit[], wanted: { categories: VocLimit['category'][]; onDate: string }): VocLimit | undefined {
  return limits.filter(({ category, from }) => wanted.categories.includes(category) && from <= wanted.onDate).sort((a, b) => a.limit - b.limit)[0]
}

function verdictOf({ course, mix, result }: Laid, place: (typeof vocPlaces)[number], onDate: string): Verdict {
  const limit = strictest(place.limits, { categories: categoriesOf(course.stage), onDate })
  if (!limit) return { courseId: course.id, status: 'unknown', says: `No rule of ${place.name} for this kind of coating is loaded for ${onDate}.`, todo: 'Ask the authority of the place.' }
  if (result.voc.kind === 'not-stated') return unknown(course.id, `The VOC content of ${mix?.name ?? course.title} is not stated.`, [result.voc])
  const thinned = mix ? factsOf(mix.facts, 'voc').find((fact) => fact.thinned) : undefined
  const states = [{ figure: result.voc, range: result.voc.value, what: 'as mixed' }, ...(thinned && rangeOf(thinned) ? [{ figure: figureOfFact(thinned), range: rangeOf(thinned) ?? result.voc.value, what: 'thinned' }] : [])]
  const most = states.map((state) => ({ ...state, grams: valueIn({ value: state.range.max ?? Infinity, unit: state.range.unit }, 'g/L') })).sort((a, b) => b.grams - a.grams)[0]
  if (!most || !Number.isFinite(most.grams)) return { courseId: course.id, status: 'unknown', says: 'The sheet states only the least VOC content, not the greatest.', todo: 'Ask the maker, in writing.' }
  return {
    courseId: course.id,
    status: most.grams <= limit.limit ? 'met' : 'stop',
    says: `${formatRange(most.range)} ${most.what}; ${place.name} allows ${formatNumber(limit.limit)} g/L for ${limit.category}, its strictest category here.`,
    todo: 'Choose a mix with less VOC for this place. The law of the place decides, not this list.',
    figures: states.map(({ figure, what }) => ({ label: `VOC ${what}`, figure })),
  }
}

export const vocLimit: Check = {
  id: 'voc-limit',
  title: 'VOC where the floor is laid',
  needs: ['voc', 'vocPlace'],
  source: 'dated rules of the place (shared/reference/voc-limits.ts), strictest category by 40 CFR 59.402(b); verify',
  run(floor) {
    const { vocPlace } = floor.input.conditions
    const laid = resinCourses(floor)
    if (laid.length === 0) return []
    if (vocPlace === null) return [unknown(null, 'No place is chosen, so no rule can be asked.', [notMeasured('voc', 'the place whose VOC rules hold')])]
    const place = vocPlaces.find(({ id }) => id === vocPlace)
    if (!place) return [{ courseId: null, status: 'unknown', says: 'No rule is loaded for this place.', todo: 'Ask the authority of the place.', missing: [notMeasured('voc', 'the rules of the place')] }]
    return laid.map((one) => verdictOf(one, place, floor.input.onDate))
  },
}
