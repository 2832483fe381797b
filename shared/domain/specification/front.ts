import { reasonKey } from '../course.ts'
import { type Figure, isTypical } from '../figure.ts'
import type { Finding } from '../finding.ts'
import { formatFigure, formatNumber, formatQuantity } from '../format.ts'
import { type Property, properties } from '../property.ts'
import type { Item, SpecDocument } from './document.ts'
import type { Floor, SpecCourse } from './floor.ts'
import { item, joined, line, measured, plain, quoted } from './runs.ts'

interface Unknown {
  what: string
  of: string
  ask: string
  because: string | undefined
}

const figuresOf = ({ result, mix }: SpecCourse): Figure[] =>
  mix
    ? [
        result.wetFilm,
        result.dryFilm,
        result.spreadRate,
        result.potLife,
        result.workingTime,
        result.window,
        result.footTraffic,
        result.vehicleTraffic,
        result.fullCure,
        result.voc,
      ]
    : []

/** What the document cannot say, each once: by the figure that is missing and whose it is. */
function unknownsOf(floor: Floor): Unknown[] {
  const { evaluation, register } = floor
  const missing = [
    ...register.gaps().figures,
    ...evaluation.findings.flatMap((finding) => (finding.status === 'unknown' ? finding.missing : [])),
  ]
  const all = missing.map(({ property, of, ask, because }): Unknown => ({ what: properties[property].label, of, ask, because }))
  const byPlace = new Map<string, Unknown[]>()
  for (const one of all) byPlace.set(`${one.what}|${one.of}`, [...(byPlace.get(`${one.what}|${one.of}`) ?? []), one])
  return [...byPlace.values()].flatMap((same) => {
    const [first] = same
    if (!first) return []
    const reasons = [...new Set(same.flatMap(({ because }) => because ?? []))]
    return [{ ...first, because: reasons.length > 0 ? reasons.join('; ') : undefined }]
  })
}

const equipment = ['gloves', 'eyeProtection', 'respiratoryProtection'] as const satisfies readonly Property[]

/** One line a property: of which mixes and products nobody states it. */
function silences({ products, aggregates, register }: Floor): Item[] {
  const liquids = products.filter(({ id }) => !aggregates.some((one) => one.id === id))
  const unworn = equipment.flatMap((property) =>
    liquids.flatMap(({ name, facts }) => (facts.some((fact) => fact.property === property) ? [] : [{ of: name, property }])),
  )
  const all = [...register.gaps().silences, ...unworn]
  return [...new Set(all.map(({ property }) => property))].map((property) => {
    const names = [...new Set(all.filter((one) => one.property === property).map(({ of }) => of))]
    return item(
      line`${quoted(properties[property].label)}: not stated for ${joined(
        names.map((name) => [quoted(name)]),
        '; ',
      )}. Ask the maker, in writing.`,
    )
  })
}

function unknowns(floor: Floor): Item[] {
  const { evaluation } = floor
  const lines = unknownsOf(floor).map(({ what, of, ask, because }) =>
    item(
      line`${of.toLowerCase().includes(what.toLowerCase()) ? quoted(of) : line`${quoted(what)} of ${quoted(of)}`}: not stated${because ? line` (${quoted(because)})` : []}. Ask ${quoted(ask)}.`,
    ),
  )
  const unsettled = evaluation.findings.filter(({ status, missing }) => status === 'unknown' && missing.length === 0)
  const silent = evaluation.hazards.notStated
  return [
    ...lines,
    ...silences(floor),
    ...unsettled.map((finding) => item(line`${quoted(finding.title)}: ${quoted(finding.says)}`)),
    ...(silent.length > 0
      ? [
          item(
            line`Hazards of ${joined(
              silent.map((name) => [quoted(name)]),
              ', ',
            )}: not stated. Read the safety sheet before a pack is opened.`,
          ),
        ]
      : []),
  ]
}

const placeOf = (floor: Floor, { courseId }: Finding) =>
  floor.courses.find(({ course }) => course.id === courseId)?.course.title ?? 'the floor'

/** What a check did not meet and a technical lead accepted, and what has come up since with the job's own conditions. */
function overrides(floor: Floor): Item[] {
  const open = floor.evaluation.findings.filter(({ status }) => status === 'stop' || status === 'caution' || status === 'unknown')
  return open.flatMap((finding) => {
    const reason = floor.given.reasons[reasonKey(finding)]
    if (!reason && finding.status === 'unknown') return []
    const words = finding.status === 'stop' ? 'not met' : finding.status
    return [
      item(line`${quoted(finding.title)}, ${quoted(placeOf(floor, finding))}: ${quoted(words)}. ${quoted(finding.says)}`, [
        reason
          ? item(line`Reason given at release: ${quoted(reason)}`)
          : item(line`No reason is recorded: this comes of the conditions of the job. Settle it before work. ${quoted(finding.todo)}`),
      ]),
    ]
  })
}

function typical(floor: Floor): Item[] {
  return floor.courses.flatMap((one) =>
    figuresOf(one)
      .filter(isTypical)
      .map((figure) =>
        item(
          line`${quoted(one.course.title)}: ${{ kind: 'figure', text: formatFigure(figure), known: 'typical', tags: [], citation: null }}.`,
        ),
      ),
  )
}

function assumptions({ given }: Floor): Item[] {
  const { conditions, onDate } = given.input
  const { percent, convention } = given.loss
  return [
    item(
      line`Slab ${measured(formatQuantity(conditions.slabTemperature))}, air ${measured(formatQuantity(conditions.airTemperature))}, relative humidity ${measured(`${conditions.relativeHumidity} %`)}, held constant through the work.`,
    ),
    item(
      line`Loss: ${measured(`${formatNumber(percent)} %`)} ${quoted(convention === 'lost' ? 'of what is mixed is lost' : 'is added to what is needed')}.`,
    ),
    item(line`Ages of sheets and dated limits are judged on ${measured(onDate)}.`),
    ...plain('Each course starts as soon as the one beneath allows, unless the build-up says otherwise. Laying time is not counted.'),
  ]
}

/** What stands before the first part: what is not known comes first. Written last, when the document has said all that it says. */
export function frontMatter(floor: Floor): SpecDocument['front'] {
  return { unknowns: unknowns(floor), overrides: overrides(floor), typical: typical(floor), assumptions: assumptions(floor) }
}
