import { type PictogramCode, ghsStatement, pictogramOfStatement } from '../reference/ghs.ts'
import type { HazardSummary } from './evaluation.ts'
import { type Fact, codesOf, textOf } from './fact.ts'
import type { ProductFacts } from './product.ts'
import type { Property } from './property.ts'

/** A statement that goes without saying beside another. Source: GHS 1.4.10.5.3.3, CLP Article 27. */
const leftOut: Record<string, string> = { H318: 'H314', H400: 'H410', H401: 'H411', H402: 'H412', P261: 'P260' }

const acute = /^H3(02|12|32)/
const skinOrEye = new Set(['H315', 'H319'])
const sensitised = new Set(['H315', 'H317', 'H319'])
const baseOf = (code: string) => code.split('+')[0] ?? code

/** Statements that are said: without duplicates and without those that go without saying, in the order of their numbers. */
export function statementsOf(codes: readonly string[]): string[] {
  const said = new Set(codes)
  return [...said].filter((code) => !said.has(leftOut[code] ?? '')).sort()
}

/**
 * Pictograms of a set of hazard statements, with precedence: the exclamation mark goes where the skull stands for acute toxicity,
 * where corrosion stands for skin or eye irritation, and where the health hazard stands for respiratory sensitisation.
 * Source: GHS 1.4.10.5.3.1, HCS Appendix C.2.1.
 */
export function pictogramsOf(codes: readonly string[]): PictogramCode[] {
  const asked = codes.flatMap((code) => code.split('+'))
  const has = (pictogram: PictogramCode) => asked.some((code) => pictogramOfStatement[code] === pictogram)
  const covered = (code: string) =>
    (has('GHS06') && acute.test(code)) || (has('GHS05') && skinOrEye.has(code)) || (asked.includes('H334') && sensitised.has(code))
  const shown = asked.filter((code) => pictogramOfStatement[code] !== 'GHS07' || !covered(code))
  return [...new Set(shown.flatMap((code) => pictogramOfStatement[code] ?? []))].sort()
}

/** Danger goes before Warning. */
export function signalWordOf(words: readonly (string | undefined)[]): 'Danger' | 'Warning' | null {
  return words.includes('Danger') ? 'Danger' : words.includes('Warning') ? 'Warning' : null
}

const anyPart = (facts: readonly Fact[], property: Property) => facts.filter((fact) => fact.property === property)

/** Words of a property on each product's sheet, with whose they are; the same words of two products are said once each. */
function wordsOf(products: readonly ProductFacts[], property: Property) {
  return products.flatMap(({ name, facts }) => anyPart(facts, property).flatMap((fact) => ({ text: textOf(fact) ?? '', from: name })))
}

function coded(products: readonly ProductFacts[], property: Property) {
  const sources = new Map<string, string[]>()
  for (const { name, facts } of products) {
    for (const code of anyPart(facts, property).flatMap(codesOf)) sources.set(code, [...new Set([...(sources.get(code) ?? []), name])])
  }
  return statementsOf([...sources.keys()]).map((code) => ({ code, text: ghsStatement(code) ?? code, from: sources.get(code) ?? [] }))
}

/** True when a product's safety sheet has been read: it states hazards, a signal word, or that there are none. */
export function hasHazards({ facts }: ProductFacts): boolean {
  return facts.some(({ property }) => property === 'hazardStatements' || property === 'signalWord')
}

/**
 * Hazards of several products handled together: the union of what their safety sheets state. What arises in mixing, curing and grinding
 * is on no sheet, and what no sheet states is listed as not stated.
 */
export function unionOfHazards(all: readonly ProductFacts[]): HazardSummary {
  const products = [...new Map(all.map((product) => [product.id, product])).values()]
  const statements = [...coded(products, 'hazardStatements'), ...coded(products, 'supplementalStatements')]
  const words = products.flatMap(({ facts }) => anyPart(facts, 'signalWord').map(textOf))
  return {
    signalWord: signalWordOf(words),
    pictograms: pictogramsOf(statements.map(({ code }) => code)),
    statements,
    precautions: coded(products, 'precautionaryStatements'),
    gloves: wordsOf(products, 'gloves'),
    eyes: wordsOf(products, 'eyeProtection'),
    breathing: wordsOf(products, 'respiratoryProtection'),
    emergencyPhones: wordsOf(products, 'emergencyPhone'),
    notStated: products.filter((product) => !hasHazards(product)).map(({ name }) => name),
  }
}

/** The first-aid statements among precautions: P30x, P31x, P33x, P34x, P35x and what they are joined to. */
export function firstAidOf(precautions: HazardSummary['precautions']): HazardSummary['precautions'] {
  return precautions.filter(({ code }) => /^P3[0-6]/.test(baseOf(code)))
}
