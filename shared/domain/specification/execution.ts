import { dryStages } from '../build-up.ts'
import { formatQuantity } from '../format.ts'
import type { Article, Item } from './document.ts'
import { type Floor, type SpecCourse, fillsByVolume } from './floor.ts'
import { moistureTests } from './moisture-tests.ts'
import { chosen, item, line, measured, notStatedRun, plain, quoted, standard } from './runs.ts'
import { statedOfEach } from './stated.ts'

/** Where the first course that lays something down stands; what is before it is preparation. */
function firstLaid({ courses }: Floor): number {
  const at = courses.findIndex((one) => !isDry(one))
  return at < 0 ? courses.length : at
}

const isDry = ({ course }: SpecCourse) => (dryStages as readonly string[]).includes(course.stage)

function examination(floor: Floor): Item[] {
  const { substrateRelativeHumidity, moistureEmission } = floor.given.input.conditions
  return [
    item(
      line`Examine the slab with the owner. Report in writing contamination, moving joints, cracks, weak concrete, old coatings and missing vapor retarder. Do not begin until the report is answered.`,
    ),
    item(line`Test moisture in the slab after ${standard('ASTM F2170')} or ${standard('ASTM F1869')}: ${moistureTests(floor)}, at least.`, [
      item(
        line`Relative humidity in the slab, as known today: ${substrateRelativeHumidity === null ? line`not measured` : [measured(`${substrateRelativeHumidity} %`)]}.`,
      ),
      item(
        line`Moisture emission rate, as known today: ${moistureEmission ? [measured(formatQuantity(moistureEmission))] : line`not measured`}.`,
      ),
    ]),
    item(
      line`Moisture limits of the sheets. The lowest limit of the first resin course governs:`,
      statedOfEach(floor, floor.mixes, ['substrateRelativeHumidity', 'moistureEmission']),
    ),
    item(line`A licensed structural engineer decides on cracks that move and on load.`),
  ]
}

function preparationLine({ course }: SpecCourse): Item {
  const { method, profile } = course.preparation ?? {}
  return item(
    line`${quoted(course.title)}: ${method ? quoted(method) : notStatedRun()}, to profile ${profile === undefined ? notStatedRun() : [chosen(`CSP ${profile}`)]}.`,
    note(course.note),
  )
}

const note = (words: string): Item[] => (words.trim() ? [item(line`Note: ${quoted(words.trim())}`)] : [])

function preparation(floor: Floor): Item[] {
  const before = floor.courses.slice(0, firstLaid(floor))
  return [
    ...plain('Remove laitance, curing compound, oil and old coatings to sound concrete. Degrease before any mechanical work.'),
    ...before.map(preparationLine),
    item(
      line`Compare the prepared slab with the chips of ${standard('ICRI 310.2R')} and record the profile. Profiles that the sheets ask for:`,
      statedOfEach(floor, floor.mixes, ['surfaceProfile']),
    ),
    item(
      line`Mean texture depth of the prepared slab: ${floor.given.texture ? [measured(formatQuantity(floor.given.texture))] : line`not measured`}.`,
    ),
    ...plain('Vacuum the dust. Honor moving joints through all courses.'),
  ]
}

const mixing = (): Item[] => [
  ...plain(
    'Read label and safety sheet before a pack is opened. Wear what the schedule of hazards and the sheets call for.',
    'Mix whole packs in the ratio of the article on mixes, by machine, to an even color; scrape sides and bottom, pour over into a clean pail and mix again.',
    'Add aggregate to the mixed liquid, never to one part alone.',
    'Empty the pail onto the floor at once. Do not use a mix after its pot life.',
  ),
]

function laying(floor: Floor, one: SpecCourse): Item {
  const { register } = floor
  const { course, mix, broadcast, result } = one
  const window = line`${register.figure(result.window, { window: true })}`
  return item(line`${quoted(course.title)}: apply ${mix ? quoted(mix.name) : notStatedRun()}.`, [
    ...(fillsByVolume(one)
      ? [item(line`Amount: what the joints and cracks of the bays take, in the schedule of areas.`)]
      : [
          item(line`Spread rate: ${register.figure(result.spreadRate)}.`),
          item(line`Wet film: ${register.figure(result.wetFilm)}. Dry film: ${register.figure(result.dryFilm)}.`),
        ]),
    broadcast && course.broadcast
      ? item(
          line`Broadcast ${quoted(broadcast.name)} into the wet film at ${chosen(formatQuantity(course.broadcast.rate))}${course.broadcast.toRefusal ? line`, to refusal. Remove the excess after cure` : []}.`,
        )
      : null,
    item(line`Working time at the slab temperature of this section: ${register.figure(result.workingTime)}.`),
    item(
      line`Next course: ${window}, counted from the start of this course. If the window is missed, do what the sheet states; where it states nothing, ask the maker in writing before going on.`,
    ),
    ...note(course.note),
  ])
}

function installation(floor: Floor): Item[] {
  return [
    ...floor.courses.slice(firstLaid(floor)).map((one) => (isDry(one) ? preparationLine(one) : laying(floor, one))),
    ...plain('Check each course before the next: free of blush, amine bloom, pinholes, dust and water. Repair first.'),
  ]
}

const fieldQuality = (): Item[] => [
  item(line`Test and record as the schedule of field quality control says. Hold the work when a value is outside its limit.`),
  item(line`Before every course record slab, air and material temperature, relative humidity and dew point.`),
  item(line`Measure wet film after ${standard('ASTM D4414')}, or the yield of each pack by bay, and compare it with the system schedule.`),
  item(
    line`Pull-off after ${standard('ASTM D7234')}: record stress and plane of failure. Acceptance is by both; where no sheet states a strength, agree one in writing before work.`,
  ),
  ...plain('Mark, cut back and relay what fails. Record lots, bays, times and readings daily.'),
]

const cleaning = (): Item[] =>
  plain(
    'Do not mix leftovers of different products. Keep unmixed parts apart and closed.',
    'Let mixed remains cure in the open, in thin layers, before disposal. Local rules decide what is hazardous waste. Nothing goes into a drain.',
  )

function protection(floor: Floor): Item[] {
  const { register, evaluation } = floor
  const top = floor.courses.filter((one) => !isDry(one)).at(-1)
  return [
    item(line`Foot traffic, from the start of the first course: ${register.figure(evaluation.totals.hoursToFoot)}.`),
    item(line`Vehicle traffic, from the start of the first course: ${register.figure(evaluation.totals.hoursToVehicles)}.`),
    top ? item(line`Full cure of ${quoted(top.course.title)}, from its start: ${register.figure(top.result.fullCure)}.`) : null,
    item(line`These times hold at the conditions of this section. Laying time is not counted.`),
    item(line`Keep water, chemicals and traffic off until then. Cover the floor with breathable board under the work of other trades.`),
  ].filter((one) => one !== null)
}

/** PART 3 EXECUTION. */
export function executionArticles(floor: Floor): Article[] {
  if (floor.courses.length === 0) return []
  return [
    { id: 'examination', title: 'Examination', items: examination(floor) },
    { id: 'preparation', title: 'Preparation', items: preparation(floor) },
    { id: 'mixing', title: 'Mixing', items: mixing() },
    { id: 'installation', title: 'Installation', items: installation(floor) },
    { id: 'field-quality', title: 'Field quality control', items: fieldQuality() },
    { id: 'cleaning', title: 'Cleaning and waste', items: cleaning() },
    { id: 'protection', title: 'Cure and protection', items: protection(floor) },
  ]
}

/** The last article: the schedules that follow. */
export function schedulesArticle(titles: readonly string[]): Article {
  return {
    id: 'schedules',
    title: 'Schedules',
    items: [
      item(
        line`The schedules at the end are part of this section:`,
        titles.map((title) => item([quoted(title)])),
      ),
    ],
  }
}
