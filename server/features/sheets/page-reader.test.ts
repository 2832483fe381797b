import { readFileSync } from 'node:fs'
import { join } from 'node:path'
import { describe, expect, it } from 'vitest'
import type { Box } from '../../../shared/domain/fact.ts'
import { boxAround, wordsIn } from '../../../shared/domain/sheet-text.ts'
import { makePdf } from '../../../tests/setup/pdf.ts'
import { type ReadPage, readPages } from './page-reader.ts'

const folder = join(import.meta.dirname, '../../../fixtures/sample-sheets')
const bytesOf = (name: string) => new Uint8Array(readFileSync(join(folder, name)))
async function pagesOf(bytes: Uint8Array<ArrayBuffer>): Promise<ReadPage[]> {
  const result = await readPages(bytes)
  if (!('pages' in result)) throw new Error(result.detail)
  return result.pages
}

/** Readings written down by people beside the sheets; the boxes were measured with another program (poppler's). */
interface Expected {
  readings: { property: string; page: number; box: Box; quote: string }[]
}
const bare = (text: string) => text.toLowerCase().replace(/[^\p{L}\p{N}%<>°²]/gu, '')

describe('the words of a page and their places', () => {
  it.each(['data-1', 'data-2', 'safety-1', 'safety-2'])(
    'of %s stand where the readings beside the sheet say, within 3 points',
    async (name) => {
      const pages = await pagesOf(bytesOf(`${name}.pdf`))
      const { readings } = JSON.parse(readFileSync(join(folder, `${name}.json`), 'utf8')) as Expected
      expect(readings.length).toBeGreaterThan(15)
      for (const { property, page, box, quote } of readings) {
        const inside = wordsIn(pages[page - 1]?.words ?? [], box)
        const what = `${property}: “${quote}” against “${inside.map(([text]) => text).join(' ')}”`
        const around = boxAround(inside)
        if (!around) throw new Error(what)
        // A long list is quoted with its middle left out, and its box holds the column of codes.
        const abridged = quote.includes('…')
        if (!abridged) for (const [text] of inside) expect(bare(quote), what).toContain(bare(text))
        for (const edge of abridged ? ([0, 1, 3] as const) : ([0, 1, 2, 3] as const))
          expect(Math.abs(around[edge] - box[edge]), what).toBeLessThan(3)
      }
    },
  )

  it('stand as the page is shown when it is turned', async () => {
    // Letter, Helvetica 12 at (72, 720) from the bottom left. Turned a quarter clockwise the page is 792 wide and the baseline runs down
    // at x = 720, starting 72 from the top: (x, y) on the sheet is (y, x) as shown (ISO 32000-1, 7.7.3.3, Rotate).
    const [upright, quarter, half] = await pagesOf(
      new Uint8Array(makePdf([{ lines: ['Word'] }, { lines: ['Word'], rotate: 90 }, { lines: ['Word'], rotate: 180 }])),
    )
    expect(upright).toMatchObject({ width: 612, height: 792, rotation: 0 })
    expect(quarter).toMatchObject({ width: 792, height: 612, rotation: 90 })
    expect(half).toMatchObject({ width: 612, height: 792, rotation: 180 })
    const [word] = upright?.words ?? []
    // Adobe's metrics of Helvetica: W 944, o 556, r 333, d 556 thousandths: 2.389 × 12 = 28.7 points.
    expect(word?.[1]).toBeCloseTo(72, 1)
    expect((word?.[3] ?? 0) - (word?.[1] ?? 0)).toBeCloseTo(28.7, 0)
    const [turned] = quarter?.words ?? []
    expect(turned?.[2]).toBeCloseTo(72, 1)
    expect((turned?.[4] ?? 0) - (turned?.[2] ?? 0)).toBeCloseTo(28.7, 0)
    expect(turned?.[1]).toBeLessThan(720)
    expect(turned?.[3]).toBeGreaterThan(720)
    const [over] = half?.words ?? []
    expect(over?.[3]).toBeCloseTo(612 - 72, 1)
  })

  it('are joined over kerning and parted at gaps', async () => {
    const kerned = makePdf([{ lines: ['x'] }])
      .toString('latin1')
      .replace(/\(x\) Tj/, '[(Wea) 40 (rcou) -30 (rse) -600 (film)] TJ')
    const [page] = await pagesOf(new Uint8Array(Buffer.from(kerned, 'latin1')))
    expect(page?.words.map(([text]) => text)).toEqual(['Wearcourse', 'film'])
  })
})
