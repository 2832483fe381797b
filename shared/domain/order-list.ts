import type { KitPlan, PackItem } from './kits.ts'
import type { CourseQuantity } from './quantities.ts'
import type { Quantity } from './units.ts'

/** One line of an order: whole packs of one size of one thing. */
interface OrderLine {
  item: Omit<PackItem, 'count' | 'factId' | 'price'>
  count: number
  /** USD each, and for all; null when no price is entered. */
  price: number | null
  cost: number | null
  /** Titles of the courses it is for. */
  courses: string[]
}

export interface MakerOrder {
  maker: string
  lines: OrderLine[]
  /** What is left over when the floor is laid, by name. */
  leftovers: { name: string; amount: Quantity }[]
}

export interface OrderList {
  makers: MakerOrder[]
  /** USD for everything; null when a price, or an amount, is not known. */
  cost: number | null
  /** What cannot be ordered by the pack, by name: no pack size is stated, or the amount is not known. */
  open: string[]
}

interface Need {
  title: string
  name: string
  maker: string
  plan: KitPlan | null
}

const needsOf = (courses: readonly CourseQuantity[]): Need[] =>
  courses.flatMap(({ title, mix, packing, aggregates }) => [
    { title, name: mix.name, maker: mix.maker, plan: packing.plan },
    ...aggregates.map(({ product, plan }) => ({ title, name: product.name, maker: product.maker, plan })),
  ])

/** Whole packs by maker and item, over all courses, with what is left over and what it costs. */
export function orderList(courses: readonly CourseQuantity[]): OrderList {
  const needs = needsOf(courses)
  const makers = new Map<string, MakerOrder>()
  const orderOf = (maker: string) => {
    const order = makers.get(maker) ?? { maker, lines: [], leftovers: [] }
    makers.set(maker, order)
    return order
  }
  for (const { title, name, maker, plan } of needs) {
    if (!plan) continue
    for (const { pack, count } of plan.lines)
      for (const item of pack.items) addItem(orderOf(item.maker), item, { count: count * item.count, title })
    if (plan.leftover.value > 0) addLeftover(orderOf(maker), name, plan.leftover)
  }
  const open = [...new Set(needs.filter(({ plan }) => !plan).map(({ name }) => name))]
  const costs = [...makers.values()].flatMap(({ lines }) => lines.map(({ cost }) => cost))
  const cost = open.length > 0 ? null : costs.reduce<number | null>((sum, one) => (sum === null || one === null ? null : sum + one), 0)
  return { makers: [...makers.values()].sort((a, b) => a.maker.localeCompare(b.maker, 'en')), cost, open }
}

function addItem(
  order: MakerOrder,
  { kind, id, name, maker, size, price }: PackItem,
  { count, title }: { count: number; title: string },
): void {
  const same = order.lines.find(({ item }) => item.id === id && item.size.unit === size.unit && item.size.value === size.value)
  const line: OrderLine = same ?? { item: { kind, id, name, maker, size }, count: 0, price, cost: null, courses: [] }
  if (!same) order.lines.push(line)
  line.count += count
  line.cost = line.price === null ? null : line.price * line.count
  if (!line.courses.includes(title)) line.courses.push(title)
}

function addLeftover(order: MakerOrder, name: string, amount: Quantity): void {
  const same = order.leftovers.find((one) => one.name === name && one.amount.unit === amount.unit)
  if (same) same.amount = { value: same.amount.value + amount.value, unit: amount.unit }
  else order.leftovers.push({ name, amount })
}
