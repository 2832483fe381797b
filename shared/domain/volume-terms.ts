import type { Course, EvaluationInput } from './build-up.ts'
import { dryStages } from './build-up.ts'
import type { CourseResult } from './evaluation.ts'
import { type Figure, notStated } from './figure.ts'
import { filledYield } from './filled-mix.ts'
import { volumeOfFilm, withLoss } from './film.ts'
import { formatNumber, formatRange } from './format.ts'
import type { Bay, Loss } from './job.ts'
import { jointVolume } from './joint.ts'
import { spallVolume } from './spall.ts'
import { type Quantity, quantity, valueIn } from './units.ts'
import { type Source, computed, mapRange, point, sourceOf, sourcesOf, sumOf } from './working.ts'

/** The terms of a bay's volume of mixed liquid resin; null where a course has no such term. */
export interface BayTerms {
  area: Bay['area']
  film: Figure | null
  texture: Figure | null
  joints: Figure | null
  spalls: Figure | null
  loss: Figure | null
  total: Figure
}

/** What a course fills besides its film: the texture of the prepared slab, joints, spalls. */
export interface Fills {
  film: boolean
  texture: boolean
  joints: boolean
  spalls: boolean
}

const namesJoints = /joint|crack|groove/i
const namesSpalls = /spall|patch|hole|repair/i
const isDry = ({ stage }: Course) => (dryStages as readonly string[]).includes(stage)
const laysFilm = (course: Course) => course.mixId !== null && !isDry(course) && course.stage !== 'fill' && course.stage !== 'cove'

/**
 * Texture is filled by the first film on the prepared slab. Joints and spalls are filled by the fill courses: by all alike, unless a title names
 * one of the two alone and so leaves the other to another course.
 */
export function fillsOf(course: Course, courses: readonly Course[]): Fills {
  const fill = course.stage === 'fill'
  const [joints, spalls] = [namesJoints.test(course.title), namesSpalls.test(course.title)]
  const several = courses.filter(({ stage, mixId }) => stage === 'fill' && mixId !== null).length > 1
  return {
    film: laysFilm(course),
    texture: courses.find(laysFilm)?.id === course.id,
    joints: fill && (!several || joints || !spalls),
    spalls: fill && (!several || spalls || !joints),
  }
}

interface TermsGiven {
  course: Course
  result: CourseResult
  fills: Fills
  floor: Pick<EvaluationInput, 'products'>
  texture: Quantity | null
  loss: Loss
}

/** Every term of one bay. Gallons where the bay is measured in square feet, else litres. */
export function bayTerms(bay: Bay, { course, result, fills, floor, texture, loss }: TermsGiven): BayTerms {
  const unit = bay.area.unit === 'ft²' ? 'gal' : 'L'
  const placed = (volume: Quantity, working: PlacedWorking) => liquidOf(volume, { unit, working, course, products: floor.products })
  const film = fills.film ? filmTerm(bay, { result, unit }) : course.stage === 'cove' ? coveTerm(course) : null
  const textured =
    fills.texture && texture
      ? placed(volumeOfFilm({ area: bay.area, film: texture }), {
          formula: 'texture = area × mean texture depth',
          sum: `${shown(bay.area)} × ${shown(texture)}`,
        })
      : null
  const joints =
    fills.joints && bay.joints.length > 0
      ? placed(jointsVolume(bay), { formula: 'joints = Σ length × width × depth', sum: bay.joints.map(jointText).join(' + ') })
      : null
  const spalls =
    fills.spalls && bay.spalls
      ? placed(spallVolume(bay.spalls), {
          formula: 'spalls = area × mean depth',
          sum: `${shown(bay.spalls.area)} × ${shown(bay.spalls.meanDepth)}`,
        })
      : null
  const terms = [film, textured, joints, spalls].filter((term) => term !== null)
  const net =
    terms.length > 0
      ? sumFigures(terms, 'sum of the terms')
      : computed(quantity(0, unit), { formula: 'nothing to fill', sum: `no joints or spalls in ${bay.name}`, source: 'the survey' })
  return { area: bay.area, film, texture: textured, joints, spalls, loss: lossTerm(net, loss), total: totalTerm(net, loss) }
}

const shown = (amount: Quantity) => formatRange(point(amount))
const jointText = ({ length, width, depth }: Bay['joints'][number]) => `${shown(length)} × ${shown(width)} × ${shown(depth)}`
const jointsVolume = ({ joints }: Bay) =>
  quantity(
    joints.reduce((sum, joint) => sum + jointVolume(joint).value, 0),
    'm³',
  )

/** Area × liquid resin per area. Resin per area is gallons for 1,000 ft² or litres for 100 m² (`CourseResult.resinPerArea`). */
function filmTerm({ area }: Bay, { result: { resinPerArea }, unit }: { result: CourseResult; unit: 'gal' | 'L' }): Figure {
  if (resinPerArea.kind === 'not-stated') return resinPerArea
  const us = resinPerArea.value.unit === 'gal'
  const per = us ? quantity(1000, 'ft²') : quantity(100, 'm²')
  const times = valueIn(area, 'm²') / valueIn(per, 'm²')
  const value = mapRange(resinPerArea.value, unit, (amount) => valueIn({ value: amount * times, unit: resinPerArea.value.unit }, unit))
  const sum = `${shown(area)} × ${formatRange(resinPerArea.value)} per ${us ? '1,000 ft²' : '100 m²'} = ${formatRange(value)}`
  return computed(
    value,
    { formula: 'film = area × liquid resin per area', sum, source: 'the build-up and the survey' },
    sourcesOf('resin per area', resinPerArea),
  )
}

function coveTerm({ title }: Course): Figure {
  return notStated('consumption', {
    of: title,
    subject: null,
    ask: 'whoever surveys the floor',
    because: 'the length of the cove is not measured',
  })
}

interface PlacedWorking {
  formula: string
  sum: string
}

/** Liquid resin in a volume filled with the mix as placed: volume ÷ what a litre of liquid yields with its sand. */
function liquidOf(
  volume: Quantity,
  { unit, working, course, products }: { unit: 'gal' | 'L'; working: PlacedWorking; course: Course; products: EvaluationInput['products'] },
): Figure {
  const filled = filledYield(course, products)
  if ('missing' in filled) return filled.missing
  const liquid = quantity(valueIn(volume, unit) / filled.perLiquid, unit)
  const sand = filled.perLiquid > 1 ? ` ÷ ${formatNumber(filled.perLiquid, 3)} (sand in the mix)` : ''
  const from: Source[] = filled.fact ? [sourceOf('density of the sand', filled.fact)] : []
  return computed(liquid, { formula: working.formula, sum: `${working.sum}${sand} = ${shown(liquid)}`, source: 'the survey' }, from)
}

/** Sum of figures; the first that is not stated keeps the sum from being stated. */
export function sumFigures(figures: readonly Figure[], formula: string): Figure {
  const missing = figures.find((figure) => figure.kind === 'not-stated')
  if (missing) return missing
  const known = figures.filter((figure) => figure.kind !== 'not-stated')
  const [only] = known
  if (only && known.length === 1) return only
  const value = sumOf(
    known.map((figure) => figure.value),
    only?.value.unit ?? 'gal',
  )
  const sum = `${known.map((figure) => formatRange(figure.value)).join(' + ')} = ${formatRange(value)}`
  return computed(value, { formula, sum, source: 'the terms' }, uniqueSources(known.flatMap((figure) => sourcesOf(formula, figure))))
}

function uniqueSources(sources: readonly Source[]): Source[] {
  return [...new Map(sources.map((source) => [source.factId ?? source.label, source])).values()]
}

const lossText = ({ percent, convention }: Loss) =>
  convention === 'lost' ? `÷ (1 − ${formatNumber(percent)} %)` : `× (1 + ${formatNumber(percent)} %)`
const lossFormula = ({ convention }: Loss) =>
  convention === 'lost' ? 'a share of what is ordered is lost: net ÷ (1 − loss)' : 'an addition on top: net × (1 + loss)'

function totalTerm(net: Figure, loss: Loss): Figure {
  if (net.kind === 'not-stated' || loss.percent === 0) return net
  const value = mapRange(net.value, net.value.unit, (amount) => withLoss(amount, loss))
  const sum = `${formatRange(net.value)} ${lossText(loss)} = ${formatRange(value)}`
  return computed(value, { formula: lossFormula(loss), sum, source: 'the job' }, sourcesOf('net', net))
}

function lossTerm(net: Figure, loss: Loss): Figure | null {
  if (net.kind === 'not-stated' || loss.percent === 0) return null
  const value = mapRange(net.value, net.value.unit, (amount) => withLoss(amount, loss) - amount)
  const sum = `${formatRange(net.value)} ${lossText(loss)} − ${formatRange(net.value)} = ${formatRange(value)}`
  return computed(value, { formula: lossFormula(loss), sum, source: 'the job' }, sourcesOf('net', net))
}
