import { expect, it } from 'vitest'
import { isCasNumber } from './cas.ts'

it('a CAS number is right when its check digit is (numbers of common substances, from memory)', () => {
  for (const cas of ['100-51-6', '2855-13-2', '25068-38-6', '14808-60-7', '1330-20-7', '7732-18-5'])
    expect(isCasNumber(cas), cas).toBe(true)
  for (const cas of ['100-51-5', '2855-13-3', '1-2-3', '', '100516']) expect(isCasNumber(cas), cas).toBe(false)
})
