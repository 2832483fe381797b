import { type Fact, factsOf } from '../fact.ts'
import type { Property } from '../property.ts'
import type { Item, Runs } from './document.ts'
import type { Floor } from './floor.ts'
import { item, joined, line, quoted } from './runs.ts'

/** Whatever sheets speak of. */
export interface Holder {
  name: string
  facts: readonly Fact[]
}

/** What sheets state of some properties, each value with its tag and conditions. What none states is also told at the front of the document. */
export function stated({ register }: Pick<Floor, 'register'>, { name, facts }: Holder, properties: readonly Property[]): Runs {
  const found = properties.flatMap((property) => factsOf(facts, property))
  const silent = properties.filter((property) => factsOf(facts, property).length === 0)
  const gaps = silent.map((property) => register.notStated(name, property))
  return found.length > 0
    ? joined(
        found.map((fact) => register.factAt(fact)),
        '; ',
      )
    : (gaps[0] ?? [])
}

/** The same for each of several mixes, a paragraph each. */
export function statedOfEach(floor: Pick<Floor, 'register'>, holders: readonly Holder[], properties: readonly Property[]): Item[] {
  return holders.map((holder) => item(line`${quoted(holder.name)}: ${stated(floor, holder, properties)}.`))
}
