import { factOf, factsOf, ratioOf } from '../fact.ts'
import { formatValue } from '../format.ts'
import type { MixFacts } from '../mix.ts'
import { densityFactOf } from '../proportion.ts'
import { type Property, properties } from '../property.ts'
import type { ProductFacts } from '../product.ts'
import type { Article, Item } from './document.ts'
import type { Floor, SpecCourse } from './floor.ts'
import { item, joined, line, plain, quoted } from './runs.ts'
import { type Holder, stated, statedOfEach } from './stated.ts'

/** "Solids by volume: 100 % [S1]." or "…: not stated." */
const propertyLine = (floor: Floor, holder: Holder, property: Property): Item =>
  item(line`${quoted(properties[property].label)}: ${stated(floor, holder, [property])}.`)

function manufacturers({ mixes, products }: Floor): Item[] {
  const makers = [...new Set([...mixes, ...products].map(({ maker }) => maker))].sort()
  return makers.length === 0
    ? []
    : [
        item(
          line`Makers of the materials specified: ${joined(
            makers.map((maker) => [quoted(maker)]),
            ', ',
          )}.`,
        ),
        ...plain('Do not substitute, thin or combine materials unless the maker’s sheet states it or the maker agrees in writing.'),
      ]
}

function system(floor: Floor): Item[] {
  const { totals } = floor.evaluation
  return [
    item(line`Courses from the slab upward: see the section drawing and the system schedule.`),
    item(
      line`Dry thickness of all courses over the field: ${floor.register.figure(totals.thickness)}. Stones that stand out of a broadcast are not counted.`,
    ),
  ]
}

function performance(floor: Floor): Item[] {
  const { register, courses, evaluation } = floor
  const laid = courses.filter(({ mix }) => mix)
  return [
    item(line`VOC content as mixed:`, [
      ...laid.map(({ course, mix, result }) =>
        item(line`${quoted(course.title)}, ${quoted(mix?.name ?? '')}: ${register.figure(result.voc)}.`),
      ),
      item(
        line`Greatest of all courses: ${register.figure(evaluation.totals.vocWorst)}. Comply with the air district’s rule; the strictest category named on label or sheet applies.`,
      ),
    ]),
    item(line`Pull-off strength of the slab asked for:`, statedOfEach(floor, floor.mixes, ['pullOffStrength'])),
    ...plain(
      'Slip resistance, chemical and fire performance: as the contract states and the approved mock-up shows. Ask the maker in writing for what no sheet states.',
    ),
  ]
}

/** Told where a sheet states them; nothing here depends on them. */
const furtherProperties = ['density', 'viscosity', 'weightSolids'] as const satisfies readonly Property[]
const mixProperties = [
  'volumeSolids',
  'filmThickness',
  'surfaceProfile',
  'substrateRelativeHumidity',
  'moistureEmission',
  'shelfLife',
] as const satisfies readonly Property[]

function materials(floor: Floor): Item[] {
  return floor.mixes.map((mix) =>
    item(line`${quoted(mix.name)}: ${quoted(mix.chemistry)}, by ${quoted(mix.maker)}.`, [
      item(
        line`Components: ${joined(
          mix.parts.map(({ part, product }) => line`${quoted(part)}, ${quoted(product.name)}`),
          '; ',
        )}.`,
      ),
      ...mixProperties.map((property) => propertyLine(floor, mix, property)),
      ...furtherProperties.filter((property) => factOf(mix.facts, property)).map((property) => propertyLine(floor, mix, property)),
    ]),
  )
}

/** What a floor needs besides its courses; what the build-up does not hold is said not to be in it. */
function accessories({ courses }: Floor): Item[] {
  const fills = courses.filter(({ course, mix }) => course.stage === 'fill' && mix)
  const coves = courses.filter(({ course, mix }) => course.stage === 'cove' && mix)
  const named = (all: readonly SpecCourse[]) =>
    joined(
      all.map(({ course, mix }) => line`${quoted(mix?.name ?? '')} in ${quoted(course.title)}`),
      ', ',
    )
  return [
    item(line`Joint, crack and patching material: ${fills.length > 0 ? named(fills) : line`none is part of this build-up`}.`),
    item(line`Cove base: ${coves.length > 0 ? named(coves) : line`none is part of this build-up`}.`),
    ...plain(
      'Sealant of moving joints, edge strips and keys: as the drawings show. Ask the maker of the course in writing whether they go together.',
    ),
  ]
}

function aggregateItem(floor: Floor, product: ProductFacts): Item {
  const uses = floor.courses.flatMap(({ course, filler, broadcast }) => [
    ...(filler?.id === product.id ? [line`in the mix of ${quoted(course.title)}`] : []),
    ...(broadcast?.id === product.id ? [line`broadcast on ${quoted(course.title)}`] : []),
  ])
  return item(line`${quoted(product.name)}: ${quoted(product.chemistry)}, by ${quoted(product.maker)}; ${joined(uses, ', ')}.`, [
    propertyLine(floor, product, 'density'),
  ])
}

function ratios(floor: Floor, mix: MixFacts): Item {
  const single = mix.parts.length === 1 && !factOf(mix.facts, 'mixRatio')
  return item(line`Ratio: ${single ? line`one component, nothing to proportion` : stated(floor, mix, ['mixRatio'])}.`)
}

/** The ratio by the other basis, through the stated densities; nothing where a sheet states both or a density is missing. */
function otherRatio({ register }: Floor, { mix, result }: SpecCourse & { mix: MixFacts }): Item | null {
  const bases = factsOf(mix.facts, 'mixRatio').map((fact) => ratioOf(fact)?.basis)
  const densities = mix.parts.flatMap((part) => densityFactOf(mix, part) ?? [])
  const basis =
    bases.includes('volume') && !bases.includes('weight')
      ? 'weight'
      : bases.includes('weight') && !bases.includes('volume')
        ? 'volume'
        : null
  const ratio = basis === 'weight' ? result.ratioByWeight : result.ratioByVolume
  if (!basis || !ratio || densities.length < mix.parts.length) return null
  const sum = `${basis === 'weight' ? result.ratioByVolume : result.ratioByWeight}, ${basis === 'weight' ? '×' : '÷'} ${densities.map((fact) => formatValue(fact)).join(' : ')} = ${ratio}`
  const facts = [...factsOf(mix.facts, 'mixRatio'), ...densities]
  return item(
    line`By ${quoted(basis)}, through the densities: ${register.working(ratio, { formula: `parts by ${basis}`, sum, source: 'conservation of mass', facts })}.`,
  )
}

function mixItem(floor: Floor, one: SpecCourse & { mix: MixFacts }): Item {
  const { mix, result, course, filler } = one
  const split = factOf(mix.facts, 'splitKit')
  const induction = factsOf(mix.facts, 'inductionTime')
  return item(line`${quoted(course.title)}, ${quoted(mix.name)}:`, [
    ratios(floor, mix),
    otherRatio(floor, one),
    filler && course.filler ? item(line`Aggregate in the mix: ${quoted(filler.name)}, loading in the system schedule.`) : null,
    item(
      line`Pot life at the slab temperature of this section: ${floor.register.figure(result.potLife)}. Other temperatures: schedule of pot life.`,
    ),
    induction.length > 0
      ? item(
          line`Induction time: ${joined(
            induction.map((fact) => floor.register.factAt(fact)),
            '; ',
          )}.`,
        )
      : null,
    item(line`Part kits allowed: ${stated(floor, mix, ['splitKit'])}.`),
    split ? null : item(line`Mix whole kits only.`),
  ])
}

const mixesOf = (floor: Floor): Item[] => floor.courses.flatMap((one) => (one.mix ? [mixItem(floor, { ...one, mix: one.mix })] : []))

/** PART 2 PRODUCTS. Articles without anything to say are left out. */
export function productArticles(floor: Floor): Article[] {
  const articles: Article[] = [
    { id: 'manufacturers', title: 'Manufacturers', items: manufacturers(floor) },
    { id: 'system', title: 'System description', items: floor.mixes.length > 0 ? system(floor) : [] },
    { id: 'performance', title: 'Performance', items: floor.mixes.length > 0 ? performance(floor) : [] },
    { id: 'materials', title: 'Materials', items: materials(floor) },
    { id: 'accessories', title: 'Accessories', items: floor.mixes.length > 0 ? accessories(floor) : [] },
    { id: 'aggregates', title: 'Aggregates', items: floor.aggregates.map((product) => aggregateItem(floor, product)) },
    { id: 'mixes', title: 'Mixes', items: mixesOf(floor) },
  ]
  return articles.filter(({ items }) => items.length > 0)
}
