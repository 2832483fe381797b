import { type VocLimit, type VocPlace, vocPlaces } from '../../reference/voc-limits.ts'
import type { Stage } from '../build-up.ts'
import { mostVoc } from '../course-result.ts'
import { type Fact, factsOf, rangeOf } from '../fact.ts'
import { figureOfFact } from '../figure.ts'
import { formatNumber, formatRange } from '../format.ts'
import { valueIn } from '../units.ts'
import { type Check, type Laid, type LaidMix, type Verdict, notMeasured, resinCourses, unchosen, unknown, unstatedOfMix } from './check.ts'

/** Categories a course may be held to: a floor coating always, and what its stage is besides. */
const categoriesOf = (stage: Stage): VocLimit['category'][] => [
  'floor coatings',
  ...(stage === 'prime' ? (['primers'] as const) : []),
  ...(stage === 'seal' ? (['sealers'] as const) : []),
]

const isDay = (text: string) => /^\d{4}-\d{2}-\d{2}/.test(text)

/** Of each category the limit in force on a day, the newest; of the categories the strictest. Source of the rule: 40 CFR 59.402(b). */
function strictest(
  { limits }: VocPlace,
  { categories, onDate }: { categories: VocLimit['category'][]; onDate: string },
): VocLimit | undefined {
  const inForce = categories.flatMap((category) => {
    const [newest] = limits.filter((one) => one.category === category && one.from <= onDate).sort((a, b) => (a.from < b.from ? 1 : -1))
    return newest ?? []
  })
  return inForce.sort((a, b) => a.limit - b.limit)[0]
}

/** What a sheet rounds away in pounds per gallon: 0.42 may be anything from 0.415 on. In g/L; nought for contents stated in g/L. */
function roundedAway(fact: Fact): number {
  const range = rangeOf(fact)
  if (range?.max === undefined || range.unit !== 'lb/gal') return 0
  const [, decimals = ''] = String(range.max).split('.')
  return valueIn({ value: 0.5 * 10 ** -Math.min(decimals.length, 6), unit: 'lb/gal' }, 'g/L')
}

/** The greatest content as mixed, and the greatest with the thinner that the sheet allows. */
function statesOf(mix: LaidMix['mix']) {
  const facts = factsOf(mix.facts, 'voc')
  return (['as mixed', 'thinned'] as const).flatMap((what) => {
    const [worst] = facts.filter(({ thinned }) => (what === 'thinned') === (thinned ?? false)).sort((a, b) => mostVoc(b) - mostVoc(a))
    return worst ? [{ what, fact: worst, grams: mostVoc(worst) }] : []
  })
}

function verdictOf({ course, mix }: LaidMix, place: VocPlace, onDate: string): Verdict {
  const limit = strictest(place, { categories: categoriesOf(course.stage), onDate })
  if (!limit) {
    const missing = {
      ...unchosen('voc', place.name, `no rule for this kind of coating is loaded for ${onDate}`),
      ask: 'the authority of the place',
    }
    return unknown(course.id, `No rule of ${place.name} for this kind of coating is loaded for ${onDate}.`, [missing])
  }
  const states = statesOf(mix)
  const figures = states.map(({ what, fact }) => ({ label: `VOC ${what}`, figure: figureOfFact(fact) }))
  if (!states.some(({ what }) => what === 'as mixed')) {
    return { ...unknown(course.id, `The VOC content of ${mix.name}, as mixed, is not stated.`, [unstatedOfMix('voc', mix)]), figures }
  }
  const open = states.find(({ grams }) => !Number.isFinite(grams))
  if (open) {
    const because = 'the sheet states the least VOC content, not the greatest'
    return {
      ...unknown(course.id, `The greatest VOC content of ${mix.name} is not stated.`, [unstatedOfMix('voc', mix, because)]),
      figures,
    }
  }
  const worst = states.reduce((most, one) => (one.grams > most.grams ? one : most))
  const over = worst.grams - limit.limit
  const status = over <= 1e-9 * limit.limit ? 'met' : over <= roundedAway(worst.fact) ? 'caution' : 'stop'
  const content = formatRange(rangeOf(worst.fact) ?? { max: worst.grams, unit: 'g/L' })
  const metric = rangeOf(worst.fact)?.unit === 'g/L' ? '' : ` (${formatNumber(worst.grams, 1)} g/L)`
  return {
    courseId: course.id,
    status,
    says: `${content}${metric} ${worst.what}; ${place.name} allows ${formatNumber(limit.limit)} g/L for ${limit.category}, its strictest category here.`,
    todo:
      status === 'caution'
        ? 'The sheet’s pounds per gallon are rounded across the limit, which is metric: ask the maker for grams per liter, in writing.'
        : 'Choose a mix with less VOC for this place. The law of the place decides, not this list.',
    figures,
    source: `${place.source}; strictest category by 40 CFR 59.402(b)`,
  }
}

function ofCourse(laid: Laid, place: VocPlace, onDate: string): Verdict {
  const { course, mix } = laid
  if (mix) return verdictOf({ ...laid, mix }, place, onDate)
  return unknown(course.id, 'No mix is chosen.', [unchosen('voc', course.title, 'no mix is chosen for this course')])
}

export const vocLimit: Check = {
  id: 'voc-limit',
  title: 'VOC where the floor is laid',
  needs: ['VOC of the mix', 'place whose rules hold', 'day of laying'],
  source: 'dated rules of the place, strictest category by 40 CFR 59.402(b); verify',
  severity: 'Stop over the limit: it may not be laid there. Caution where pounds per gallon are rounded across the metric limit.',
  run(floor) {
    const { onDate, conditions } = floor.input
    const laid = resinCourses(floor)
    if (laid.length === 0) return []
    if (conditions.vocPlace === null) {
      return [
        unknown(null, 'No place is chosen, so no rule can be asked.', [
          { ...notMeasured('voc', 'the place whose VOC rules hold'), ask: 'whoever builds this up' },
        ]),
      ]
    }
    const place = vocPlaces.find(({ id }) => id === conditions.vocPlace)
    if (!place)
      return [
        unknown(null, 'No rule is loaded for this place.', [
          { ...notMeasured('voc', 'the rules of the place'), ask: 'the authority of the place' },
        ]),
      ]
    if (!isDay(onDate))
      return [
        unknown(null, 'The day of laying is not known, so no rule can be asked.', [
          { ...notMeasured('voc', 'the day of laying'), ask: 'whoever plans the work' },
        ]),
      ]
    return laid.map((one) => ofCourse(one, place, onDate))
  },
}
