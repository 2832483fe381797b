import { type PictogramCode, ghsStatement, pictogramsOfStatement, signalWordOfStatement } from '../reference/ghs.ts'
import type { HazardSummary } from './evaluation.ts'
import { type Fact, codesOf, textOf } from './fact.ts'
import type { Property } from './property.ts'

/** Whatever a safety sheet speaks of: a component, an aggregate, or a mix whose parts share one sheet. */
export interface Handled {
  id: string
  name: string
  facts: readonly Fact[]
}

/** A statement that goes without saying beside another on one label. Source: GHS 1.4.10.5.3.3, CLP Article 27. */
const leftOut: Record<string, string> = { H318: 'H314', H400: 'H410', H401: 'H411', H402: 'H412', P261: 'P260' }

const acute = /^H3(02|12|32)/
const skinOrEye = new Set(['H315', 'H319'])
const sensitised = new Set(['H315', 'H317', 'H319'])
const singles = (codes: readonly string[]) => codes.flatMap((code) => code.split('+'))

/** Statements that are said on one label: without duplicates and without those that go without saying, in the order of their numbers. */
export function statementsOf(codes: readonly string[]): string[] {
  const said = new Set(singles(codes))
  return [...new Set(codes)].filter((code) => !said.has(leftOut[code] ?? '')).sort()
}

/**
 * Pictograms of one label's hazard statements, with precedence: the exclamation mark goes where the skull stands for acute toxicity,
 * where corrosion stands for skin or eye irritation, and where the health hazard stands for respiratory sensitisation.
 * Source: GHS 1.4.10.5.3.1, HCS Appendix C.2.1.
 */
export function pictogramsOf(codes: readonly string[]): PictogramCode[] {
  const asked = singles(codes)
  const has = (pictogram: PictogramCode) => asked.some((code) => pictogramsOfStatement(code).includes(pictogram))
  const covered = (code: string) =>
    (has('GHS06') && acute.test(code)) || (has('GHS05') && skinOrEye.has(code)) || (asked.includes('H334') && sensitised.has(code))
  const shown = asked.flatMap((code) => pictogramsOfStatement(code).filter((pictogram) => pictogram !== 'GHS07' || !covered(code)))
  return [...new Set(shown)].sort()
}

/** Danger goes before Warning, however a sheet writes them. Source: GHS 1.4.10.5.3.2. */
export function signalWordOf(words: readonly (string | undefined)[]): 'Danger' | 'Warning' | null {
  const said = words.map((word) => word?.trim().toLowerCase() ?? '')
  return said.some((word) => word.startsWith('danger')) ? 'Danger' : said.some((word) => word.startsWith('warning')) ? 'Warning' : null
}

const allOf = (facts: readonly Fact[], property: Property) => facts.filter((fact) => fact.property === property)
const codesIn = ({ facts }: Handled, property: Property) => allOf(facts, property).flatMap(codesOf)

/** The codes of one label: hazard and supplemental statements. */
const hazardCodes = (one: Handled) => [...codesIn(one, 'hazardStatements'), ...codesIn(one, 'supplementalStatements')]

/** Words of a property on each sheet, with whose they are. */
function wordsOf(handled: readonly Handled[], property: Property) {
  return handled.flatMap(({ name, facts }) => {
    const texts = new Set(allOf(facts, property).map((fact) => textOf(fact)?.trim() ?? ''))
    return [...texts].filter(Boolean).map((text) => ({ text, from: name }))
  })
}

/** Codes of several labels as statements, each with whose label it stands on. */
function united(labels: readonly { name: string; codes: readonly string[] }[]) {
  const sources = new Map<string, Set<string>>()
  for (const { name, codes } of labels) for (const code of codes) sources.set(code, (sources.get(code) ?? new Set()).add(name))
  return [...sources]
    .sort(([a], [b]) => (a < b ? -1 : 1))
    .map(([code, from]) => ({ code, text: ghsStatement(code) ?? code, from: [...from] }))
}

/** Precautions of everything together: of two that say one thing, the stricter. */
function precautionsOf(handled: readonly Handled[]): HazardSummary['precautions'] {
  const all = united(handled.map((one) => ({ name: one.name, codes: codesIn(one, 'precautionaryStatements') })))
  const kept = new Set(statementsOf(all.map(({ code }) => code)))
  return all.filter(({ code }) => kept.has(code))
}

/** Signal words of one label: the sheet's own, and what the standard gives to the statements it makes. */
const wordsOfLabel = (one: Handled) => [
  ...allOf(one.facts, 'signalWord').map(textOf),
  ...singles(hazardCodes(one)).map(signalWordOfStatement),
]

/** True when a safety sheet has been read: it states hazards, a signal word, or that there are none. */
export function hasHazards({ facts }: Pick<Handled, 'facts'>): boolean {
  return facts.some(({ property }) => property === 'hazardStatements' || property === 'signalWord')
}

/**
 * Hazards of several things handled together: the union of their labels, each by the rules of one label, so that nothing that stands on a pail is lost
 * because another pail bears more. What arises in mixing, curing and grinding is on no sheet, and what no sheet states is listed as not stated.
 */
export function unionOfHazards(all: readonly Handled[]): HazardSummary {
  const handled = [...new Map(all.map((one) => [one.id, one])).values()]
  const labels = handled.map((one) => ({ name: one.name, codes: hazardCodes(one) }))
  return {
    signalWord: signalWordOf(handled.flatMap(wordsOfLabel)),
    pictograms: [...new Set(labels.flatMap(({ codes }) => pictogramsOf(codes)))].sort(),
    statements: united(labels.map(({ name, codes }) => ({ name, codes: statementsOf(codes) }))),
    precautions: precautionsOf(handled),
    gloves: wordsOf(handled, 'gloves'),
    eyes: wordsOf(handled, 'eyeProtection'),
    breathing: wordsOf(handled, 'respiratoryProtection'),
    emergencyPhones: wordsOf(handled, 'emergencyPhone'),
    notStated: handled.filter((one) => !hasHazards(one)).map(({ name }) => name),
  }
}

/** The first-aid statements among precautions: P30x, P31x, P33x, P34x, P35x, P36x and what they are joined to. */
export function firstAidOf(precautions: HazardSummary['precautions']): HazardSummary['precautions'] {
  return precautions.filter(({ code }) => /^P3[0-6]/.test(code))
}
