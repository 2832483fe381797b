import { type SilicaTask, silicaRule, silicaTasks } from '../reference/silica.ts'
import type { Course, EvaluationInput } from './build-up.ts'
import { handledIn, isDry } from './course-result.ts'
import { type Fact, codesOf } from './fact.ts'
import type { Handled } from './hazard.ts'

/** What a phase of the work does besides what the labels say, in neutral words, and who decides. */
export interface Caution {
  id:
    | 'dust'
    | 'sand'
    | 'isocyanate'
    | 'sensitizer'
    | 'corrosive'
    | 'flammable'
    | 'exotherm'
    | 'engines'
    | 'old-floor'
    | 'lifting'
    | 'acid'
    | 'waste'
  title: string
  says: string
  /** Who decides, beyond what any tool may say. */
  defer: string
}

export interface Dust {
  /** Rows of Table 1 that the work may be done by; empty: it is no task of that table. */
  tasks: readonly SilicaTask[]
  says: string
  source: string
}

type Method = NonNullable<Course['preparation']>['method']

/** Rows that a method may be worked by. What is in no row is assessed: shot and abrasive blasting, water jetting, flame. */
const rowsOf: Partial<Record<Method, readonly (keyof typeof silicaTasks)[]>> = {
  grinding: ['floor grinder', 'handheld grinder'],
  milling: ['floor grinder'],
  scarifying: ['floor grinder'],
  'needle scaling': ['chipping tool'],
  'handheld concrete breaker': ['chipping tool'],
}
const wetMethods: readonly Method[] = ['detergent scrubbing', 'low-pressure water cleaning', 'acid etching', 'surface retarder']

const never = 'Do not sweep dry and do not blow with compressed air.'

/** Dust of working the surface; null where the course raises none of its own. */
export function dustOf({ stage, preparation }: Pick<Course, 'stage' | 'preparation'>): Dust | null {
  const method = preparation?.method ?? (stage === 'grind' ? 'grinding' : undefined)
  if (!method || wetMethods.includes(method)) return null
  const tasks = (rowsOf[method] ?? []).map((name) => silicaTasks[name])
  const rows = tasks.map(({ row, tool }) => `${tool}, row ${row}`).join('; ')
  const says =
    tasks.length > 0
      ? `Work by Table 1 (${rows}) with all of its controls, or assess the exposure. ${never}`
      : `${method.charAt(0).toUpperCase()}${method.slice(1)} is not among the tasks of Table 1: assess the exposure before work. ${never}`
  return { tasks, says, source: silicaRule.verify }
}

const competent = 'the competent person for silica and, for respirators, the firm’s respirator program'
const hygienist = 'an industrial hygienist or the firm’s respirator program; occupational health for any sign of trouble'

/** Cautions that the codes of the labels call for. */
const byCode: readonly { pattern: RegExp; caution: Caution }[] = [
  {
    pattern: /^(H334|EUH204)$/,
    caution: {
      id: 'isocyanate',
      title: 'Sensitizes by breathing',
      says: 'Can make people allergic by breathing it, for good: asthma from then on at the least trace. Whoever has asthma or has reacted before does not work with it. Some places ask for training before first use.',
      defer: hygienist,
    },
  },
  {
    pattern: /^(H317|EUH205|EUH208)$/,
    caution: {
      id: 'sensitizer',
      title: 'Sensitizes by skin',
      says: 'Can make skin allergic, for good. Keep it off the skin, change gloves on a timer, wash with soap and water, never with solvent. A new rash ends the work for that person.',
      defer: 'the safety sheet for gloves; occupational health for any rash',
    },
  },
  {
    pattern: /^(H314|H318)$/,
    caution: {
      id: 'corrosive',
      title: 'Burns eyes and skin',
      says: 'Burns eyes and skin. Have eyewash within seconds of the mixing place; rinse for at least 15 minutes and call for help.',
      defer: 'the safety sheet; emergency services',
    },
  },
  {
    pattern: /^(H224|H225|H226|H227|EUH018|EUH209|EUH209A)$/,
    caution: {
      id: 'flammable',
      title: 'Vapor can burn',
      says: 'Remove pilot lights, heaters, hot work and sparking tools before it is opened, and ventilate until it has dried.',
      defer: 'a competent person for ventilation and the fire authority of the place',
    },
  },
]

const exotherm: Caution = {
  id: 'exotherm',
  title: 'The mixed pail heats by itself',
  says: 'Pour each mix out at once. Left in the pail it can pass 350 °F, smoke and burn. Keep clear of a smoking pail; do not cap it, bin it or pour water into it. Never mix leftovers.',
  defer: 'emergency services for a pail that smokes',
}
const sandTipping: Caution = {
  id: 'sand',
  title: 'Sand dust at the mixer',
  says: `Tipping, broadcasting and sweeping dry sand raises silica dust and is no task of Table 1: assess the exposure. ${never}`,
  defer: competent,
}
const lifting: Caution = {
  id: 'lifting',
  title: 'Lifting, kneeling, slipping',
  says: 'Bags and pails are heavy and wet resin is slippery. Use lifting aids and knee protection, and plan the way out so that nobody is boxed in.',
  defer: 'the firm’s own rules',
}
const waste: Caution = {
  id: 'waste',
  title: 'Waste',
  says: 'Unmixed parts may be hazardous waste and half-cured leftovers are the hard case. Nothing goes down a drain.',
  defer: 'the waste rules of the place',
}
const oldFloor: Caution = {
  id: 'old-floor',
  title: 'Asbestos and lead in old floors',
  says: 'Old tile, mastic and paint are presumed to hold asbestos or lead until a laboratory has tested them. Nobody grinds or blasts them before.',
  defer: 'an accredited laboratory and a licensed abatement contractor',
}
const engines: Caution = {
  id: 'engines',
  title: 'Carbon monoxide',
  says: 'Engines and unvented heaters indoors poison in minutes to hours, open doors or not. Use electric machines and monitors that sound.',
  defer: 'the competent person of the site',
}
const acid: Caution = {
  id: 'acid',
  title: 'Acid',
  says: 'Etching acid burns and its fume harms: its own safety sheet decides what to wear. Neutralize and rinse; the rinse water is waste.',
  defer: 'the acid’s safety sheet and the waste rules of the place',
}

export interface Phase {
  courseId: string
  dust: Dust | null
  cautions: readonly Caution[]
}

const codesOn = ({ facts }: Handled): string[] =>
  facts
    .filter(({ property }: Fact) => property === 'hazardStatements' || property === 'supplementalStatements')
    .flatMap((fact) => codesOf(fact).flatMap((code) => code.split('+')))

function labelCautions(handled: readonly Handled[]): Caution[] {
  const codes = new Set(handled.flatMap(codesOn))
  return byCode.flatMap(({ pattern, caution }) => ([...codes].some((code) => pattern.test(code)) ? [caution] : []))
}

/**
 * The common cautions of one step of the work: what arises in doing it and stands on no sheet, and what its labels call for. None of them says that
 * something suffices; each names who decides. Source: common practice of the trade and the rules named.
 */
export function phaseOf(course: Course, input: Pick<EvaluationInput, 'mixes' | 'products'>): Phase {
  const dust = dustOf(course)
  const etching = course.preparation?.method === 'acid etching' ? [acid] : []
  if (isDry(course)) {
    const slab = course.stage === 'prep' ? [oldFloor] : []
    return { courseId: course.id, dust, cautions: [...slab, engines, ...etching] }
  }
  const mix = course.mixId ? input.mixes[course.mixId] : undefined
  const mixed = mix && mix.parts.length > 1 ? [exotherm] : []
  const sand = (course.filler ?? course.broadcast) ? [sandTipping] : []
  return {
    courseId: course.id,
    dust,
    cautions: [...labelCautions(handledIn(course, input)), ...mixed, ...sand, ...etching, lifting, waste],
  }
}
