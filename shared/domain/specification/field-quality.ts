import { isDry } from '../course-result.ts'
import { type Fact, factsOf } from '../fact.ts'
import { formatQuantity } from '../format.ts'
import type { Property } from '../property.ts'
import type { Runs, SpecTable } from './document.ts'
import type { Floor, SpecCourse } from './floor.ts'
import { moistureTests } from './moisture-tests.ts'
import { chosen, joined, line, notStatedRun, quoted, standard } from './runs.ts'
import { stated } from './stated.ts'

type Row = [what: Runs, method: Runs, when: Runs, limit: Runs]

/** What the sheets state of a property, mix by mix; mixes on whose sheets it is not stated come together at the end. */
function limits(floor: Floor, properties: readonly Property[]): Runs {
  const states = ({ facts }: { facts: readonly Fact[] }) => properties.some((property) => factsOf(facts, property).length > 0)
  const silent = floor.mixes.filter((mix) => !states(mix))
  const told = floor.mixes.filter(states).map((mix) => line`${quoted(mix.name)}: ${stated(floor, mix, properties)}`)
  return joined(
    [
      ...told,
      ...(silent.length > 0
        ? [
            line`${joined(
              silent.map(({ name }) => [quoted(name)]),
              ', ',
            )}: ${notStatedRun()}`,
          ]
        : []),
    ],
    '; ',
  )
}

const laidCourses = ({ courses }: Floor) => courses.filter((one) => one.mix && !isDry(one.course))
const byCourse = (courses: readonly SpecCourse[], say: (one: SpecCourse) => Runs): Runs =>
  joined(
    courses.map((one) => line`${quoted(one.course.title)}: ${say(one)}`),
    '; ',
  )

function profileRow(floor: Floor): Row {
  const prepared = floor.courses.flatMap(({ course }) =>
    course.preparation?.profile === undefined ? [] : [line`${quoted(course.title)}: ${chosen(`CSP ${course.preparation.profile}`)}`],
  )
  const sheets = limits(floor, ['surfaceProfile'])
  return [
    line`Surface profile`,
    line`Comparison with the chips of ${standard('ICRI 310.2R')}`,
    line`After preparation, in every bay`,
    prepared.length > 0 ? line`${joined(prepared, '; ')}. Sheets: ${sheets}` : sheets,
  ]
}

function filmRow(floor: Floor): Row {
  const courses = laidCourses(floor).filter(({ result }) => result.wetFilm.kind !== 'not-stated')
  const film = ({ result, mix }: SpecCourse): Runs => {
    const range = mix ? factsOf(mix.facts, 'filmThickness') : []
    return line`${floor.register.figure(result.wetFilm)} wet${
      range.length > 0
        ? line`, sheet ${joined(
            range.map((fact) => floor.register.factAt(fact)),
            ', ',
          )}`
        : []
    }`
  }
  return [
    line`Wet film`,
    line`Notch gage after ${standard('ASTM D4414')}; on filled and broadcast courses the yield of each pack by bay`,
    line`While each course is laid`,
    courses.length > 0 ? byCourse(courses, film) : notStatedRun(),
  ]
}

function broadcastRows({ courses }: Floor): Row[] {
  const sanded = courses.flatMap(({ course, broadcast }) =>
    broadcast && course.broadcast ? [{ title: course.title, name: broadcast.name, ...course.broadcast }] : [],
  )
  if (sanded.length === 0) return []
  const limit = joined(
    sanded.map(
      ({ title, name, rate, toRefusal }) =>
        line`${quoted(title)}: ${chosen(formatQuantity(rate))} of ${quoted(name)}${toRefusal ? line`, to refusal, no bald spots` : []}`,
    ),
    '; ',
  )
  return [[line`Broadcast`, line`Bags emptied by bay`, line`While the film is wet`, limit]]
}

/** What is tested and recorded on site, how, when and against what: the limits are those of the sheets and of the build-up. */
export function fieldQualityTable(floor: Floor, title: string): SpecTable {
  const window = (one: SpecCourse) => floor.register.figure(one.result.window, { window: true })
  const rows: Row[] =
    floor.mixes.length === 0
      ? []
      : [
          [
            line`Relative humidity in the slab`,
            line`Probes after ${standard('ASTM F2170')}`,
            line`Before the first course: ${moistureTests(floor)}, at least`,
            limits(floor, ['substrateRelativeHumidity']),
          ],
          [
            line`Moisture emission rate`,
            line`Calcium chloride after ${standard('ASTM F1869')}`,
            line`Before the first course, where a sheet asks for it`,
            limits(floor, ['moistureEmission']),
          ],
          profileRow(floor),
          [
            line`Pull-off strength`,
            line`${standard('ASTM D7234')}: stress and plane of failure`,
            line`After preparation and after cure; how many, as the contract states`,
            limits(floor, ['pullOffStrength']),
          ],
          [
            line`Slab, air and material temperature`,
            line`Calibrated thermometers`,
            line`Before and during every course`,
            limits(floor, ['applicationTemperature']),
          ],
          [
            line`Relative humidity of the air`,
            line`Calibrated hygrometer`,
            line`Before and during every course`,
            limits(floor, ['maxRelativeHumidity']),
          ],
          [
            line`Slab above dew point`,
            line`From slab temperature, air temperature and humidity`,
            line`Before and during every course, and until cure`,
            limits(floor, ['dewPointMargin']),
          ],
          filmRow(floor),
          ...broadcastRows(floor),
          [
            line`Recoat window`,
            line`Clock by bay, from the start of the course`,
            line`Before every next course`,
            byCourse(laidCourses(floor), window),
          ],
          [
            line`Lots`,
            line`Lot number of every part and of the sand, by bay and course`,
            line`When a pack is opened`,
            line`One lot within a field in view`,
          ],
        ]
  return {
    id: 'field-quality',
    title,
    columns: [
      { label: 'What', width: 16 },
      { label: 'How', width: 24 },
      { label: 'When', width: 20 },
      { label: 'Limit', width: 40 },
    ],
    rows,
    note: 'When and how often is common practice; the contract may ask for more. Windows are those at the slab temperature of this section.',
  }
}
