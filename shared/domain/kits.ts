import { wholeUp } from './rounding.ts'
import { type Quantity, valueIn } from './units.ts'

/** One thing to put on the order: a kit of a mix, a pail of one part, a bag. */
export interface PackItem {
  kind: 'mix' | 'product'
  id: string
  name: string
  maker: string
  /** As the sheet states it. */
  size: Quantity
  /** How many of it make one kit. */
  count: number
  factId: string
  /** USD each; null when no price is entered. */
  price: number | null
}

/** What is opened at once: a kit with all its parts, or a bag. */
export interface Pack {
  /** Mixed volume, or mass. */
  size: Quantity
  items: readonly PackItem[]
}

export interface KitPlan {
  lines: { pack: Pack; count: number }[]
  need: Quantity
  held: Quantity
  leftover: Quantity
  /** USD; null when a pack in the plan has no price. */
  cost: number | null
  /** What it was chosen for. */
  by: 'cost' | 'leftover'
}

/** Price of a pack: that of all its items; null when one has none. */
export function priceOf({ items }: Pack): number | null {
  return items.reduce<number | null>((sum, { price, count }) => (sum === null || price === null ? null : sum + price * count), 0)
}

/** Combinations looked at before a size is only tried in small numbers. */
const mostTried = 5000

/**
 * Whole packs that hold at least what is needed: at least cost when every pack has a price, else with the least leftover; among equals the fewest
 * packs. The size that is cheapest by volume (without prices: the largest) makes up the rest, so that the others are needed in small numbers only.
 * Needs and sizes are volumes, or masses, all of one dimension. An amount above a whole number by less than 10⁻⁹ packs is that number.
 */
export function chooseKits(need: Quantity, packs: readonly Pack[]): KitPlan | null {
  if (packs.length === 0) return null
  const by = packs.every((pack) => priceOf(pack) !== null) ? 'cost' : 'leftover'
  const sizes = packs.map((pack) => valueIn(pack.size, need.unit))
  const rate = (index: number) => (by === 'cost' ? (priceOf(packs[index] ?? none) ?? 0) / (sizes[index] ?? 1) : -(sizes[index] ?? 0))
  const order = packs.map((_, index) => index).sort((a, b) => rate(a) - rate(b))
  const [base = 0, ...others] = order
  const least = Math.floor(mostTried ** (1 / Math.max(1, others.length)))
  let best: { counts: number[]; score: [number, number] } | undefined
  const tryAll = (at: number, counts: number[], rest: number) => {
    const index = others[at]
    if (index === undefined) {
      const all = [...counts]
      all[base] = rest > 0 ? wholeUp(rest / (sizes[base] ?? 1)) : 0
      const score = scoreOf(all, { packs, sizes, need: need.value, by })
      if (!best || isLess(score, best.score)) best = { counts: all, score }
      return
    }
    const size = sizes[index] ?? 1
    const most = Math.min(least, rest > 0 ? wholeUp(rest / size) : 0)
    for (let count = 0; count <= most; count++) {
      const next = [...counts]
      next[index] = count
      tryAll(at + 1, next, rest - count * size)
    }
  }
  tryAll(
    0,
    packs.map(() => 0),
    need.value,
  )
  return planOf(best?.counts ?? [], { packs, sizes, need, by })
}

const none: Pack = { size: { value: 1, unit: 'L' }, items: [] }

const isLess = ([a, fewA]: [number, number], [b, fewB]: [number, number]) => a < b - 1e-9 || (a < b + 1e-9 && fewA < fewB)

interface Choice {
  packs: readonly Pack[]
  sizes: readonly number[]
  by: KitPlan['by']
}

const heldBy = (counts: readonly number[], sizes: readonly number[]) =>
  counts.reduce((sum, count, index) => sum + count * (sizes[index] ?? 0), 0)

/** Cost or leftover, then the number of packs. */
function scoreOf(counts: readonly number[], { packs, sizes, need, by }: Choice & { need: number }): [number, number] {
  const pieces = counts.reduce((sum, count) => sum + count, 0)
  const cost = () => counts.reduce((sum, count, index) => sum + count * (priceOf(packs[index] ?? none) ?? 0), 0)
  return [by === 'cost' ? cost() : heldBy(counts, sizes) - need, pieces]
}

function planOf(counts: readonly number[], { packs, sizes, need, by }: Choice & { need: Quantity }): KitPlan {
  const held = heldBy(counts, sizes)
  const lines = packs.map((pack, index) => ({ pack, count: counts[index] ?? 0 })).filter(({ count }) => count > 0)
  return {
    lines,
    need,
    held: { value: held, unit: need.unit },
    leftover: { value: Math.max(0, held - need.value), unit: need.unit },
    cost: costOf(lines),
    by,
  }
}

/** USD of some packs; null when one has no price. */
function costOf(lines: readonly { pack: Pack; count: number }[]): number | null {
  return lines.reduce<number | null>((sum, { pack, count }) => {
    const price = priceOf(pack)
    return sum === null || price === null ? null : sum + price * count
  }, 0)
}

/** Several plans as one: what each bay needs, where a kit is not carried from one to the next. */
export function joinPlans(plans: readonly KitPlan[], unit: Quantity['unit']): KitPlan {
  const lines = new Map<Pack, number>()
  for (const { pack, count } of plans.flatMap((plan) => plan.lines)) lines.set(pack, (lines.get(pack) ?? 0) + count)
  const sum = (of: (plan: KitPlan) => Quantity) => ({ value: plans.reduce((total, plan) => total + valueIn(of(plan), unit), 0), unit })
  const joined = [...lines].map(([pack, count]) => ({ pack, count }))
  return {
    lines: joined,
    need: sum((plan) => plan.need),
    held: sum((plan) => plan.held),
    leftover: sum((plan) => plan.leftover),
    cost: costOf(joined),
    by: plans[0]?.by ?? 'leftover',
  }
}
