import { readFileSync } from 'node:fs'
import { describe, expect, it } from 'vitest'
import { pictogramsOf, signalWordOf, statementsOf } from '../../shared/domain/hazard.ts'
import { ghsStatement } from '../../shared/reference/ghs.ts'

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
  P411: 'units left out', P412: 'temperature left out', P413: 'units left out', 'P410+P412': 'temperature left out', 'P411+P235': 'units left out',
}
const plain = (text: string) => text.replace(/\s*…\s*/g, '…').toLowerCase()

describe('official statements (UN GHS Annex 3, CLP Annexes III and IV before 2019)', () => {
  it('read the same as the independent list, code by code', () => {
    expect(list.length).toBeGreaterThan(200)
    const different = list.filter(([code, text]) => plain(ghsStatement(code) ?? '') !== plain(text)).map(([code]) => code)
    expect(different.filter((code) => !(code in misprints))).toEqual([])
  })
  it('join as their parts do: P305+P351+P338', () => {
    expect(ghsStatement('P305+P351+P338')).toBe('IF IN EYES: Rinse cautiously with water for several minutes. Remove contact lenses, if present and easy to do. Continue rinsing.')
  })
})

describe('precedence of pictograms (GHS 1.4.10.5.3.1, HCS App. C.2.1; worked labels from memory)', () => {
  it('part A of a plain epoxy, H315 H317 H319 H411: exclamation mark and environment, Warning', () => {
    expect(pictogramsOf(['H315', 'H317', 'H319', 'H411'])).toEqual(['GHS07', 'GHS09'])
    expect(signalWordOf(['Warning'])).toBe('Warning')
  })
  it('an amine hardener, H302 H314 H317: corrosion, and the exclamation mark stays for H302 and H317', () => {
    expect(pictogramsOf(['H302', 'H314', 'H317', 'H318'])).toEqual(['GHS05', 'GHS07'])
    expect(statementsOf(['H302', 'H314', 'H317', 'H318'])).toEqual(['H302', 'H314', 'H317'])
    expect(signalWordOf(['Danger', 'Warning'])).toBe('Danger')
  })
  it('corrosion takes the exclamation mark away where it stands for skin or eye irritation alone', () => {
    expect(pictogramsOf(['H315', 'H318'])).toEqual(['GHS05'])
  })
  it('respiratory sensitisation takes it away for skin sensitisation and irritation, not for H335', () => {
    expect(pictogramsOf(['H334', 'H317', 'H319'])).toEqual(['GHS08'])
    expect(pictogramsOf(['H334', 'H317', 'H315', 'H319', 'H335', 'H351'])).toEqual(['GHS07', 'GHS08'])
  })
  it('the skull takes it away for acute toxicity', () => {
    expect(pictogramsOf(['H331', 'H302'])).toEqual(['GHS06'])
    expect(pictogramsOf(['H331', 'H302', 'H317'])).toEqual(['GHS06', 'GHS07'])
  })
  it('an isocyanate oligomer, H317 H332 H335: the exclamation mark alone', () => {
    expect(pictogramsOf(['H317', 'H332', 'H335'])).toEqual(['GHS07'])
  })
  it('statements left out: H410 drops H400, H411 drops H401, P260 drops P261', () => {
    expect(statementsOf(['H400', 'H410'])).toEqual(['H410'])
    expect(statementsOf(['H401', 'H411'])).toEqual(['H411'])
    expect(statementsOf(['P261', 'P260'])).toEqual(['P260'])
  })
})
