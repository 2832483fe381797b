import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { type Pack, chooseKits, joinPlans, priceOf } from './kits.ts'
import { type Unit, quantity, valueIn } from './units.ts'

const pack = (size: number, { price = null, unit = 'gal' }: { price?: number | null; unit?: Unit } = {}): Pack => ({
  size: quantity<Unit>(size, unit),
  items: [
    {
      kind: 'mix',
      id: 'm',
      name: 'Ostrel Body 20',
      maker: 'Ostrel',
      size: quantity<Unit>(size, unit),
      count: 1,
      factId: `f${size}`,
      price,
    },
  ],
})
const gallons = (value: number) => quantity(value, 'gal')
const counts = (need: number, packs: Pack[]) =>
  Object.fromEntries(chooseKits(gallons(need), packs)?.lines.map((line) => [line.pack.size.value, line.count]) ?? [])

describe('whole kits for a need', () => {
  it('59.94 gal are 20 kits of 3 gal; exactly 60.000 gal too', () => {
    expect(counts(59.94, [pack(3)])).toEqual({ 3: 20 })
    expect(counts(60, [pack(3)])).toEqual({ 3: 20 })
    expect(counts(60.01, [pack(3)])).toEqual({ 3: 21 })
  })

  it('leaves the least over when no prices are known, then takes the fewest', () => {
    expect(counts(33.3, [pack(3), pack(15)]), '2 × 15 + 2 × 3 = 36; 12 × 3 = 36 are more pieces').toEqual({ 15: 2, 3: 2 })
    expect(counts(30, [pack(3), pack(15)])).toEqual({ 15: 2 })
    expect(counts(9, [pack(4), pack(5)])).toEqual({ 4: 1, 5: 1 })
    expect(chooseKits(gallons(33.3), [pack(3), pack(15)])?.by).toBe('leftover')
  })

  it('costs the least when every size has a price, even with more left over', () => {
    const packs = [pack(3, { price: 210 }), pack(15, { price: 900 })]
    expect(counts(33.3, packs), '3 × 900 = 2,700 against 2 × 900 + 2 × 210 = 2,220').toEqual({ 15: 2, 3: 2 })
    expect(counts(41, packs), '3 × 900 = 2,700 against 2 × 900 + 4 × 210 = 2,640').toEqual({ 15: 2, 3: 4 })
    expect(counts(44, packs), '3 × 900 = 2,700 against 2 × 900 + 5 × 210 = 2,850').toEqual({ 15: 3 })
    expect(chooseKits(gallons(44), packs)).toMatchObject({ cost: 2700, by: 'cost' })
  })

  it('does not count a kit without a price as free', () => {
    const plan = chooseKits(gallons(10), [pack(3, { price: 210 }), pack(15)])
    expect(plan).toMatchObject({ by: 'leftover' })
    expect(priceOf(pack(15))).toBeNull()
    expect(chooseKits(gallons(14), [pack(3, { price: 210 }), pack(15)])?.cost).toBeNull()
  })

  it('orders in litres what is needed in gallons', () => {
    expect(chooseKits(gallons(10), [pack(10, { unit: 'L' })])?.lines[0]?.count, '37.85 L').toBe(4)
  })

  it('has no plan without packs, and an empty one for nothing', () => {
    expect(chooseKits(gallons(10), [])).toBeNull()
    expect(chooseKits(gallons(0), [pack(3)])).toMatchObject({ lines: [], leftover: { value: 0 }, cost: 0 })
  })

  it('adds up over bays that share no kit', () => {
    const three = pack(3)
    const bays = [4, 4, 4].flatMap((need) => chooseKits(gallons(need), [three]) ?? [])
    expect(joinPlans(bays, 'gal')).toMatchObject({
      lines: [{ count: 6 }],
      need: { value: 12 },
      held: { value: 18 },
      leftover: { value: 6 },
    })
    expect(counts(12, [three]), 'in one go it would be four').toEqual({ 3: 4 })
  })
})

describe('whatever is needed', () => {
  const need = fc.double({ min: 0.01, max: 5000, noNaN: true })
  const sizes = fc.uniqueArray(fc.constantFrom(0.75, 1, 1.5, 2, 3, 5, 10.5, 15, 50), { minLength: 1, maxLength: 4 })

  it('kits hold at least what is needed, and the leftover is less than the smallest kit when nothing is priced', () => {
    fc.assert(
      fc.property(need, sizes, (amount, given) => {
        const plan = chooseKits(
          gallons(amount),
          given.map((size) => pack(size)),
        )
        const held = plan?.lines.reduce((sum, line) => sum + line.count * line.pack.size.value, 0) ?? 0
        expect(held).toBeGreaterThanOrEqual(amount - 1e-6)
        expect(plan?.held.value).toBeCloseTo(held, 6)
        expect(plan?.leftover.value).toBeLessThanOrEqual(Math.min(...given) + 1e-6)
      }),
      { numRuns: 60 },
    )
  })

  it('never costs more than the best single size', () => {
    fc.assert(
      fc.property(need, sizes, fc.double({ min: 20, max: 90, noNaN: true }), (amount, given, rate) => {
        const packs = given.map((size, index) => pack(size, { price: Math.round(size * rate * (1 + index / 10)) + 1 }))
        const single = packs.map((one) => Math.ceil(amount / valueIn(one.size, 'gal') - 1e-9) * (priceOf(one) ?? 0))
        expect(chooseKits(gallons(amount), packs)?.cost).toBeLessThanOrEqual(Math.min(...single) + 1e-6)
      }),
      { numRuns: 60 },
    )
  })
})
