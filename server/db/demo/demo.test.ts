import { createHash } from 'node:crypto'
import { readFile } from 'node:fs/promises'
import { join } from 'node:path'
import { describe, expect, it } from 'vitest'
import { valueProblem } from '../../../shared/domain/property.ts'
import { wordsIn } from '../../../shared/domain/sheet-text.ts'
import { readPages } from '../../features/sheets/page-reader.ts'
import { type DemoSheet, demoFolder } from './draw-sheets.ts'
import { contradictoryMix, demoMixes } from './mixes.ts'
import { demoProducts, scannedProduct } from './products.ts'

const sheets = JSON.parse(await readFile(join(demoFolder, 'sheets.json'), 'utf8')) as DemoSheet[]
const letters = (text: string) => text.replace(/[\s·]/g, '')

describe('the demo’s sheets', () => {
  it('are at least 30, of at least 24 products and 10 mixes', () => {
    expect(sheets.length).toBeGreaterThanOrEqual(30)
    expect(demoProducts.length).toBeGreaterThanOrEqual(24)
    expect(demoMixes.length).toBeGreaterThanOrEqual(10)
  })

  it.each(sheets.map((sheet) => [sheet.file, sheet] as const))(
    '%s reads as it is kept, and every value stands in its box',
    async (_, sheet) => {
      const bytes = new Uint8Array(await readFile(join(demoFolder, sheet.file)))
      expect(createHash('sha256').update(bytes).digest('hex')).toBe(sheet.sha256)
      const read = await readPages(bytes)
      expect('pages' in read && read.pages).toEqual(sheet.pages)
      if (sheet.of === scannedProduct) expect(sheet.facts).toEqual([])
      else expect(sheet.facts.length).toBeGreaterThan(4)
      for (const { statement, page, box, quote } of sheet.facts) {
        expect(valueProblem(statement.property, statement.value), quote).toBeUndefined()
        const inBox = wordsIn(sheet.pages[page - 1]?.words ?? [], box, 1).map(([word]) => word)
        expect(inBox.length, quote).toBeGreaterThan(0)
        for (const word of inBox) if (!('codes' in statement.value)) expect(letters(quote)).toContain(letters(word))
      }
    },
  )

  it('contradict themselves once: a ratio by volume that is not that by weight', () => {
    const off = demoMixes.flatMap((mix) => {
      const ratios = mix.values.flatMap(({ statement: { value } }) => ('parts' in value ? [value] : []))
      const [volume, weight] = [ratios.find(({ basis }) => basis === 'volume'), ratios.find(({ basis }) => basis === 'weight')]
      return volume && weight ? [mix.name] : []
    })
    expect(off).toEqual([contradictoryMix])
  })
})
