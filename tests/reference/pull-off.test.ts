import { describe, expect, it } from 'vitest'
import { pullOffForce, pullOffStress } from '../../shared/domain/pull-off.ts'
import { quantity, valueIn } from '../../shared/domain/units.ts'

describe('pull-off stress, F ÷ A', () => {
  it('785 lbf on a 2 in disc is 249.9 psi, 1.723 MPa', () => {
    const pull = { force: quantity(785, 'lbf'), disc: quantity(2, 'in') }
    expect(pullOffStress(pull, 'psi').value).toBeCloseTo(249.9, 1)
    expect(pullOffStress(pull, 'MPa').value).toBeCloseTo(1.723, 3)
  })

  it('2,945 N on a 50 mm disc is 1.500 MPa, 217.5 psi', () => {
    const pull = { force: quantity(2945, 'N'), disc: quantity(50, 'mm') }
    expect(pullOffStress(pull, 'MPa').value).toBeCloseTo(1.5, 3)
    expect(pullOffStress(pull, 'psi').value).toBeCloseTo(217.5, 1)
  })

  it('200 psi is 609 lbf on a 50 mm disc and 97 lbf on a 20 mm one', () => {
    const force = (disc: number) => pullOffForce({ stress: quantity(200, 'psi'), disc: quantity(disc, 'mm') }, 'lbf').value
    expect(force(50)).toBeCloseTo(609, 0)
    expect(force(20)).toBeCloseTo(97.4, 1)
  })

  it.each([
    [100, 0.689],
    [200, 1.379],
    [250, 1.724],
    [300, 2.068],
    [400, 2.758],
  ])('%d psi is %d MPa', (psi, megapascal) => {
    expect(valueIn(quantity(psi, 'psi'), 'MPa')).toBeCloseTo(megapascal, 3)
  })
})
