import { describe, expect, it } from 'vitest'
import { type PlacedWord, findPhrase, quoteOf, wordsIn } from './sheet-text.ts'

const words: PlacedWord[] = [
  ['Pot', 10, 10, 28, 20],
  ['life', 30, 10, 48, 20],
  ['25–30', 60, 10, 90, 20],
  ['min', 92, 10, 108, 20],
  ['at', 10, 30, 18, 40],
  ['75', 20, 30, 30, 40],
  ['°F', 32, 30, 42, 40],
]

describe('words of a page', () => {
  it('belong to a box when their middle lies in it', () => {
    expect(quoteOf(words, [55, 5, 110, 22])).toBe('25–30 min')
    expect(wordsIn(words, [28, 5, 38, 22])).toEqual([])
  })

  it('are found as a phrase whatever the spaces, dashes and case', () => {
    expect(findPhrase(words, '75°f')).toHaveLength(1)
    expect(findPhrase(words, '25 - 30 MIN')[0]?.boxes).toEqual([[60, 10, 108, 20]])
    expect(findPhrase(words, 'li')[0]?.boxes).toEqual([[30, 10, 48, 20]])
  })

  it('give a box a line where the phrase runs over its end, and the words around', () => {
    const [hit] = findPhrase(words, 'min at')
    expect(hit).toEqual({
      boxes: [
        [92, 10, 108, 20],
        [10, 30, 18, 40],
      ],
      excerpt: 'Pot life 25–30 min at 75 °F',
    })
  })

  it('are not found where they do not stand', () => {
    expect(findPhrase(words, 'gel')).toEqual([])
    expect(findPhrase(words, '  ')).toEqual([])
  })
})
