import { Link } from 'react-router'
import type { ProductRow } from '../../../shared/api/catalogue.ts'
import { sentenceOf } from '../../lib/api.ts'
import { useListAddress } from '../../lib/list-address.ts'
import { paths } from '../../lib/paths.ts'
import { useSettled } from '../../lib/use-settled.ts'
import { useCan } from '../../lib/user.ts'
import { Asking } from '../../ui/asking.tsx'
import { buttonClass } from '../../ui/button.tsx'
import { type ListColumns, ListTable } from '../../ui/list-table.tsx'
import { Card, Notice, Page } from '../../ui/page.tsx'
import { ListFilters, filtersOf } from './list-filters.tsx'
import { exportAddress, useProducts } from './queries.ts'

const columns: ListColumns<ProductRow> = [
  {
    id: 'name',
    header: 'Product',
    accessorKey: 'name',
    cell: ({ row: { original } }) => (
      <>
        <Link to={paths.product(original.id)} className="inline-block min-w-44 font-semibold text-resin hover:underline">
          {original.name}
        </Link>
        {original.status === 'withdrawn' && <span className="text-pencil"> withdrawn</span>}
      </>
    ),
  },
  { id: 'maker', header: 'Maker', accessorKey: 'maker' },
  { id: 'kind', header: 'Kind', accessorKey: 'kind' },
  { id: 'chemistry', header: 'Chemistry', accessorKey: 'chemistry' },
  { id: 'facts', header: 'Values', accessorKey: 'facts', enableSorting: false, meta: { numeric: true } },
  { id: 'sheets', header: 'Sheets', accessorKey: 'sheets', enableSorting: false, meta: { numeric: true } },
]

/** All products, with search that forgives typing errors. */
export function ProductsPage() {
  const address = useListAddress('name')
  const filters = filtersOf(address, true)
  const products = useProducts({ q: useSettled(address.q, 120), sort: address.sort, cursor: address.cursor, ...filters })
  const mayWrite = useCan('catalogue:write')
  const filtered = address.q !== '' || Object.values(filters).some(Boolean)
  return (
    <Page
      title="Products"
      actions={
        <>
          <a href={exportAddress('products', { q: address.q, sort: address.sort, ...filters })} download className={buttonClass()}>
            Export CSV
          </a>
          {mayWrite && (
            <Link to={paths.newProduct} className={buttonClass('primary')}>
              Add a product
            </Link>
          )}
        </>
      }
    >
      <Card>
        <ListFilters address={address} withKind />
        <Asking query={products} says={sentenceOf}>
          {(page) =>
            page.items.length === 0 ? (
              <Notice>
                {filtered ? 'Nothing matches. Change the search or the filters.' : 'No products yet. Add one, then upload its sheets.'}
              </Notice>
            ) : (
              <ListTable
                caption="Products"
                columns={columns}
                page={page}
                sort={address.sort}
                stale={products.isPlaceholderData}
                rowKey={(row) => row.id}
                onSort={(sort) => address.set({ sort })}
                onCursor={(cursor) => address.set({ cursor })}
              />
            )
          }
        </Asking>
      </Card>
    </Page>
  )
}
