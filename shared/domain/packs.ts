import { type Fact, factsOf, flagOf, factOf, rangeOf } from './fact.ts'
import type { Pack, PackItem } from './kits.ts'
import type { MixFacts } from './mix.ts'
import type { ProductFacts } from './product.ts'
import { ratiosOf } from './proportion.ts'
import { sharesOf } from './ratio.ts'
import { type Quantity, dimensionOf, quantity, valueIn } from './units.ts'

/** What the sheet says of mixing part of a kit. Silence is not leave: it is counted as whole kits only. */
export type PartKits = 'allowed' | 'forbidden' | 'not stated'

/** May a kit of the mix be split? A mix of one product in one pail needs no ratio, so part of a pail is always in ratio. */
export function partKitsOf(mix: MixFacts): PartKits {
  const is = flagOf(factOf(mix.facts, 'splitKit'))
  if (is !== undefined) return is ? 'allowed' : 'forbidden'
  return mix.parts.length === 1 ? 'allowed' : 'not stated'
}

/** The single size a fact states. */
function sizeOf(fact: Fact): Quantity | undefined {
  const range = rangeOf(fact)
  const value = range?.max ?? range?.min
  return range && value !== undefined && value > 0 ? { value, unit: range.unit } : undefined
}

/** USD of a pack: the price entered for its size, or the only price where there is one size only. */
function priceFor(size: Quantity, facts: readonly Fact[], sizes: number): number | null {
  const at = (fact: Fact) => fact.at?.volume ?? fact.at?.mass
  const fits = (fact: Fact) => {
    const of = at(fact)
    return of ? dimensionOf(of.unit) === dimensionOf(size.unit) && Math.abs(valueIn(of, size.unit) / size.value - 1) < 0.005 : sizes === 1
  }
  const range = rangeOf(facts.find(fits))
  return range?.max ?? range?.min ?? null
}

type Owner = Pick<PackItem, 'kind' | 'id' | 'name' | 'maker'>

function itemsOf(owner: Owner, sizes: readonly Fact[], prices: readonly Fact[]): PackItem[] {
  return sizes.flatMap((fact) => {
    const size = sizeOf(fact)
    return size ? [{ ...owner, size, count: 1, factId: fact.id, price: priceFor(size, prices, sizes.length) }] : []
  })
}

const productOwner = ({ id, name, maker }: ProductFacts): Owner => ({ kind: 'product', id, name, maker })

/** Bags or pails of one product, as its sheet states them. */
export function packsOfProduct(product: ProductFacts): Pack[] {
  return itemsOf(productOwner(product), factsOf(product.facts, 'packSize'), factsOf(product.facts, 'packPrice')).map((item) => ({
    size: item.size,
    items: [item],
  }))
}

/** Packs of one part: as the mix's sheet states them for the part, else as the product's own does. */
function packsOfPart(mix: MixFacts, { part, product }: MixFacts['parts'][number]): PackItem[] {
  const prices = [...factsOf(mix.facts, 'packPrice', part), ...factsOf(product.facts, 'packPrice')]
  const ofMix = itemsOf(productOwner(product), factsOf(mix.facts, 'packSize', part), prices)
  return ofMix.length > 0 ? ofMix : itemsOf(productOwner(product), factsOf(product.facts, 'packSize'), prices)
}

/** How far a pack may be off its share and still make a kit: packs are rounded to the ounce and the gram. Common practice. */
const roundedPack = 0.02

/**
 * Kits of a mix: those its sheet states mixed; else whole packs of its parts that together are in ratio (up to four of each).
 * Empty when neither is stated, or when the packs of the parts do not make up the ratio.
 */
export function packsOfMix(mix: MixFacts): Pack[] {
  const owner: Owner = { kind: 'mix', id: mix.id, name: mix.name, maker: mix.maker }
  const mixed = itemsOf(owner, factsOf(mix.facts, 'packSize'), factsOf(mix.facts, 'packPrice'))
  if (mixed.length > 0) return mixed.map((item) => ({ size: item.size, items: [item] }))
  const parts = mix.parts.map((part) => packsOfPart(mix, part))
  const ratios = ratiosOf(mix)
  if (mix.parts.length === 1) return (parts[0] ?? []).map((item) => ({ size: item.size, items: [item] }))
  return [...kitsInRatio(parts, ratios.volume, 'L'), ...kitsInRatio(parts, ratios.weight, 'kg')]
}

/** Every way to take one size of each part, `most` times at most, so that the whole is in ratio. */
function kitsInRatio(parts: readonly PackItem[][], ratio: readonly number[] | null, unit: 'L' | 'kg'): Pack[] {
  if (!ratio) return []
  const shares = sharesOf(ratio)
  const choices = parts.map((items) => items.filter(({ size }) => dimensionOf(size.unit) === dimensionOf(unit)))
  const sized = choices.reduce<PackItem[][]>((sets, items) => sets.flatMap((set) => items.map((item) => [...set, item])), [[]])
  return sized.flatMap((set) => {
    const items = fewestInRatio(set, shares, unit)
    if (!items) return []
    const shown = items[0]?.size.unit ?? unit
    return [
      {
        size: quantity(
          items.reduce((sum, { size, count }) => sum + valueIn(size, shown) * count, 0),
          shown,
        ),
        items,
      },
    ]
  })
}

function fewestInRatio(set: readonly PackItem[], shares: readonly number[], unit: 'L' | 'kg'): PackItem[] | undefined {
  const counted = set.reduce<number[][]>((all) => all.flatMap((counts) => [1, 2, 3, 4].map((count) => [...counts, count])), [[]])
  const pieces = (counts: readonly number[]) => counts.reduce((sum, count) => sum + count, 0)
  const counts = counted
    .sort((a, b) => pieces(a) - pieces(b))
    .find((some) => {
      const amounts = set.map(({ size }, index) => valueIn(size, unit) * (some[index] ?? 1))
      const total = amounts.reduce((sum, amount) => sum + amount, 0)
      return amounts.every((amount, index) => Math.abs(amount / total / (shares[index] ?? Number.NaN) - 1) <= roundedPack)
    })
  return counts && set.map((item, index) => ({ ...item, count: counts[index] ?? 1 }))
}
