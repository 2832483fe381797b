import type { Figure } from '../figure.ts'
import { formatNumber, formatRange } from '../format.ts'
import { valueIn } from '../units.ts'
import { type Check, type Laid, type Verdict, resinCourses, unknown } from './check.ts'

const hours = (value: number) => `${formatNumber(value, 1)} h`

interface Gap {
  laid: Laid
  beneath: Laid
  window: Figure
  /** Hours between the start of the course beneath and of this one; undefined when either start is not known. */
  gap: number | undefined
}

function gapsOf(laid: readonly Laid[]): Gap[] {
  return laid.flatMap((one) => {
    const { beneath, time } = one
    if (!beneath) return []
    const gap = time.start === null || beneath.time.start === null ? undefined : time.start - beneath.time.start
    return [{ laid: one, beneath, window: beneath.result.window, gap }]
  })
}

/** One end of the window in hours; undefined when that end is not stated. */
function endOf(window: Figure, side: 'min' | 'max'): number | undefined {
  const value = window.kind === 'not-stated' ? undefined : window.value[side]
  return window.kind === 'not-stated' || value === undefined ? undefined : valueIn({ value, unit: window.value.unit }, 'h')
}

/** An end that no sheet states, as a missing figure. */
function openEnd({ laid, beneath, window }: Gap, which: 'earliest' | 'latest'): Verdict {
  const name = beneath.mix?.name ?? beneath.course.title
  if (window.kind === 'not-stated')
    return unknown(
      laid.course.id,
      `No recoat window of ${name} is stated at this temperature${window.missing.because ? `: ${window.missing.because}` : ''}.`,
      [window],
    )
  const subject = beneath.mix ? { kind: 'mix' as const, id: beneath.mix.id } : null
  const missing = {
    property: 'recoatWindow' as const,
    part: 'mixed' as const,
    of: name,
    subject,
    ask: 'the maker, in writing',
    because: `the ${which} time is not stated`,
  }
  return {
    ...unknown(laid.course.id, `The sheet of ${name} states no ${which} time for the next coat.`, [missing]),
    figures: [{ label: 'window beneath', figure: window }],
  }
}

function noStart({ laid, beneath, window }: Gap): Verdict {
  const says = `When this course starts after ${beneath.course.title} is not known.`
  return {
    ...unknown(laid.course.id, says, [window]),
    todo: 'Plan a start for this course, or settle what is missing beneath it.',
    figures: [{ label: 'window beneath', figure: window }],
  }
}

export const windowOpens: Check = {
  id: 'window-opens',
  title: 'Not before the window opens',
  needs: ['recoatWindow of the course beneath', 'planned starts'],
  source: 'the data sheet of the mix beneath, at the slab temperature',
  run: (floor) =>
    gapsOf(resinCourses(floor)).map((gap): Verdict => {
      const min = endOf(gap.window, 'min')
      if (min === undefined) return openEnd(gap, 'earliest')
      if (gap.gap === undefined) return noStart(gap)
      const met = gap.gap >= min - 1e-9
      return {
        courseId: gap.laid.course.id,
        status: met ? 'met' : 'stop',
        says: `Laid ${hours(gap.gap)} after ${gap.beneath.course.title}, whose window opens at ${hours(min)}.`,
        todo: `Wait ${hours(min - gap.gap)} longer.`,
        figures: [{ label: 'window beneath', figure: gap.window }],
      }
    }),
}

export const windowCloses: Check = {
  id: 'window-closes',
  title: 'Before the window closes',
  needs: ['recoatWindow of the course beneath', 'planned starts'],
  source: 'the data sheet of the mix beneath, at the slab temperature',
  run: (floor) =>
    gapsOf(resinCourses(floor)).map((gap): Verdict => {
      const { laid, beneath, window } = gap
      if (laid.onGroundSurface) {
        const says = `${beneath.course.title} is ground before this course: the bond is mechanical, and the ground surface holds only while it is clean and dry.`
        return { courseId: laid.course.id, status: 'met', says, figures: [{ label: 'window beneath', figure: window }] }
      }
      const max = endOf(window, 'max')
      if (max === undefined) return openEnd(gap, 'latest')
      if (gap.gap === undefined) return noStart(gap)
      const met = gap.gap <= max + 1e-9
      return {
        courseId: laid.course.id,
        status: met ? 'met' : 'stop',
        says: `Laid ${hours(gap.gap)} after ${beneath.course.title}, whose window closes at ${window.kind === 'not-stated' ? '' : formatRange({ min: window.value.max, max: window.value.max, unit: window.value.unit })}.`,
        todo: `Start ${hours(gap.gap - max)} earlier. Past the window the sheet’s own words say what to do; where it says nothing, ask the maker in writing.`,
        figures: [{ label: 'window beneath', figure: window }],
      }
    }),
}
