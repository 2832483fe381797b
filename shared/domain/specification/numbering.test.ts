import { describe, expect, it } from 'vitest'
import type { Item } from './document.ts'
import { articleNumber, labelOf, letters, numberedArticles, numberedItems } from './numbering.ts'

const item = (text: string, items: Item[] = []): Item => ({ runs: [{ kind: 'text', text }], items })

// PageFormat of the Construction Specifications Institute, from memory: 1.01 / A. / 1. / a. / 1) / a), restarting inside each article.
describe('numbering', () => {
  it('labels five levels below the article', () => {
    expect([0, 1, 2, 3, 4].map((level) => labelOf(level, 1))).toEqual(['B.', '2.', 'b.', '2)', 'b)'])
    expect(() => labelOf(5, 0)).toThrow(RangeError)
  })

  it('counts letters beyond Z as word processors do', () => {
    expect([0, 25, 26, 27, 51, 52].map(letters)).toEqual(['A', 'Z', 'AA', 'BB', 'ZZ', 'AAA'])
  })

  it('numbers articles with two digits after the part', () => {
    expect([articleNumber(2, 2), articleNumber(1, 11)]).toEqual(['2.03', '1.12'])
  })

  it('restarts under every parent: the third article of part 2, paragraph C, sub 2, sub-sub b', () => {
    const deep = item('C', [item('1'), item('2', [item('a'), item('b', [item('1)')])])])
    const numbered = numberedItems([item('A', [item('under A')]), item('B'), deep])
    expect(numbered.map(({ label }) => label)).toEqual(['A.', '1.', 'B.', 'C.', '1.', '2.', 'a.', 'b.', '1)'])
    expect(numbered.map(({ level }) => level)).toEqual([0, 1, 0, 0, 1, 1, 2, 2, 3])
  })

  it('closes the gap when an article goes', () => {
    const articles = ['one', 'two', 'three'].map((id) => ({ id, title: id, items: [item(id)] }))
    const without = numberedArticles({ number: 1, title: 'General', articles: articles.filter(({ id }) => id !== 'two') })
    expect(without.map(({ id, number }) => [id, number])).toEqual([
      ['one', '1.01'],
      ['three', '1.02'],
    ])
  })
})
