import { type Caution, phaseOf } from '../hazard-phases.ts'
import type { Item } from './document.ts'
import type { Floor } from './floor.ts'
import { firstAidItems } from './hazards.ts'
import { item, joined, line, notStatedRun, plain, quoted } from './runs.ts'

const listed = (names: readonly string[]) =>
  joined(
    names.map((name) => [quoted(name)]),
    ', ',
  )

/** What the work itself does, each caution once with the courses that it belongs to, and who decides. */
function cautionItems({ courses, given }: Floor): Item[] {
  const phases = courses.map(({ course }) => ({ title: course.title, ...phaseOf(course, given.input) }))
  const dusts = phases.flatMap(({ title, dust }) =>
    dust ? [item(line`Dust, ${quoted(title)}: ${quoted(dust.says)} (${quoted(dust.source)})`)] : [],
  )
  const of = new Map<string, { caution: Caution; titles: string[] }>()
  for (const { title, cautions } of phases) {
    for (const caution of cautions) {
      const entry = of.get(caution.id) ?? { caution, titles: [] }
      entry.titles.push(title)
      of.set(caution.id, entry)
    }
  }
  return [
    ...dusts,
    ...[...of.values()].map(({ caution, titles }) =>
      item(line`${quoted(caution.title)}, ${listed(titles)}: ${quoted(caution.says)} Decides: ${quoted(caution.defer)}.`),
    ),
  ]
}

function telephones({ evaluation }: Floor): Item[] {
  const phones = evaluation.hazards.emergencyPhones
  const numbers = [...new Set(phones.map(({ text }) => text))]
  return numbers.map((number) =>
    item(line`${listed(phones.filter(({ text }) => text === number).map(({ from }) => from))}: ${quoted(number)}.`),
  )
}

/** Hazards and cautions: what the labels say, what the work does, and who decides. */
export function hazardItems(floor: Floor): Item[] {
  const union = floor.evaluation.hazards
  const phones = telephones(floor)
  return [
    ...plain('This section informs. The sheet, the label, the law and the competent person decide.'),
    item(
      line`Hazards and protective equipment by course: see the schedule of hazards. Signal word of all materials together: ${union.signalWord ? quoted(union.signalWord) : notStatedRun()}.`,
    ),
    union.notStated.length > 0
      ? item(
          line`No hazard statement is loaded for: ${listed(union.notStated)}. Treat the hazards as unknown until the safety sheet is read.`,
        )
      : null,
    item(line`First aid as the safety sheets state it:`, firstAidItems(floor)),
    item(
      line`Emergency telephone of the safety sheets:`,
      phones.length > 0 ? phones : [item(line`${notStatedRun()}. Call the emergency services.`)],
    ),
    item(line`Cautions of the work, from common practice and the rules named:`, cautionItems(floor)),
    item(
      line`Defer also to: a licensed structural engineer for cracks that move, loads and fire rating; an electrician for power; the site’s permit for pits and tanks; the air district for VOC; an accredited laboratory for tests; the maker’s technical service, in writing, for what no sheet states.`,
    ),
  ].filter((one) => one !== null)
}
