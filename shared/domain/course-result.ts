import { type Course, type EvaluationInput, dryStages } from './build-up.ts'
import type { CourseResult } from './evaluation.ts'
import { type Fact, factOf, factsOf, rangeOf } from './fact.ts'
import { type Figure, notStated } from './figure.ts'
import { filledYield } from './filled-mix.ts'
import { formatNumber, formatRange } from './format.ts'
import { type Film, type Spread, spreadOfWetFilm, wetFilmOfSpread } from './film.ts'
import { unionOfHazards } from './hazard.ts'
import type { MixFacts } from './mix.ts'
import type { ProductFacts } from './product.ts'
import { proportionsOf } from './proportion.ts'
import type { Property, Range } from './property.ts'
import { valueAt } from './sheet-table.ts'
import { type Quantity, type Unit, convert, quantity, valueIn } from './units.ts'
import { windowAt } from './window.ts'

type Source = Extract<Figure, { kind: 'computed' }>['from'][number]

/** A single value as a figure with its sum. */
function computed(value: Quantity, working: { formula: string; sum: string; source: string }, from: Source[] = []): Figure {
  return { kind: 'computed', value: { min: value.value, max: value.value, unit: value.unit }, working, from }
}

const shown = ({ value, unit }: Quantity) => formatRange({ min: value, max: value, unit })
const sourceOf = (label: string, fact: Fact): Source => ({ label, factId: fact.id, origin: fact.origin })

/** The least value of a range: what may be counted on. */
export function leastOf({ min, max, unit }: Range): Quantity {
  return quantity(min ?? max ?? Number.NaN, unit)
}

const missingOfMix = (property: Property, mix: MixFacts, because?: string) =>
  notStated(property, { of: mix.name, subject: { kind: 'mix', id: mix.id }, ask: 'the maker, in writing', ...(because ? { because } : {}) })

function noMix(property: Property, course: Course): Figure {
  return notStated(property, { of: course.title, subject: null, ask: 'whoever builds this up', because: 'no mix is chosen for this course' })
}

function noThickness(course: Course): Figure {
  return notStated('filmThickness', { of: course.title, subject: null, ask: 'whoever builds this up', because: 'neither thickness nor spread rate is given' })
}

/** Volume of sand per volume of liquid resin; undefined, with what is missing, when the grain's density is not stated. */
function fillerOf(course: Course, products: EvaluationInput['products']) {
  const filled = filledYield(course, products)
  if ('missing' in filled) return { perLiquid: undefined, missing: filled.missing, fact: undefined }
  return { perLiquid: filled.perLiquid - 1, missing: undefined, fact: filled.fact }
}
type Filler = ReturnType<typeof fillerOf>

/** Dry film per wet film: solids of the liquid and the sand in it, over both. */
function solidsShare(solids: number, perLiquid: number): number {
  return (solids + perLiquid) / (1 + perLiquid)
}

interface Films {
  wet: Figure
  dry: Figure
  spread: Figure
}

/** Wet film, dry film and spread rate from whichever the course gives. */
function filmsOf(course: Course, mix: MixFacts | undefined, filler: Filler): Films {
  const solidsFact = mix && factOf(mix.facts, 'volumeSolids')
  const solids = rangeOf(solidsFact)
  const share = solids && filler.perLiquid !== undefined ? solidsShare(leastOf(solids).value / 100, filler.perLiquid) : undefined
  const noShare = () =>
    !mix ? noMix('volumeSolids', course)
    : !solids ? missingOfMix('volumeSolids', mix)
    : (filler.missing ?? missingOfMix('volumeSolids', mix))
  const from = solidsFact ? [sourceOf('solids by volume', solidsFact)] : []
  const percent = share === undefined ? '' : `${formatNumber(share * 100, 1)} %`

  if (course.thickness?.film === 'dry') {
    const { value, unit } = course.thickness
    const dry = chosen({ value, unit }, 'dry')
    if (share === undefined) return { wet: noShare(), dry, spread: noShare() }
    const film = { value: value / share, unit } as Film
    const wet = computed(film, { formula: 'wet film = dry film ÷ solids', sum: `${shown({ value, unit })} ÷ ${percent} = ${shown(film)}`, source: 'definition of solids by volume' }, from)
    return { wet, dry, spread: spreadFigure(film) }
  }
  const film: Film | undefined = course.thickness ? ({ value: course.thickness.value, unit: course.thickness.unit }) : course.spreadRate ? wetFilmOfSpread(course.spreadRate) : undefined
  if (!film) return { wet: noThickness(course), dry: noThickness(course), spread: noThickness(course) }
  const wet = course.thickness ? chosen(film, 'wet') : computed(film, wetWorking(course.spreadRate as Spread, film))
  const spread = course.spreadRate ? chosen(course.spreadRate, 'of the mix') : spreadFigure(film)
  if (share === undefined) return { wet, dry: noShare(), spread }
  const left = { ...film, value: film.value * share }
  const dry = computed(left, { formula: 'dry film = wet film × solids', sum: `${shown(film)} × ${percent} = ${shown(left)}`, source: 'definition of solids by volume' }, from)
  return { wet, dry, spread }
}

/** What a person chose for a course is a figure too. */
function chosen(value: Quantity, how: string): Figure {
  return computed(value, { formula: 'chosen for this course', sum: `${shown(value)} ${how}`, source: 'the build-up' })
}

const constantOf = (unit: Unit) => (unit === 'ft²/gal' ? '1,604.17 ft²·mil/gal' : '1,000 m²·µm/L')

function wetWorking(spread: Spread, film: Quantity) {
  return { formula: 'wet film = volume ÷ area', sum: `${constantOf(spread.unit)} ÷ ${shown(spread)} = ${shown(film)}`, source: 'definitions of gallon, foot and mil' }
}

function spreadFigure(film: Film): Figure {
  const spread = spreadOfWetFilm(film)
  const thickness = spread.unit === 'ft²/gal' ? convert(film, 'mil') : convert(film, 'µm')
  return computed(spread, { formula: 'spread rate = area ÷ volume', sum: `${constantOf(spread.unit)} ÷ ${shown(thickness)} = ${shown(spread)}`, source: 'definitions of gallon, foot and mil' })
}

/** Liquid resin for 1,000 ft² in gallons, or for 100 m² in litres: film × area ÷ yield of the filled mix. */
function resinOf(spread: Figure, filler: Filler): Figure {
  if (spread.kind === 'not-stated') return spread
  if (filler.missing) return filler.missing
  const rate = leastOf(spread.value)
  const us = rate.unit === 'ft²/gal'
  const area = us ? 1000 : 100
  const filled = area / rate.value
  const liquid = quantity(filled / (1 + filler.perLiquid), us ? 'gal' : 'L')
  const sand = filler.perLiquid > 0 ? ` ÷ ${formatNumber(1 + filler.perLiquid, 3)} (sand in the mix)` : ''
  return computed(
    liquid,
    { formula: `liquid resin per ${us ? '1,000 ft²' : '100 m²'}`, sum: `${formatNumber(area)} ÷ ${shown(rate)}${sand} = ${shown(liquid)}`, source: 'absolute volumes' },
    filler.fact ? [sourceOf('density of the sand', filler.fact)] : [],
  )
}

/** Filler and broadcast per area; null when the course has neither. */
function aggregateOf(course: Course, resin: Figure): Figure | null {
  if (!course.filler && !course.broadcast) return null
  const unit = course.broadcast ? (course.broadcast.rate.unit === 'lb/ft²' ? 'lb/ft²' : 'kg/m²') : resin.kind !== 'not-stated' && resin.value.unit === 'gal' ? 'lb/ft²' : 'kg/m²'
  const terms: { text: string; value: number }[] = []
  if (course.filler) {
    if (resin.kind === 'not-stated') return resin
    const liquid = leastOf(resin.value)
    const area = liquid.unit === 'gal' ? quantity(1000, 'ft²') : quantity(100, 'm²')
    const perArea = (valueIn(liquid, 'm³') * valueIn(course.filler.loading, 'g/L')) / valueIn(area, 'm²')
    const value = valueIn(quantity(perArea, 'kg/m²'), unit)
    terms.push({ text: `${shown(course.filler.loading)} in the mix: ${shown(quantity(value, unit))}`, value })
  }
  if (course.broadcast) {
    const value = valueIn(course.broadcast.rate, unit)
    terms.push({ text: `${shown(course.broadcast.rate)} broadcast${course.broadcast.toRefusal ? ' to refusal' : ''}`, value })
  }
  const total = quantity(terms.reduce((sum, term) => sum + term.value, 0), unit)
  return computed(total, { formula: 'aggregate per area', sum: `${terms.map(({ text }) => text).join(' + ')} = ${shown(total)}`, source: 'the build-up' })
}

/** VOC of the mix as its sheet states it, unthinned. It is never worked out from the parts' contents, which leave out water unlike by unlike. */
function vocOf(course: Course, mix: MixFacts | undefined): Figure {
  if (!mix) return noMix('voc', course)
  const fact = factsOf(mix.facts, 'voc').find((one) => !one.thinned)
  const range = rangeOf(fact)
  return fact && range ? { kind: 'fact', value: range, factId: fact.id, origin: fact.origin } : missingOfMix('voc', mix)
}

/** Everything handled in a course: the parts of its mix and its aggregates. */
export function productsOf(course: Course, { mixes, products }: Pick<EvaluationInput, 'mixes' | 'products'>): ProductFacts[] {
  const mix = course.mixId ? mixes[course.mixId] : undefined
  const sands = [course.filler?.productId, course.broadcast?.productId].flatMap((id) => (id && products[id]) || [])
  return [...(mix?.parts.map(({ product }) => product) ?? []), ...sands]
}

/** True for preparing and grinding: work on the surface that lays nothing down. */
export function isDry(course: Course): boolean {
  return (dryStages as readonly string[]).includes(course.stage)
}

/** The figures of one course at the floor's conditions; `next` is the mix laid upon it, for windows that are stated for one coat alone. */
export function courseResult(course: Course, input: EvaluationInput, next: MixFacts | undefined): CourseResult {
  const mix = course.mixId ? input.mixes[course.mixId] : undefined
  const filler = fillerOf(course, input.products)
  const films = filmsOf(course, mix, filler)
  const resinPerArea = resinOf(films.spread, filler)
  const at = (property: Property): Figure =>
    mix ? valueAt(mix.facts, { property, temperature: input.conditions.slabTemperature, mix }) : noMix(property, course)
  const handled = productsOf(course, input)
  return {
    courseId: course.id,
    wetFilm: films.wet,
    dryFilm: films.dry,
    spreadRate: films.spread,
    resinPerArea,
    aggregatePerArea: aggregateOf(course, resinPerArea),
    ...proportionsOf(mix),
    potLife: at('potLife'),
    workingTime: at('workingTime'),
    window: mix ? windowAt(mix, { temperature: input.conditions.slabTemperature, next }) : noMix('recoatWindow', course),
    footTraffic: at('footTraffic'),
    vehicleTraffic: at('vehicleTraffic'),
    fullCure: at('fullCure'),
    voc: vocOf(course, mix),
    hazards: handled.length > 0 ? unionOfHazards(handled) : null,
  }
}

