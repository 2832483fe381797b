import { ghsEdition } from '../../reference/ghs.ts'
import { icriEdition } from '../../reference/icri.ts'
import { silicaRule } from '../../reference/silica.ts'
import { factOf } from '../fact.ts'
import { formatQuantity } from '../format.ts'
import type { Article, Item, Runs } from './document.ts'
import { hazardItems } from './cautions.ts'
import { type Floor, areaOf } from './floor.ts'
import { chosen, item, joined, line, measured, notStatedRun, plain, quoted, standard } from './runs.ts'
import { statedOfEach } from './stated.ts'

const inSteps = (titles: readonly string[]): Runs =>
  joined(
    titles.map((title) => [quoted(title)]),
    ', ',
  )

function summary({ given, courses }: Floor): Item[] {
  const area = areaOf(given.bays)
  const { buildUp } = given
  return [
    item(
      line`Section includes: resinous flooring in the bays of the schedule of areas, laid in this order from the slab upward: ${inSteps(courses.map(({ course }) => course.title))}.`,
    ),
    item(
      area ? line`Area: ${measured(formatQuantity(area))}, the sum of the areas in the schedule of areas.` : line`Area: ${notStatedRun()}.`,
    ),
    item(
      line`Basis: build-up ${quoted(`BU-${String(buildUp.number).padStart(3, '0')}`)} ${quoted(buildUp.name)}, version ${chosen(String(buildUp.version))}, ${quoted(buildUp.status)}.`,
    ),
    ...plain('Related work: concrete slab, vapor retarder and joint sealants are specified elsewhere.'),
  ]
}

const references: readonly [string, string][] = [
  ['ASTM F2170', 'relative humidity in concrete floor slabs with in-place probes'],
  ['ASTM F1869', 'moisture vapor emission rate of concrete subfloor with anhydrous calcium chloride'],
  ['ASTM D7234', 'pull-off adhesion strength of coatings on concrete'],
  ['ASTM D4414', 'wet film thickness by notch gages'],
  ['ICRI 310.2R', 'selecting and specifying concrete surface preparation'],
  ['29 CFR 1926.1153', 'respirable crystalline silica in construction'],
  ['29 CFR 1910.1200', 'hazard communication, with access to safety data sheets'],
]

const referenceItems = (): Item[] => [
  item(
    line`Comply with the edition in force on the date of this document, unless the contract names another:`,
    references.map(([name, title]) => item(line`${standard(name)}: ${quoted(title)}.`)),
  ),
  item(
    line`Editions that the tables used here rest on: profiles ${standard(icriEdition)}; hazard statements ${standard(ghsEdition)}; silica ${standard(silicaRule.verify)}.`,
  ),
]

const definitions = (): Item[] => [
  item(
    line`Tags in brackets lead to the tables at the end of this section:`,
    plain(
      'S: the page of a sheet that states the value.',
      'E: a value entered by a technical lead, with the reason.',
      'W: the working of a computed value.',
      'T: a typical value of common practice. Verify it before work.',
    ),
  ),
  item(line`CSP: concrete surface profile after ${standard('ICRI 310.2R')}. VOC: volatile organic compounds.`),
  ...plain('“Not stated” means that no sheet loaded says so. It does not mean that there is no limit or no hazard.'),
]

const administrative = (): Item[] => [
  item(
    line`Hold a meeting on site before work with owner, slab contractor and installer. Settle and record:`,
    plain(
      'the unknowns listed at the front of this section',
      'condition, moisture and age of the slab, and who accepts it',
      'heating, ventilation, lighting, water and power',
      'the recoat windows against the working hours',
      'access, exclusion of other trades, and return to service',
      'silica, isocyanate, fire and waste controls',
    ),
  ),
]

function submittals({ products, mixes }: Floor): Item[] {
  return [
    item(line`Action submittals:`, [
      item(line`Product data: the data sheets at the revisions in the schedule of products and sheets.`),
      item(line`Samples of color and texture, for approval before ordering.`),
    ]),
    item(line`Informational submittals:`, [
      item(
        line`Safety data sheets of: ${joined(
          products.map(({ name }) => [quoted(name)]),
          ', ',
        )}.`,
      ),
      item(line`Moisture, surface profile and pull-off test reports.`),
      item(
        line`The maker’s written answer to each unknown that concerns ${joined(
          mixes.map(({ name }) => [quoted(name)]),
          ', ',
        )}.`,
      ),
      item(line`Written silica exposure control plan and hazard communication program.`),
    ]),
    item(line`Closeout submittals: daily records with lot numbers, test reports, maintenance instructions, warranty.`),
  ]
}

const quality = (): Item[] => [
  ...plain('Installer: trained in these materials. Submit the record.'),
  item(
    line`Mock-up: lay all courses on site where the owner shows, before the floor. Approved, it sets profile, color, texture and slip resistance.`,
  ),
  ...plain('Keep lots together within each field in view. Record every lot by field and course.'),
]

function storedAt(floor: Floor): Item[] {
  const told = [...floor.mixes, ...floor.products].filter(({ facts }) => factOf(facts, 'storageTemperature'))
  return statedOfEach(floor, told.length > 0 ? told : floor.mixes, ['storageTemperature'])
}

const delivery = (floor: Floor): Item[] => [
  ...plain('Deliver unopened, with label, lot number and date legible. Reject damaged or outdated packs.'),
  item(line`Store dry, off the floor and within the temperatures of the sheets:`, storedAt(floor)),
  ...plain('Keep the safety data sheets within immediate reach of every shift, without need of a signal.'),
]

function siteConditions(floor: Floor): Item[] {
  const { slabTemperature, airTemperature, relativeHumidity } = floor.given.input.conditions
  return [
    item(
      line`Conditions that this section is worked out at: slab ${measured(formatQuantity(slabTemperature))}, air ${measured(formatQuantity(airTemperature))}, relative humidity of the air ${measured(`${relativeHumidity} %`)}, dew point ${floor.register.figure(floor.evaluation.totals.dewPoint)}. Work under other conditions only within the sheets’ own limits.`,
    ),
    item(line`Keep air, slab and material within the sheets’ temperatures:`, statedOfEach(floor, floor.mixes, ['applicationTemperature'])),
    item(line`Keep the relative humidity of the air within the sheets’ limits:`, statedOfEach(floor, floor.mixes, ['maxRelativeHumidity'])),
    item(line`Keep the slab above the dew point by at least:`, statedOfEach(floor, floor.mixes, ['dewPointMargin'])),
    ...plain(
      'Do not start a course on a slab that is warming. Keep permanent lighting and ventilation running, and other trades off the floor, from preparation until cure.',
    ),
    ...plain('Do not run combustion engines or unvented heaters indoors: carbon monoxide. Open doors are no control.'),
  ]
}

const warranty = (): Item[] => plain('Warranty: as the contract states. No term, scope or exclusion is stated on the sheets loaded here.')

/** PART 1 GENERAL, articles in the order of SectionFormat; warranty comes last. */
export function generalArticles(floor: Floor): Article[] {
  return [
    { id: 'summary', title: 'Summary', items: summary(floor) },
    { id: 'references', title: 'References', items: referenceItems() },
    { id: 'definitions', title: 'Definitions', items: definitions() },
    { id: 'administrative', title: 'Administrative requirements', items: administrative() },
    { id: 'submittals', title: 'Submittals', items: submittals(floor) },
    { id: 'quality', title: 'Quality assurance', items: quality() },
    { id: 'delivery', title: 'Delivery, storage and handling', items: delivery(floor) },
    { id: 'conditions', title: 'Site conditions', items: siteConditions(floor) },
    { id: 'hazards', title: 'Hazards and cautions', items: hazardItems(floor) },
    { id: 'warranty', title: 'Warranty', items: warranty() },
  ]
}
