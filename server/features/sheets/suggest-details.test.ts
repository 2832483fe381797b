import { describe, expect, it } from 'vitest'
import { findRevisionDate, suggestDetails } from './suggest-details.ts'

const page = (...lines: string[]) => ({
  text: lines.join('\n'),
  words: lines.flatMap((line, row) =>
    line.split(' ').map((word): [string, number, number, number, number] => [word, 0, row * 30, 10, row * 30 + (row === 1 ? 24 : 12)]),
  ),
})

describe('what the text of a sheet suggests', () => {
  it('is the largest line as title, never the name of the paper itself', () => {
    expect(suggestDetails([page('Product data sheet', 'Ostrel Body 40', 'A two-part resin')], 'x.pdf')).toEqual({
      kind: 'data',
      title: 'Ostrel Body 40',
      revisionDate: null,
    })
  })

  it('is a safety sheet where the heading says so, not where a data sheet points to one', () => {
    expect(suggestDetails([page('Safety data sheet', 'Teasel B')], 'x.pdf').kind).toBe('safety')
    expect(suggestDetails([page('Teasel', 'Teasel Coat', 'Read the safety data sheet before use.')], 'x.pdf').kind).toBe('data')
  })

  it('is the name of the file where there is no text', () => {
    expect(suggestDetails([{ text: '', words: [] }], 'corbel_sand.pdf').title).toBe('corbel sand')
  })
})

describe('the date of a sheet', () => {
  it.each([
    ['Revised May 6, 2024', '2024-05-06'],
    ['Issue of 17 January 2025, replaces 9 May 2022.', '2025-01-17'],
    ['Revision date 20.01.2025, version 3, replaces version 2 of 11.05.2022', '2025-01-20'],
    ['Revision date: 2024-03', '2024-03'],
    ['Date of issue 03/2024', '2024-03'],
    ['Revised 13/02/2024', '2024-02-13'],
    ['Last updated Sept. 2023', '2023-09'],
  ])('is read where it is said plainly: %s', (line, date) => expect(findRevisionDate(line)).toBe(date))

  it.each([
    ['Revised 05/06/2024'], // May or June: which is not said.
    ['Printed 6 May 2024'],
    ['Supersedes revision of 6 May 2020'],
    ['Revised 6 May 2024\nRevised 7 May 2024'],
    ['Revised 40.13.2024'],
  ])('is left open where it is not: %s', (line) => expect(findRevisionDate(line)).toBeNull())
})
