import { readFileSync } from 'node:fs'
import { describe, expect, it } from 'vitest'
import { pictogramsOf, signalWordOf, statementsOf } from '../../shared/domain/hazard.ts'
import { ghsCodes, ghsEdition, ghsStatement, pictograms, pictogramsOfStatement, signalWordOfStatement } from '../../shared/reference/ghs.ts'

/** The independent list: LaTeX package ghsystem 2020/02/17 (Debian texlive-science). */
const list = readFileSync(new URL('../../fixtures/reference/ghs-statements.tsv', import.meta.url), 'utf8')
  .split('\n')
  .filter((line) => /^(EU)?[HP]\d/.test(line))
  .map((line) => line.split('\t') as [string, string])

/** Where the list itself is misprinted or leaves the figure out, and CLP Annex III/IV prints it. */
const misprints: Record<string, string> = {
  EUH201A: 'contains lead for Contains lead',
  P331: 'vomitting for vomiting',
  'P301+P330+P331': 'vomitting for vomiting',
  P241: 'one slash short',
  P411: 'units left out',
  P412: 'temperature left out',
  P413: 'units left out',
  'P410+P412': 'temperature left out',
  'P411+P235': 'units left out',
}
const plain = (text: string) => text.replace(/\s*…\s*/g, '…').toLowerCase()

describe('official statements (UN GHS Annex 3, CLP Annexes III and IV before 2019)', () => {
  it('read the same as the independent list, code by code', () => {
    expect(list.length).toBeGreaterThan(200)
    const different = list.filter(([code, text]) => plain(ghsStatement(code) ?? '') !== plain(text)).map(([code]) => code)
    expect(different.filter((code) => !(code in misprints))).toEqual([])
    expect(ghsEdition).toMatch(/before 2019/)
  })

  it('misprints of the list are few and still there: should the list be put right, the exception goes', () => {
    const same = list.filter(([code, text]) => code in misprints && ghsStatement(code) === text).map(([code]) => code)
    expect(same).toEqual([])
    expect(Object.keys(misprints).every((code) => list.some(([one]) => one === code))).toBe(true)
  })

  it('each is a sentence: it begins with a capital, ends in a stop, a colon or an ellipsis, and no two codes share one', () => {
    const texts = ghsCodes.map((code) => [code, ghsStatement(code) ?? ''] as const)
    expect(texts.filter(([, text]) => !/^[A-Z].*[.:…)]$/.test(text) && !text.startsWith('And ')).map(([code]) => code)).toEqual([])
    const hazards = texts.filter(([code]) => code.startsWith('H')).map(([, text]) => text)
    expect(new Set(hazards).size).toBe(hazards.length)
  })

  it('join as their parts do: P305+P351+P338', () => {
    expect(ghsStatement('P305+P351+P338')).toBe(
      'IF IN EYES: Rinse cautiously with water for several minutes. Remove contact lenses, if present and easy to do. Continue rinsing.',
    )
  })

  it('routes of harm join to one sentence: H302+H312+H332 (UN GHS Annex 3, from memory)', () => {
    expect(ghsStatement('H302+H312')).toBe('Harmful if swallowed or in contact with skin.')
    expect(ghsStatement('H302+H332')).toBe('Harmful if swallowed or if inhaled.')
    expect(ghsStatement('H302+H312+H332')).toBe('Harmful if swallowed, in contact with skin or if inhaled.')
    expect(ghsStatement('H300+H310+H330')).toBe('Fatal if swallowed, in contact with skin or if inhaled.')
    expect(ghsStatement('H311+H331')).toBe('Toxic in contact with skin or if inhaled.')
  })

  it('a statement that does not read on from its first part has its own words: P362+P364', () => {
    expect(ghsStatement('P362+P364')).toBe('Take off contaminated clothing and wash it before reuse.')
    expect(ghsStatement('P333+P317')).toBe('If skin irritation or rash occurs: Get medical help.')
  })

  it('a code that is not in the list has no words made up for it', () => {
    expect(['H999', 'P302+P999', 'constructor', 'H302+'].map(ghsStatement)).toEqual([undefined, undefined, undefined, undefined])
  })
})

describe('pictograms and signal words of single statements (UN GHS Annex 1, from memory)', () => {
  it.each([
    ['H225', 'GHS02', 'Danger'],
    ['H226', 'GHS02', 'Warning'],
    ['H227', undefined, 'Warning'],
    ['H242', 'GHS02', undefined],
    ['H290', 'GHS05', 'Warning'],
    ['H301', 'GHS06', 'Danger'],
    ['H302', 'GHS07', 'Warning'],
    ['H304', 'GHS08', 'Danger'],
    ['H314', 'GHS05', 'Danger'],
    ['H315', 'GHS07', 'Warning'],
    ['H317', 'GHS07', 'Warning'],
    ['H318', 'GHS05', 'Danger'],
    ['H320', undefined, 'Warning'],
    ['H334', 'GHS08', 'Danger'],
    ['H335', 'GHS07', 'Warning'],
    ['H341', 'GHS08', 'Warning'],
    ['H350', 'GHS08', 'Danger'],
    ['H361', 'GHS08', 'Warning'],
    ['H372', 'GHS08', 'Danger'],
    ['H373', 'GHS08', 'Warning'],
    ['H400', 'GHS09', 'Warning'],
    ['H411', 'GHS09', undefined],
    ['H412', undefined, undefined],
    ['EUH205', undefined, undefined],
  ] as const)('%s: %s, %s', (code, pictogram, word) => {
    expect(pictogramsOfStatement(code)).toEqual(pictogram ? [pictogram] : [])
    expect(signalWordOfStatement(code)).toBe(word)
  })

  it('H241 bears bomb and flame', () => {
    expect(pictogramsOfStatement('H241')).toEqual(['GHS01', 'GHS02'])
  })

  it('the nine pictograms have a name each; every hazard statement that bears one has words', () => {
    expect(Object.keys(pictograms)).toEqual(['GHS01', 'GHS02', 'GHS03', 'GHS04', 'GHS05', 'GHS06', 'GHS07', 'GHS08', 'GHS09'])
    const borne = new Set(ghsCodes.flatMap(pictogramsOfStatement))
    expect([...borne].sort()).toEqual(Object.keys(pictograms))
  })
})

describe('precedence of pictograms (GHS 1.4.10.5.3.1, HCS App. C.2.1; worked labels from memory)', () => {
  it('part A of a plain epoxy, H315 H317 H319 H411: exclamation mark and environment, Warning', () => {
    expect(pictogramsOf(['H315', 'H317', 'H319', 'H411'])).toEqual(['GHS07', 'GHS09'])
    expect(signalWordOf(['H315', 'H317', 'H319', 'H411'].map(signalWordOfStatement))).toBe('Warning')
  })
  it('an amine hardener, H302 H314 H317: corrosion, and the exclamation mark stays for H302 and H317; H318 goes without saying; Danger', () => {
    expect(pictogramsOf(['H302', 'H314', 'H317', 'H318'])).toEqual(['GHS05', 'GHS07'])
    expect(statementsOf(['H302', 'H314', 'H317', 'H318'])).toEqual(['H302', 'H314', 'H317'])
    expect(signalWordOf(['H302', 'H314', 'H317'].map(signalWordOfStatement))).toBe('Danger')
  })
  it('corrosion takes the exclamation mark away where it stands for skin or eye irritation alone', () => {
    expect(pictogramsOf(['H315', 'H318'])).toEqual(['GHS05'])
  })
  it('respiratory sensitisation takes it away for skin sensitisation and irritation, not for H335', () => {
    expect(pictogramsOf(['H334', 'H317', 'H319'])).toEqual(['GHS08'])
    expect(pictogramsOf(['H334', 'H317', 'H315', 'H319', 'H335', 'H351'])).toEqual(['GHS07', 'GHS08'])
  })
  it('the health hazard for anything else leaves it: H317 beside H350', () => {
    expect(pictogramsOf(['H317', 'H350'])).toEqual(['GHS07', 'GHS08'])
  })
  it('the skull takes it away for acute toxicity, not for sensitisation (HCS; GHS itself would drop it)', () => {
    expect(pictogramsOf(['H331', 'H302'])).toEqual(['GHS06'])
    expect(pictogramsOf(['H331', 'H302+H312'])).toEqual(['GHS06'])
    expect(pictogramsOf(['H331', 'H302', 'H317'])).toEqual(['GHS06', 'GHS07'])
  })
  it('an isocyanate oligomer, H317 H332 H335: the exclamation mark alone, Warning', () => {
    expect(pictogramsOf(['H317', 'H332', 'H335'])).toEqual(['GHS07'])
    expect(signalWordOf(['H317', 'H332', 'H335'].map(signalWordOfStatement))).toBe('Warning')
  })
  it('quartz sand, H350 H372: health hazard, Danger', () => {
    expect(pictogramsOf(['H350', 'H372'])).toEqual(['GHS08'])
    expect(signalWordOf(['H350', 'H372'].map(signalWordOfStatement))).toBe('Danger')
  })
  it('H410 alone, 10 % of nonylphenol with M 10: environment, Warning', () => {
    expect(pictogramsOf(['H410'])).toEqual(['GHS09'])
    expect(signalWordOf([signalWordOfStatement('H410')])).toBe('Warning')
  })
  it('statements left out: H314 drops H318, H410 H400, H411 H401, H412 H402, P260 P261 (GHS 1.4.10.5.3.3)', () => {
    expect(statementsOf(['H318', 'H314'])).toEqual(['H314'])
    expect(statementsOf(['H400', 'H410'])).toEqual(['H410'])
    expect(statementsOf(['H401', 'H411'])).toEqual(['H411'])
    expect(statementsOf(['H402', 'H412'])).toEqual(['H412'])
    expect(statementsOf(['P261', 'P260'])).toEqual(['P260'])
  })
  it('Danger goes before Warning, however a sheet writes it; other words are no signal word', () => {
    expect(signalWordOf(['Warning', 'DANGER'])).toBe('Danger')
    expect(signalWordOf(['warning!', undefined])).toBe('Warning')
    expect(signalWordOf(['not applicable', 'none'])).toBe(null)
  })
})
