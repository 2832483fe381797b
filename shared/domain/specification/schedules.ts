import { factsOf } from '../fact.ts'
import { formatFigure, formatNumber, formatQuantity } from '../format.ts'
import { writtenDate } from '../sheet-age.ts'
import { valueAt } from '../sheet-table.ts'
import type { SheetSummary } from '../sheet.ts'
import { windowAt } from '../window.ts'
import type { Runs, SpecTable } from './document.ts'
import { fieldQualityTable } from './field-quality.ts'
import { type Floor, type SpecCourse, fillsByVolume, threeTemperatures } from './floor.ts'
import { hazardTable } from './hazards.ts'
import { chosen, joined, line, measured, notStatedRun, plainFigure, quoted } from './runs.ts'

/** Titles of the schedules, in their order. */
export const scheduleTitles = {
  system: 'System schedule',
  windows: 'Recoat windows by temperature',
  'pot-life': 'Pot life by temperature',
  areas: 'Areas and quantities',
  sheets: 'Products and sheets',
  hazards: 'Hazards and protective equipment by course',
  'field-quality': 'Field quality control',
  checks: 'Checks against the sheets loaded',
} as const
type ScheduleId = keyof typeof scheduleTitles

function table(id: ScheduleId, { columns, rows, note = '' }: { columns: [string, number][]; rows: Runs[][]; note?: string }): SpecTable {
  return { id, title: scheduleTitles[id], columns: columns.map(([label, width]) => ({ label, width })), rows, note }
}

const nothing: Runs = [quoted('none')]
const numbered = ({ number, course }: SpecCourse): Runs => line`${chosen(String(number))}  ${quoted(course.title)}`

function aggregateCell({ course, filler, broadcast }: SpecCourse): Runs {
  const lines = [
    ...(filler && course.filler
      ? [line`${quoted(filler.name)}, ${chosen(formatQuantity(course.filler.loading))} of liquid, in the mix`]
      : []),
    ...(broadcast && course.broadcast
      ? [
          line`${quoted(broadcast.name)}, ${chosen(formatQuantity(course.broadcast.rate))}${course.broadcast.toRefusal ? line`, to refusal` : []}`,
        ]
      : []),
  ]
  return lines.length > 0 ? joined(lines, '; ') : nothing
}

function systemSchedule({ courses, register }: Floor): SpecTable {
  const rows = courses.map((one): Runs[] => {
    const { course, mix, result } = one
    if (!mix) {
      const { method, profile } = course.preparation ?? {}
      const work = method ? line`${quoted(method)}${profile === undefined ? [] : line`, ${chosen(`CSP ${profile}`)}`}` : notStatedRun()
      return [numbered(one), work, [quoted('–')], [quoted('–')], [quoted('–')], nothing]
    }
    if (fillsByVolume(one))
      return [
        numbered(one),
        [quoted(mix.name)],
        line`as the joints and cracks take: schedule of areas`,
        [quoted('–')],
        [quoted('–')],
        aggregateCell(one),
      ]
    return [
      numbered(one),
      [quoted(mix.name)],
      register.figure(result.spreadRate),
      register.figure(result.wetFilm),
      register.figure(result.dryFilm),
      aggregateCell(one),
    ]
  })
  return table('system', {
    columns: [
      ['Course', 22],
      ['Mix or work', 18],
      ['Spread rate', 15],
      ['Wet film', 13],
      ['Dry film', 13],
      ['Aggregate', 19],
    ],
    rows,
    note: 'From the slab upward.',
  })
}

type Question = (
  one: SpecCourse & { mix: NonNullable<SpecCourse['mix']> },
  temperature: ReturnType<typeof threeTemperatures>[number],
) => Runs

/** A schedule by temperature; outside a sheet's table a cell says so. */
function byTemperature(
  floor: Floor,
  id: ScheduleId,
  { ask, atSite, note }: { ask: Question; atSite: (one: SpecCourse) => Runs; note: string },
): SpecTable {
  const temperatures = threeTemperatures(floor)
  const laid = floor.courses.flatMap((one) => (one.mix ? [{ ...one, mix: one.mix }] : []))
  const { slabTemperature } = floor.given.input.conditions
  return table(id, {
    columns: [
      ['Course', 24],
      ...temperatures.map((one): [string, number] => [formatQuantity(one), 19]),
      [`Slab of this job, ${formatQuantity(slabTemperature)}`, 19],
    ],
    rows: laid.map((one) => [
      line`${numbered(one)}, ${quoted(one.mix.name)}`,
      ...temperatures.map((temperature) => ask(one, temperature)),
      atSite(one),
    ]),
    note,
  })
}

const windows = (floor: Floor): SpecTable =>
  byTemperature(floor, 'windows', {
    ask: ({ mix, next }, temperature) => floor.register.figure(windowAt(mix, { temperature, next }), { window: true }),
    atSite: ({ result }) => floor.register.figure(result.window, { window: true }),
    note: 'Counted from the start of the course. Values between two columns of a sheet are interpolated in its own table and never run beyond it.',
  })

const potLives = (floor: Floor): SpecTable =>
  byTemperature(floor, 'pot-life', {
    ask: ({ mix }, temperature) => floor.register.figure(valueAt(mix.facts, { property: 'potLife', temperature, mix })),
    atSite: ({ result }) => floor.register.figure(result.potLife),
    note: 'Of the amount that the sheet states it for. A larger mass in the pail lives shorter.',
  })

function areas({ given, quantities, register }: Floor): SpecTable {
  const bays = given.bays.map((bay): Runs[] => [[quoted(bay.name)], [measured(formatQuantity(bay.area))], [quoted('bay')]])
  const needs = quantities.flatMap(({ title, mix, total, packing, aggregates }): Runs[][] => {
    const packs = packing.plan?.lines.map(({ pack, count: many }) => `${many} × ${formatQuantity(pack.size)}`).join(', ')
    const kits =
      packs &&
      register.working(packs, {
        formula: 'whole kits',
        sum: `${formatFigure(total)}: ${packs}`,
        source: packing.perBay ? 'packs of the sheet, counted bay by bay' : 'packs of the sheet',
        facts: factsOf(given.input.mixes[mix.id]?.facts ?? [], 'packSize'),
      })
    return [
      [
        line`${quoted(title)}: ${quoted(mix.name)}`,
        register.figure(total),
        kits ? line`whole kits: ${kits}` : line`kits: ${notStatedRun()}`,
      ],
      ...aggregates.map(({ product, mass, use }): Runs[] => [
        line`${quoted(title)}: ${quoted(product.name)}`,
        register.figure(mass),
        [quoted(use === 'filler' ? 'in the mix' : 'broadcast')],
      ]),
    ]
  })
  const { percent, convention } = given.loss
  return table('areas', {
    columns: [
      ['Bay, or material by course', 46],
      ['Area or amount', 27],
      ['Remark', 27],
    ],
    rows: [...bays, ...needs],
    note: `Liquid resin with loss of ${formatNumber(percent)} % ${convention === 'lost' ? 'of what is mixed' : 'added to what is needed'}.`,
  })
}

function sheetCell(sheets: readonly SheetSummary[], kind: SheetSummary['kind'], elsewhere: string | false): Runs {
  const found = sheets.filter((sheet) => sheet.kind === kind)
  if (found.length === 0) return [elsewhere ? quoted(elsewhere) : plainFigure('no sheet loaded', 'not-stated')]
  return joined(
    found.map(
      (sheet) => line`${quoted(sheet.title)}, ${measured(writtenDate(sheet.revisionDate))}${sheet.superseded ? line` (superseded)` : []}`,
    ),
    '; ',
  )
}

const hasSheet = ({ sheets }: { sheets: readonly SheetSummary[] }, kind: SheetSummary['kind']) =>
  sheets.some((sheet) => sheet.kind === kind)

const sheetSchedule = ({ mixes, products }: Floor): SpecTable =>
  table('sheets', {
    columns: [
      ['Product or mix', 24],
      ['Maker', 12],
      ['Data sheet, revision', 32],
      ['Safety sheet, revision', 32],
    ],
    rows: [
      ...mixes.map(({ name, maker, sheets, parts }) => [
        [quoted(name)],
        [quoted(maker)],
        sheetCell(sheets, 'data', false),
        sheetCell(sheets, 'safety', parts.every(({ product }) => hasSheet(product, 'safety')) && 'one for each part, below'),
      ]),
      ...products.map((product) => {
        const ofMixes = mixes.filter(({ parts }) => parts.some((part) => part.product.id === product.id))
        const parts = ofMixes.length > 0 && ofMixes.every((mix) => hasSheet(mix, 'data'))
        const covered = ofMixes.length > 0 && ofMixes.every((mix) => hasSheet(mix, 'safety'))
        return [
          [quoted(product.name)],
          [quoted(product.maker)],
          sheetCell(product.sheets, 'data', parts && 'that of the mix, above'),
          sheetCell(product.sheets, 'safety', covered && 'that of the mix, above'),
        ]
      }),
    ],
    note: 'Sheets at the revision that this section rests on.',
  })

const statusWords = { stop: 'not met', caution: 'caution', unknown: 'unknown', met: 'met' } as const

function checkSchedule({ evaluation, courses }: Floor): SpecTable {
  const titleOf = (id: string | null) => courses.find(({ course }) => course.id === id)?.course.title ?? 'the floor'
  return table('checks', {
    columns: [
      ['Check', 18],
      ['Of', 15],
      ['Result', 10],
      ['What it says', 34],
      ['Compared with', 23],
    ],
    rows: evaluation.findings.map((finding) => [
      [quoted(finding.title)],
      [quoted(titleOf(finding.courseId))],
      [quoted(statusWords[finding.status])],
      [quoted(finding.says)],
      [quoted(finding.source)],
    ]),
    note: 'Worked out at the conditions of this section. “Met” means met against the sheets loaded, and no more.',
  })
}

/** The schedules that follow the parts. */
export function schedules(floor: Floor): SpecTable[] {
  const all = [
    systemSchedule(floor),
    windows(floor),
    potLives(floor),
    areas(floor),
    sheetSchedule(floor),
    hazardTable(floor, scheduleTitles.hazards),
    fieldQualityTable(floor, scheduleTitles['field-quality']),
    checkSchedule(floor),
  ]
  return all.filter(({ rows }) => rows.length > 0)
}
