import type { Figure, Missing } from '../figure.ts'
import { formatNumber, formatQuantity } from '../format.ts'
import { valueIn } from '../units.ts'
import { type Check, type Floor, type Laid, type Verdict, resinCourses, unchosen, unknown, unstatedOfMix } from './check.ts'

/** To a hundredth of an hour; less than an hour in minutes, so that nothing is ever said to be 0 h late. */
const hours = (value: number) =>
  value > 0 && value < 1 ? `${formatNumber(Math.max(1, value * 60), 0)} min` : `${formatNumber(value, 2)} h`
/** Hours are compared to a millionth: what a planner types and what the table gives are the same number then. */
const slack = 1e-6

interface Gap {
  laid: Laid
  beneath: Laid
  window: Figure
  /** Hours between the start of the course beneath and of this one; undefined when either start is not known. */
  gap: number | undefined
}

function gapsOf(floor: Floor): Gap[] {
  return resinCourses(floor).flatMap((laid) => {
    const { beneath, time } = laid
    if (!beneath) return []
    const gap = time.start === null || beneath.time.start === null ? undefined : time.start - beneath.time.start
    return [{ laid, beneath, window: beneath.result.window, gap }]
  })
}

/** One end of the window: in hours and as the sheet writes it; undefined when that end is not stated. */
function endOf(window: Figure, side: 'min' | 'max'): { hours: number; text: string } | undefined {
  if (window.kind === 'not-stated') return undefined
  const value = window.value[side]
  if (value === undefined) return undefined
  const at = { value, unit: window.value.unit }
  const [counted, stated] = [valueIn(at, 'h'), formatQuantity(at)]
  return { hours: counted, text: at.unit === 'h' ? stated : `${stated} (${hours(counted)})` }
}

const known = (window: Figure) => (window.kind === 'not-stated' ? [] : [{ label: 'window beneath', figure: window }])

/** An end that no sheet states, as a missing figure. */
function openEnd({ laid, beneath, window }: Gap, which: 'earliest' | 'latest'): Verdict {
  const { mix, course } = beneath
  if (window.kind === 'not-stated') {
    const { because } = window.missing
    const why = because ? `: ${because}` : ''
    return unknown(laid.course.id, `No recoat window of ${mix?.name ?? course.title} is known at this temperature${why}.`, [window])
  }
  const because = `the ${which} time is not stated`
  const missing = mix ? unstatedOfMix('recoatWindow', mix, because) : unchosen('recoatWindow', course.title, because)
  const says = `The sheet of ${mix?.name ?? course.title} states no ${which} time for the next coat.`
  return { ...unknown(laid.course.id, says, [missing]), figures: known(window) }
}

/** The windows beneath that leave a start open, from this course down. */
function openBeneath({ beneath }: Laid): Figure[] {
  if (!beneath) return []
  const { window } = beneath.result
  return window.kind === 'not-stated' || window.value.min === undefined ? [window] : openBeneath(beneath)
}

function noStart({ laid, beneath, window }: Gap): Verdict {
  const says = `When this course starts after ${beneath.course.title} is not known.`
  const start: Missing = {
    ...unchosen('recoatWindow', laid.course.title, 'its start is not planned and does not follow from the windows beneath'),
    ask: 'whoever plans the work',
  }
  return {
    ...unknown(laid.course.id, says, [start, ...openBeneath(laid)]),
    todo: 'Plan a start for this course, or settle what is missing beneath it.',
    figures: known(window),
  }
}

function opensVerdict(gap: Gap): Verdict {
  const opens = endOf(gap.window, 'min')
  if (!opens) return openEnd(gap, 'earliest')
  if (gap.gap === undefined) return noStart(gap)
  const short = opens.hours - gap.gap
  return {
    courseId: gap.laid.course.id,
    status: short <= slack ? 'met' : 'stop',
    says: `Laid ${hours(gap.gap)} after ${gap.beneath.course.title}, whose window opens at ${opens.text}.`,
    todo: `Wait ${hours(short)} longer.`,
    figures: known(gap.window),
  }
}

export const windowOpens: Check = {
  id: 'window-opens',
  title: 'Not before the window opens',
  needs: ['recoat window of the course beneath', 'planned starts'],
  source: 'the data sheet of the mix beneath, at the slab temperature',
  severity: 'Stop: too early a coat traps what has yet to leave the film beneath, which stays soft or wrinkles.',
  run: (floor) => gapsOf(floor).map(opensVerdict),
}

function closesVerdict(gap: Gap): Verdict {
  const { laid, beneath, window } = gap
  if (laid.onGroundSurface) {
    const says = `${beneath.course.title} is ground before this course: the bond is mechanical, and the ground surface holds only while it is clean and dry.`
    return {
      courseId: laid.course.id,
      status: 'met',
      says,
      figures: known(window),
      source: 'common practice: grinding all over renews the surface',
    }
  }
  const closes = endOf(window, 'max')
  if (!closes) return openEnd(gap, 'latest')
  if (gap.gap === undefined) return noStart(gap)
  const late = gap.gap - closes.hours
  return {
    courseId: laid.course.id,
    status: late <= slack ? 'met' : 'stop',
    says: `Laid ${hours(gap.gap)} after ${beneath.course.title}, whose window closes at ${closes.text}.`,
    todo: `Start ${hours(late)} earlier, or plan to grind the coat beneath. Past the window the sheet’s own words say what to do; where it says nothing, ask the maker in writing.`,
    figures: known(window),
  }
}

export const windowCloses: Check = {
  id: 'window-closes',
  title: 'Before the window closes',
  needs: ['recoat window of the course beneath', 'planned starts'],
  source: 'the data sheet of the mix beneath, at the slab temperature',
  severity: 'Stop: past its window a film no longer bonds to the next by itself; the coat peels. Grinding between renews the surface.',
  run: (floor) => gapsOf(floor).map(closesVerdict),
}
