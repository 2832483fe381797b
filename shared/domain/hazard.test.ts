import { describe, expect, it } from 'vitest'
import { fact } from '../../tests/setup/example-floor.ts'
import type { Fact } from './fact.ts'
import { type Handled, firstAidOf, unionOfHazards } from './hazard.ts'

const labelled = (name: string, codes: string[], ...more: Fact[]): Handled => ({
  id: name,
  name,
  facts: [...(codes.length > 0 ? [fact('hazardStatements', { codes })] : []), ...more],
})
const resin = labelled(
  'Resin',
  ['H315', 'H317', 'H319', 'H411'],
  fact('signalWord', { text: 'Warning' }),
  fact('gloves', { text: 'Nitrile, 0.4 mm' }),
)
const hardener = labelled(
  'Hardener',
  ['H302', 'H314', 'H317', 'H318'],
  fact('signalWord', { text: 'DANGER' }),
  fact('gloves', { text: 'Butyl, 0.5 mm' }),
)
const unread = labelled('Unread', [])

describe('hazards of what is handled together', () => {
  it('is the union of the labels: each statement once, with whose it is', () => {
    const { statements, signalWord, pictograms } = unionOfHazards([resin, hardener])
    expect(statements.map(({ code }) => code)).toEqual(['H302', 'H314', 'H315', 'H317', 'H319', 'H411'])
    expect(statements.find(({ code }) => code === 'H317')?.from).toEqual(['Resin', 'Hardener'])
    expect(statements.find(({ code }) => code === 'H314')).toEqual({
      code: 'H314',
      text: 'Causes severe skin burns and eye damage.',
      from: ['Hardener'],
    })
    expect(signalWord).toBe('Danger')
    expect(pictograms).toEqual(['GHS05', 'GHS07', 'GHS09'])
  })

  it('what goes without saying on one pail is still said of the other: H318 beside another’s H314', () => {
    const glassy = labelled('Cement', ['H315', 'H318'])
    const { statements } = unionOfHazards([glassy, hardener])
    expect(statements.find(({ code }) => code === 'H318')?.from).toEqual(['Cement'])
  })

  it('an exclamation mark that stands on a pail stays, though another pail bears corrosion', () => {
    expect(unionOfHazards([labelled('Irritant', ['H319']), labelled('Corrosive', ['H314'])]).pictograms).toEqual(['GHS05', 'GHS07'])
  })

  it('of two precautions that say one thing the stricter is said', () => {
    const careful = labelled('A', ['H317'], fact('precautionaryStatements', { codes: ['P261', 'P280'] }))
    const strict = labelled('B', ['H317'], fact('precautionaryStatements', { codes: ['P260', 'P280'] }))
    expect(unionOfHazards([careful, strict]).precautions.map(({ code, from }) => [code, from])).toEqual([
      ['P260', ['B']],
      ['P280', ['A', 'B']],
    ])
  })

  it('a product whose safety sheet says nothing is not known, never none', () => {
    const union = unionOfHazards([resin, unread])
    expect(union.notStated).toEqual(['Unread'])
    expect(unionOfHazards([unread])).toMatchObject({ signalWord: null, pictograms: [], statements: [], notStated: ['Unread'] })
  })

  it('a sheet that states that there is no signal word has been read', () => {
    expect(unionOfHazards([labelled('Water', [], fact('signalWord', { text: 'none' }))])).toMatchObject({ signalWord: null, notStated: [] })
  })

  it('the graver of the sheet’s word and the standard’s: H314 with "Warning" is Danger', () => {
    expect(unionOfHazards([labelled('Odd', ['H314'], fact('signalWord', { text: 'Warning' }))]).signalWord).toBe('Danger')
    expect(unionOfHazards([labelled('Silent', ['H314'])]).signalWord).toBe('Danger')
  })

  it('gloves stay with the product that they are stated for; the same words are said once for each', () => {
    expect(unionOfHazards([resin, hardener]).gloves).toEqual([
      { text: 'Nitrile, 0.4 mm', from: 'Resin' },
      { text: 'Butyl, 0.5 mm', from: 'Hardener' },
    ])
    expect(unionOfHazards([{ ...resin, facts: [...resin.facts, ...resin.facts] }]).gloves).toHaveLength(1)
    expect(unionOfHazards([unread]).gloves).toEqual([])
  })

  it('a product used twice is one product', () => {
    expect(unionOfHazards([resin, resin]).statements[0]?.from).toEqual(['Resin'])
  })

  it('a code without words is shown as it is', () => {
    expect(unionOfHazards([labelled('New', ['H999'])]).statements).toEqual([{ code: 'H999', text: 'H999', from: ['New'] }])
  })

  it('first aid is what the P3 statements say, up to clothing; fire is not among it', () => {
    const codes = ['P280', 'P301+P330+P331', 'P305+P351+P338', 'P310', 'P363', 'P370+P378', 'P391', 'P501']
    const union = unionOfHazards([labelled('A', ['H314'], fact('precautionaryStatements', { codes }))])
    expect(firstAidOf(union.precautions).map(({ code }) => code)).toEqual(['P301+P330+P331', 'P305+P351+P338', 'P310', 'P363'])
  })
})
