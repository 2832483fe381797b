import { pictograms } from '../../reference/ghs.ts'
import { type Fact, codesOf, textOf } from '../fact.ts'
import type { HazardSummary } from '../evaluation.ts'
import { firstAidOf, unionOfHazards } from '../hazard.ts'
import type { ProductFacts } from '../product.ts'
import type { Property } from '../property.ts'
import type { Item, Run, Runs, SpecTable } from './document.ts'
import type { Floor, SpecCourse } from './floor.ts'
import { chosen, item, joined, line, notStatedRun, quoted } from './runs.ts'

const statementProperties: readonly Property[] = ['hazardStatements', 'supplementalStatements', 'precautionaryStatements']

/** The facts of some products that state a code. */
function factsWithCode(products: readonly ProductFacts[], code: string): Fact[] {
  return products.flatMap(({ facts }) =>
    facts.filter((fact) => statementProperties.includes(fact.property) && codesOf(fact).includes(code)),
  )
}

function statementRun({ register }: Floor, products: readonly ProductFacts[], { code, text }: HazardSummary['statements'][number]): Run {
  return register.cite(`${code} ${text.replace(/\.$/, '')}`, factsWithCode(products, code))
}

/** Words of a property as each product's safety sheet has them. */
function told({ register }: Floor, products: readonly ProductFacts[], property: Property): Runs {
  const lines = products.flatMap(({ name, facts }) =>
    facts.filter((fact) => fact.property === property).map((fact) => line`${quoted(name)}: ${register.fact(fact)}`),
  )
  return lines.length > 0 ? joined(lines, '\n') : notStatedRun()
}

const shows = (code: string) => (code in pictograms ? pictograms[code as keyof typeof pictograms].shows : code)

function hazardCell(floor: Floor, { products, result }: SpecCourse): Runs {
  const sum = result.hazards ?? unionOfHazards(products)
  const signal = products.flatMap(({ facts }) => facts.filter((fact) => fact.property === 'signalWord' && textOf(fact) === sum.signalWord))
  const said: Runs[] = [
    ...(sum.signalWord ? [[floor.register.cite(sum.signalWord, signal)]] : []),
    ...sum.pictograms.map((code) => line`${quoted(`${code} ${shows(code)}`)}`),
    ...sum.statements.map((statement) => [statementRun(floor, products, statement)]),
    ...(sum.notStated.length > 0 ? [line`not stated for ${quoted(sum.notStated.join('; '))}`] : []),
  ]
  return said.length > 0 ? joined(said, '\n') : notStatedRun()
}

function row(floor: Floor, one: SpecCourse): Runs[] {
  const title = line`${chosen(String(one.number))}  ${quoted(one.course.title)}`
  if (!one.mix)
    return [
      title,
      line`No material sheet. Dust and noise of the work: article on hazards and cautions.`,
      notStatedRun(),
      notStatedRun(),
      notStatedRun(),
    ]
  return [
    title,
    hazardCell(floor, one),
    ...(['gloves', 'eyeProtection', 'respiratoryProtection'] as const).map((property) => told(floor, one.products, property)),
  ]
}

/** Hazards and protective equipment course by course, each with the page of the safety sheet. */
export function hazardTable(floor: Floor, title: string): SpecTable {
  return {
    id: 'hazards',
    title,
    columns: [
      ['Course', 14],
      ['Hazards', 38],
      ['Gloves', 16],
      ['Eyes', 16],
      ['Breathing', 16],
    ].map(([label, width]) => ({ label: String(label), width: Number(width) })),
    rows: floor.courses.map((one) => row(floor, one)),
    note: 'As the safety sheets state them. What arises in mixing, curing and grinding is on no sheet. The competent person decides on equipment.',
  }
}

/** First aid as the safety sheets of all materials state it. */
export function firstAidItems(floor: Floor): Item[] {
  const aid = firstAidOf(floor.evaluation.hazards.precautions)
  return aid.length > 0
    ? aid.map((statement) => item([statementRun(floor, floor.products, statement)]))
    : [item(line`${notStatedRun()}. Read the safety sheets before work.`)]
}
