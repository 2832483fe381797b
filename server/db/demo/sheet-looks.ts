import { ghsStatement } from '../../../shared/reference/ghs.ts'
import type { DemoMix } from './mixes.ts'
import { type PrintedValue, cellsOf, tableLabel } from './printed.ts'
import type { DemoProduct } from './products.ts'

/** How the sheets of a maker look, so that the three do not resemble each other. */
interface Look {
  size: 'LETTER' | 'A4'
  ink: string
  rule: string
  labelWidth: number
  body: number
  heading: (title: string, under: string) => object[]
  /** Temperatures across the top, or down the side. */
  transposed: boolean
  company: string
  phone: string
  dateLabel: string
}

const plain = {
  hLineWidth: () => 0.5,
  vLineWidth: () => 0,
  paddingLeft: () => 4,
  paddingRight: () => 4,
  paddingTop: () => 2,
  paddingBottom: () => 2,
}
const looks: Record<DemoMix['maker'], Look> = {
  Ostrel: {
    size: 'LETTER',
    ink: '#20304a',
    rule: '#9fb0c8',
    labelWidth: 170,
    body: 10,
    transposed: false,
    company: 'Ostrel Resins, 14 Kiln Row, Farrowmere',
    phone: '1-800-555-0141',
    dateLabel: 'Revised',
    heading: (title, under) => [
      { text: title, fontSize: 24, bold: true, color: '#20304a' },
      { text: under, fontSize: 11, color: '#5a6a80', margin: [0, 0, 0, 10] },
    ],
  },
  Teasel: {
    size: 'A4',
    ink: '#1d4a3a',
    rule: '#1d4a3a',
    labelWidth: 150,
    body: 9,
    transposed: true,
    company: 'Teasel Bauchemie, Lindenhof 9, Ostrau an der Wenze',
    phone: '+49 30 23125 555',
    dateLabel: 'Issue',
    heading: (title, under) => [
      {
        table: {
          widths: ['*'],
          body: [[{ text: title, fontSize: 17, bold: true, color: '#ffffff', fillColor: '#1d4a3a', margin: [6, 5, 6, 5] }]],
        },
        layout: 'noBorders',
      },
      { text: under, alignment: 'right', fontSize: 9, margin: [0, 4, 0, 8] },
    ],
  },
  Corbel: {
    size: 'LETTER',
    ink: '#4a3320',
    rule: '#b39b80',
    labelWidth: 140,
    body: 10.5,
    transposed: false,
    company: 'Corbel Minerals, Quarry Lane, Withy Hollow',
    phone: '1-800-555-0162',
    dateLabel: 'Date of issue',
    heading: (title, under) => [
      { text: title.toUpperCase(), alignment: 'center', fontSize: 16, characterSpacing: 0.4 },
      { text: under, alignment: 'center', italics: true, margin: [0, 2, 0, 12] },
    ],
  },
}

const months = ['January', 'February', 'March', 'April', 'May', 'June', 'July', 'August', 'September', 'October', 'November', 'December']
/** A date as the maker writes it. */
export function dateWords(maker: DemoMix['maker'], iso: string): string {
  const [year = '', month = '1', day = '1'] = iso.split('-')
  return maker === 'Teasel' ? `${day}.${month}.${year}` : `${months[Number(month) - 1] ?? ''} ${Number(day)}, ${year}`
}

const rowsOf = (values: readonly PrintedValue[], look: Look) => ({
  table: { widths: [look.labelWidth, '*'], body: values.map(({ label, words }) => [{ text: label, color: look.ink }, { text: words }]) },
  layout: { ...plain, hLineColor: () => look.rule },
  margin: [0, 0, 0, 10],
})

function tableOf({ table }: DemoMix, look: Look): object[] {
  if (!table) return []
  const { degree, temperatures, rows } = table
  const degrees = temperatures.map((temperature) => ({ text: `${temperature} ${degree}`, bold: true, alignment: 'center' as const }))
  const cells = rows.map((row) => cellsOf(row, temperatures, degree).map(({ words }) => ({ text: words, alignment: 'center' as const })))
  const body = look.transposed
    ? [
        [{ text: 'Temperature', bold: true }, ...rows.map((row) => ({ text: tableLabel(row), bold: true, alignment: 'center' as const }))],
        ...temperatures.map((_, column) => [degrees[column] ?? {}, ...cells.map((row) => row[column] ?? {})]),
      ]
    : [
        [{ text: 'At slab temperature', bold: true }, ...degrees],
        ...rows.map((row, index) => [{ text: tableLabel(row), color: look.ink }, ...(cells[index] ?? [])]),
      ]
  const columns = look.transposed ? rows.length : temperatures.length
  return [
    { text: 'Times', bold: true, color: look.ink, margin: [0, 4, 0, 3] },
    {
      table: { headerRows: 1, widths: [look.transposed ? 70 : look.labelWidth, ...Array.from({ length: columns }, () => '*')], body },
      layout: { ...plain, hLineColor: () => look.rule },
      margin: [0, 0, 0, 10],
    },
  ]
}

const pageOf = (look: Look, content: object[], { dated, title }: { dated: string; title: string }) => ({
  pageSize: look.size,
  pageMargins: [54, 50, 54, 50],
  info: {
    title,
    author: look.company,
    creationDate: new Date(`${dated}T09:00:00Z`),
    modDate: new Date(`${dated}T09:00:00Z`),
    producer: 'Wearcourse demo',
    creator: 'Wearcourse demo',
  },
  defaultStyle: { font: 'SourceSans3', fontSize: look.body, lineHeight: 1.1 },
  footer: (page: number, pages: number) => ({
    text: `${look.company}    ${page}/${pages}`,
    fontSize: 8,
    color: '#707070',
    margin: [54, 12, 54, 0],
  }),
  content,
})

const paragraphs = {
  Ostrel: [
    'Store between 50 °F and 85 °F. Condition the pails for 24 hours before use. Stir part A before part B is added, then mix three minutes with a slow drill and scrape the pail.',
    'Apply while the slab is cooling. Do not apply over standing water. Ask our technical service in writing for any use that is not described here.',
  ],
  Teasel: [
    'Gebinde vor Gebrauch auf 15–25 °C bringen. Bring the packs to room temperature before use. Mix two minutes, pour into a clean pail and mix again.',
    'The figures were measured in the laboratory at 50 % relative humidity; the site decides. They are no warranty.',
  ],
  Corbel: [
    'Keep bags dry and off the slab. Use within one season.',
    'Figures are typical of the lot tested. The user tests for the use intended.',
  ],
}

/** A data sheet as a pdfmake definition. */
export function dataSheet(mix: DemoMix): object {
  const look = looks[mix.maker]
  return pageOf(
    look,
    [
      ...look.heading(mix.name, mix.use),
      { text: `${look.dateLabel}: ${dateWords(mix.maker, mix.dated)}`, fontSize: look.body - 1, margin: [0, 0, 0, 8] },
      { text: 'Properties', bold: true, color: look.ink, margin: [0, 4, 0, 3] },
      rowsOf(mix.values, look),
      ...tableOf(mix, look),
      ...paragraphs[mix.maker].map((text) => ({ text, margin: [0, 0, 0, 6] })),
    ],
    { dated: mix.dated, title: `${mix.name}, data sheet` },
  )
}

export const shareWords = ([, , min, max]: DemoProduct['hazards']['ingredients'][number]) =>
  min === null ? `< ${max} %` : `${min}–${max} %`

/** A safety sheet as a pdfmake definition: sixteen sections in the order of the standard. */
export function safetySheet(product: DemoProduct): object {
  const look = looks[product.maker]
  const { hazards } = product
  const section = (number: number, title: string, content: object[]) => [
    { text: `${number}. ${title}`, bold: true, color: look.ink, margin: [0, 8, 0, 3] },
    ...content,
  ]
  const rows = (list: [string, string][]) => [
    {
      table: { widths: [look.labelWidth, '*'], body: list.map(([label, text]) => [{ text: label, color: look.ink }, { text }]) },
      layout: { ...plain, hLineWidth: () => 0 },
    },
  ]
  const silent = [{ text: 'No data available.' }]
  const codes = (list: readonly string[]) =>
    list.map((code) => ({
      columns: [
        { width: 110, text: code },
        { width: '*', text: ghsStatement(code) ?? '' },
      ],
      margin: [4, 0, 0, 1],
    }))
  const firstAid = hazards.p
    .filter((code) => /^P30[1-5]/.test(code))
    .map((code) => ({ text: ghsStatement(code) ?? '', margin: [4, 0, 0, 2] }))
  const { transport } = hazards
  return pageOf(
    look,
    [
      ...look.heading('Safety data sheet', product.name),
      ...section(
        1,
        'Identification',
        rows([
          ['Product name', product.name],
          ['Use', 'Component of floor coatings, for trade use only'],
          ['Supplier', look.company],
          ['Emergency telephone', look.phone],
          ['Revision date', dateWords(product.maker, product.dated)],
        ]),
      ),
      ...section(2, 'Hazard identification', [
        ...rows([['Signal word', hazards.signal ?? 'None']]),
        ...codes(hazards.h),
        ...codes(hazards.euh ?? []),
        ...codes(hazards.p),
      ]),
      ...section(3, 'Composition and ingredients', [
        {
          table: {
            widths: ['*', 80, 80],
            body: [
              [
                { text: 'Substance', bold: true },
                { text: 'CAS no.', bold: true },
                { text: 'Share', bold: true },
              ],
              ...hazards.ingredients.map((row) => [{ text: row[0] }, { text: row[1] }, { text: shareWords(row) }]),
            ],
          },
          layout: { ...plain, hLineColor: () => look.rule },
        },
      ]),
      ...section(4, 'First-aid measures', firstAid.length > 0 ? firstAid : silent),
      ...section(5, 'Fire-fighting measures', [{ text: 'Foam, dry powder, carbon dioxide. Fumes of burning resin are toxic.' }]),
      ...section(6, 'Accidental release measures', [{ text: 'Take up with dry sand. Keep out of drains.' }]),
      ...section(7, 'Handling and storage', [{ text: 'Keep closed, dry and cool. Do not leave mixed material in the pail: it heats up.' }]),
      ...section(
        8,
        'Exposure controls and personal protection',
        rows([
          ['Gloves', hazards.gloves],
          ['Eye protection', hazards.eyes],
          ['Respiratory protection', hazards.breathing],
        ]),
      ),
      ...section(
        9,
        'Physical and chemical properties',
        rows([
          ...(product.flashPoint ? [['Flash point', `${product.flashPoint[0]} ${product.flashPoint[1]}`] as [string, string]] : []),
          ['Density', `${product.density[0]} ${product.density[1]}`],
        ]),
      ),
      ...section(10, 'Stability and reactivity', [{ text: 'Stable when stored as directed.' }]),
      ...section(11, 'Toxicological information', silent),
      ...section(12, 'Ecological information', silent),
      ...section(13, 'Disposal considerations', [{ text: 'According to local rules. Let mixed leftovers cure in thin layers first.' }]),
      ...section(
        14,
        'Transport information',
        transport
          ? rows([
              ['UN number', transport[0]],
              ['Proper shipping name', transport[1]],
              ['Class', transport[2]],
              ['Packing group', transport[3]],
            ])
          : [{ text: 'Not regulated.' }],
      ),
      ...section(15, 'Regulatory information', silent),
      ...section(16, 'Other information', [{ text: 'This sheet replaces all earlier ones.' }]),
    ],
    { dated: product.dated, title: `${product.name}, safety sheet` },
  )
}

/** Words of the emergency telephone of a maker. */
export const phoneOf = (maker: DemoMix['maker']) => looks[maker].phone
