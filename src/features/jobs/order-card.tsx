import type { MakerOrder, OrderList } from '../../../shared/domain/order-list.ts'
import { formatRange } from '../../../shared/domain/format.ts'
import { Button } from '../../ui/button.tsx'
import { Card } from '../../ui/page.tsx'

const dollars = (amount: number | null) =>
  amount === null ? (
    <span className="text-pencil">not entered</span>
  ) : (
    amount.toLocaleString('en-US', { style: 'currency', currency: 'USD' })
  )

/** Whole kits and bags by maker, with what is left over. Prices are those entered in the catalogue. */
export function OrderCard({ order }: { order: OrderList }) {
  return (
    <Card
      title="Order list"
      actions={
        <Button className="no-print" onClick={() => window.print()}>
          Print
        </Button>
      }
    >
      {order.makers.map((maker) => (
        <MakerTable key={maker.maker} order={maker} />
      ))}
      {order.open.length > 0 && (
        <p className="px-4 py-3">
          <span className="font-semibold">Cannot be ordered by the pack yet:</span> {order.open.join(', ')}. No pack size is stated, or the
          amount is not known.
        </p>
      )}
      <p className="flex justify-between border-t border-ink px-4 py-2 font-semibold">
        <span>Material, whole packs</span>
        <span>{dollars(order.cost)}</span>
      </p>
    </Card>
  )
}

function MakerTable({ order }: { order: MakerOrder }) {
  return (
    <div className="overflow-x-auto border-b border-rule px-4 py-3">
      <h3 className="mb-1">{order.maker}</h3>
      <table className="w-full text-left">
        <thead className="text-small text-pencil">
          <tr className="border-b border-rule">
            <th scope="col" className="py-1 font-normal">
              Item
            </th>
            <th scope="col" className="font-normal">
              For
            </th>
            <th scope="col" className="text-right font-normal">
              Pack
            </th>
            <th scope="col" className="text-right font-normal">
              Count
            </th>
            <th scope="col" className="text-right font-normal">
              Each
            </th>
            <th scope="col" className="text-right font-normal">
              Cost
            </th>
          </tr>
        </thead>
        <tbody>
          {order.lines.map((line) => (
            <tr key={`${line.item.id} ${line.item.size.value} ${line.item.size.unit}`} className="border-b border-rule align-top">
              <th scope="row" className="py-1 font-normal">
                {line.item.name}
              </th>
              <td className="text-pencil">{line.courses.join(', ')}</td>
              <td className="text-right whitespace-nowrap">
                {formatRange({ min: line.item.size.value, max: line.item.size.value, unit: line.item.size.unit })}
              </td>
              <td className="text-right font-semibold">{line.count.toLocaleString('en-US')}</td>
              <td className="text-right">{dollars(line.price)}</td>
              <td className="text-right">{dollars(line.cost)}</td>
            </tr>
          ))}
        </tbody>
      </table>
      {order.leftovers.length > 0 && (
        <p className="mt-1 text-small text-pencil">
          Left over:{' '}
          {order.leftovers
            .map(({ name, amount }) => `${formatRange({ min: amount.value, max: amount.value, unit: amount.unit })} of ${name}`)
            .join(', ')}
          .
        </p>
      )}
    </div>
  )
}
