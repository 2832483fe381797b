import type { Course, EvaluationInput } from './build-up.ts'
import { type Fact, factOf, rangeOf } from './fact.ts'
import { type Figure, notStated } from './figure.ts'
import { filledYield } from './filled-mix.ts'
import { type Film, type Spread, spreadOfWetFilm, wetFilmOfSpread } from './film.ts'
import { formatNumber, formatRange } from './format.ts'
import type { MixFacts } from './mix.ts'
import type { Range } from './property.ts'
import { type Quantity, type Unit, convert, quantity, valueIn } from './units.ts'
import { computed, leastOf, mapRange, point, sourceOf, sourcesOf } from './working.ts'

type Thickness = NonNullable<Course['thickness']>

const shown = (value: Quantity) => formatRange(point(value))

/** What a sheet of the mix does not state of a course's film. */
function missingSolids(mix: MixFacts | undefined, course: Course, because?: string): Figure {
  if (!mix)
    return notStated('volumeSolids', {
      of: course.title,
      subject: null,
      ask: 'whoever builds this up',
      because: 'no mix is chosen for this course',
    })
  return notStated('volumeSolids', {
    of: mix.name,
    subject: { kind: 'mix', id: mix.id },
    ask: 'the maker, in writing',
    ...(because ? { because } : {}),
  })
}

function noThickness(course: Course): Figure {
  return notStated('filmThickness', {
    of: course.title,
    subject: null,
    ask: 'whoever builds this up',
    because: 'neither thickness nor spread rate is given',
  })
}

/** Sand in the pail: its volume per volume of liquid resin, or the figure that is missing. */
export type Filler = { perLiquid: number; missing?: undefined; fact: Fact | undefined } | { perLiquid?: undefined; missing: Figure }

export function fillerOf(course: Course, products: EvaluationInput['products']): Filler {
  const filled = filledYield(course, products)
  return 'missing' in filled ? { missing: filled.missing } : { perLiquid: filled.perLiquid - 1, fact: filled.fact }
}

/** Dry film per wet film, as a range of fractions with the fact it rests on; or the figure that is missing. */
type Share = { range: Range; fact: Fact } | { missing: Figure }

/** Solids of the liquid and the sand in it, over both. What a sheet gives as a least only ends at 100 %; a greatest alone tells nothing of the least. */
function shareOf(course: Course, mix: MixFacts | undefined, filler: Filler): Share {
  const fact = mix && factOf(mix.facts, 'volumeSolids')
  const solids = rangeOf(fact)
  if (!fact || !solids) return { missing: missingSolids(mix, course) }
  if (solids.min === undefined) return { missing: missingSolids(mix, course, 'the sheet states the greatest only') }
  if (filler.missing) return { missing: filler.missing }
  const { perLiquid } = filler
  return {
    fact,
    range: mapRange({ ...solids, max: solids.max ?? 100 }, '%', (percent) => (100 * (percent / 100 + perLiquid)) / (1 + perLiquid)),
  }
}

export interface Films {
  wet: Figure
  dry: Figure
  spread: Figure
}

/** Wet film, dry film and spread rate from whichever of them the course gives. */
export function filmsOf(course: Course, mix: MixFacts | undefined, filler: Filler): Films {
  const share = shareOf(course, mix, filler)
  if (course.thickness?.film === 'dry') return fromDry(course.thickness, share)
  const wet = course.thickness ? chosen(course.thickness, 'wet') : course.spreadRate ? wetOf(course.spreadRate) : undefined
  if (!wet) return { wet: noThickness(course), dry: noThickness(course), spread: noThickness(course) }
  return { wet, dry: dryOf(wet.value, share), spread: course.spreadRate ? chosen(course.spreadRate, 'of the mix') : spreadOf(wet) }
}

/** What a person chose for a course is a figure too. */
function chosen({ value, unit }: Quantity, how: string) {
  return computed({ value, unit }, { formula: 'chosen for this course', sum: `${shown({ value, unit })} ${how}`, source: 'the build-up' })
}

function fromDry({ value, unit }: Thickness, share: Share): Films {
  const dry = chosen({ value, unit }, 'dry')
  if ('missing' in share) return { wet: share.missing, dry, spread: share.missing }
  const { min = 100, max = 100 } = share.range
  const film: Range = { min: (value * 100) / max, max: (value * 100) / min, unit }
  const wet = computed(
    film,
    {
      formula: 'wet film = dry film ÷ solids',
      sum: `${shown({ value, unit })} ÷ ${percents(share.range)} = ${formatRange(film)}`,
      source: 'definition of solids by volume',
    },
    [sourceOf('solids by volume', share.fact)],
  )
  return { wet, dry, spread: spreadOf(wet) }
}

const percents = ({ min = 100, max = 100 }: Range) =>
  min === max ? `${formatNumber(min, 1)} %` : `${formatNumber(min, 1)}–${formatNumber(max, 1)} %`

function dryOf(wet: Range, share: Share): Figure {
  if ('missing' in share) return share.missing
  const { value, unit } = leastOf(wet)
  const dry = mapRange(share.range, unit, (percent) => (value * percent) / 100)
  return computed(
    dry,
    {
      formula: 'dry film = wet film × solids',
      sum: `${shown({ value, unit })} × ${percents(share.range)} = ${formatRange(dry)}`,
      source: 'definition of solids by volume',
    },
    [sourceOf('solids by volume', share.fact)],
  )
}

const constantOf = (unit: Unit) => (unit === 'ft²/gal' ? '1,604.17 ft²·mil/gal' : '1,000 m²·µm/L')
const definitions = 'definitions of gallon, foot and mil'

function wetOf(spread: Spread) {
  const film = wetFilmOfSpread(spread)
  return computed(film, {
    formula: 'wet film = volume ÷ area',
    sum: `${constantOf(spread.unit)} ÷ ${shown(spread)} = ${shown(film)}`,
    source: definitions,
  })
}

/** Spread rate of a wet film: the thicker the film, the less area. */
function spreadOf(wet: Extract<Figure, { kind: 'computed' }>): Figure {
  const { min, max, unit } = wet.value
  const of = (value: number | undefined) => spreadOfWetFilm({ value: value ?? Number.NaN, unit } as Film)
  const [least, greatest] = [of(max), of(min)]
  const spread: Range = { min: least.value, max: greatest.value, unit: least.unit }
  const film = mapRange(
    wet.value,
    least.unit === 'ft²/gal' ? 'mil' : 'µm',
    (value) => convert({ value, unit }, least.unit === 'ft²/gal' ? 'mil' : 'µm').value,
  )
  return computed(
    spread,
    {
      formula: 'spread rate = area ÷ volume',
      sum: `${constantOf(least.unit)} ÷ ${formatRange(film)} = ${formatRange(spread)}`,
      source: definitions,
    },
    sourcesOf('wet film', wet),
  )
}

/** Liquid resin for 1,000 ft² in gallons, or for 100 m² in litres: area ÷ spread rate ÷ yield of the filled mix; the most that the film can take. */
export function resinOf(spread: Figure, filler: Filler): Figure {
  if (spread.kind === 'not-stated') return spread
  if (filler.missing) return filler.missing
  const rate = leastOf(spread.value)
  const us = rate.unit === 'ft²/gal'
  const area = us ? 1000 : 100
  const liquid = quantity(area / rate.value / (1 + filler.perLiquid), us ? 'gal' : 'L')
  const sand = filler.perLiquid > 0 ? ` ÷ ${formatNumber(1 + filler.perLiquid, 3)} (sand in the mix)` : ''
  return computed(
    liquid,
    {
      formula: `liquid resin per ${us ? '1,000 ft²' : '100 m²'}`,
      sum: `${formatNumber(area)} ÷ ${shown(rate)}${sand} = ${shown(liquid)}`,
      source: 'absolute volumes',
    },
    [...sourcesOf('spread rate', spread), ...(filler.fact ? [sourceOf('density of the sand', filler.fact)] : [])],
  )
}

/** Filler and broadcast per area; null when the course has neither. */
export function aggregateOf({ filler, broadcast }: Course, resin: Figure): Figure | null {
  if (!filler && !broadcast) return null
  if (filler && resin.kind === 'not-stated') return resin
  const us = broadcast ? broadcast.rate.unit === 'lb/ft²' : resin.kind !== 'not-stated' && resin.value.unit === 'gal'
  const unit = us ? 'lb/ft²' : 'kg/m²'
  const inPail = filler && resin.kind !== 'not-stated' ? perArea(leastOf(resin.value), filler.loading) : null
  const terms = [
    ...(filler && inPail
      ? [{ value: valueIn(inPail, unit), text: `${shown(filler.loading)} in the mix: ${shown(convert(inPail, unit))}` }]
      : []),
    ...(broadcast
      ? [{ value: valueIn(broadcast.rate, unit), text: `${shown(broadcast.rate)} broadcast${broadcast.toRefusal ? ' to refusal' : ''}` }]
      : []),
  ]
  const total = quantity(
    terms.reduce((sum, { value }) => sum + value, 0),
    unit,
  )
  const sum = `${terms.map(({ text }) => text).join(' + ')} = ${shown(total)}`
  return computed(
    total,
    { formula: 'aggregate per area', sum, source: 'the build-up' },
    inPail && resin.kind !== 'not-stated' ? sourcesOf('resin per area', resin) : [],
  )
}

/** Sand that goes with the liquid resin of 1,000 ft² or 100 m², spread over one. */
function perArea(liquid: Quantity, loading: Quantity): Quantity {
  const area = liquid.unit === 'gal' ? quantity(1000, 'ft²') : quantity(100, 'm²')
  return quantity((valueIn(liquid, 'm³') * valueIn(loading, 'g/L')) / valueIn(area, 'm²'), 'kg/m²')
}
