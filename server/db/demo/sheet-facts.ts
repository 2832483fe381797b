import type { Property, Statement } from '../../../shared/domain/property.ts'
import type { PlacedWord } from '../../../shared/domain/sheet-text.ts'
import { type Place, placeInRow } from './locate.ts'
import type { DemoMix } from './mixes.ts'
import { cellsOf, tableLabel } from './printed.ts'
import type { DemoProduct } from './products.ts'
import { dateWords, phoneOf, shareWords } from './sheet-looks.ts'

/** A value that a sheet of the demo states, with its place on the page. */
export interface LocatedFact extends Place {
  statement: Statement
  quote: string
}
type Pages = readonly (readonly PlacedWord[])[]

/** What a data sheet states, found on its pages. */
export function dataFacts(mix: DemoMix, pages: Pages): LocatedFact[] {
  const listed = mix.values.map(({ label, words, statement }) => ({
    statement,
    quote: `${label} ${words}`,
    ...placeInRow(pages, { label, words }),
  }))
  return [...listed, ...tableFacts(mix, pages)]
}

function tableFacts({ maker, table }: DemoMix, pages: Pages): LocatedFact[] {
  if (!table) return []
  const { degree, temperatures, rows } = table
  const across = maker !== 'Teasel'
  return rows.flatMap((row, rowIndex) => {
    const cells = cellsOf(row, temperatures, degree)
    return cells.map(({ words, statement }, column) => {
      const others = across
        ? cells.slice(0, column).map((cell) => cell.words)
        : rows.slice(0, rowIndex).map((other) => cellsOf(other, temperatures, degree)[column]?.words)
      const nth = others.filter((other) => other === words).length
      const head = `${temperatures[column] ?? ''} ${degree}`
      const place = placeInRow(pages, { label: across ? tableLabel(row) : head, words, nth })
      return { statement, quote: across ? `${row.label} · ${head} · ${words}` : `${head} · ${row.label} · ${words}`, ...place }
    })
  })
}

/** What a safety sheet states, found on its pages. */
export function safetyFacts(product: DemoProduct, pages: Pages): LocatedFact[] {
  const { hazards } = product
  const at = (property: Property, value: Statement['value'], row: { label: string; words: string }): LocatedFact => ({
    statement: { property, part: 'mixed', value },
    quote: `${row.label} ${row.words}`,
    ...placeInRow(pages, row),
  })
  const text = (property: Property, label: string, words: string) => at(property, { text: words }, { label, words })
  const codes = (property: Property, list: readonly string[]): LocatedFact[] => {
    if (list.length === 0) return []
    const places = list.map((code) => placeInRow(pages, { label: '', words: code }))
    const [first] = places
    if (!first) return []
    const together = places.filter(({ page }) => page === first.page).map(({ box }) => box)
    const box = [
      Math.min(...together.map((b) => b[0])),
      Math.min(...together.map((b) => b[1])),
      Math.max(...together.map((b) => b[2])),
      Math.max(...together.map((b) => b[3])),
    ] as LocatedFact['box']
    return [{ statement: { property, part: 'mixed', value: { codes: [...list] } }, quote: list.join(' '), page: first.page, box }]
  }
  const { transport } = hazards
  const [density, unit] = product.density
  return [
    text('productName', 'Product name', product.name),
    text('emergencyPhone', 'Emergency telephone', phoneOf(product.maker)),
    at('revisionDate', { date: product.dated }, { label: 'Revision date', words: dateWords(product.maker, product.dated) }),
    ...(hazards.signal ? [text('signalWord', 'Signal word', hazards.signal)] : []),
    ...codes('hazardStatements', hazards.h),
    ...codes('supplementalStatements', hazards.euh ?? []),
    ...codes('precautionaryStatements', hazards.p),
    ...hazards.ingredients.map((row): LocatedFact => {
      const [name, cas, min, max] = row
      const place = placeInRow(pages, { label: cas, words: shareWords(row) })
      return {
        statement: { property: 'ingredient', part: 'mixed', value: { name, cas, ...(min === null ? {} : { min }), max, unit: '%' } },
        quote: `${name} ${cas} ${shareWords(row)}`,
        ...place,
      }
    }),
    text('gloves', 'Gloves', hazards.gloves),
    text('eyeProtection', 'Eye protection', hazards.eyes),
    text('respiratoryProtection', 'Respiratory protection', hazards.breathing),
    ...(product.flashPoint
      ? [
          at(
            'flashPoint',
            { min: product.flashPoint[0], max: product.flashPoint[0], unit: product.flashPoint[1] },
            { label: 'Flash point', words: `${product.flashPoint[0]} ${product.flashPoint[1]}` },
          ),
        ]
      : []),
    at('density', { min: density, max: density, unit }, { label: 'Density', words: `${density} ${unit}` }),
    ...(transport
      ? [
          text('unNumber', 'UN number', transport[0]),
          text('properShippingName', 'Proper shipping name', transport[1]),
          text('transportClass', 'Class', transport[2]),
          text('packingGroup', 'Packing group', transport[3]),
        ]
      : []),
  ]
}
