import { Link } from 'react-router'
import type { MixRow } from '../../../shared/api/catalogue.ts'
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
import { exportAddress, useMixes } from './queries.ts'

const columns: ListColumns<MixRow> = [
  {
    id: 'name',
    header: 'Mix',
    accessorKey: 'name',
    cell: ({ row: { original } }) => (
      <span className="flex min-w-40 items-center gap-2">
        <svg width="16" height="16" aria-hidden="true" className="shrink-0 border border-rule">
          <rect width="16" height="16" fill={original.color} />
        </svg>
        <Link to={paths.mix(original.id)} className="font-semibold text-resin hover:underline">
          {original.name}
        </Link>
        {original.status === 'withdrawn' && <span className="text-pencil">withdrawn</span>}
      </span>
    ),
  },
  { id: 'maker', header: 'Maker', accessorKey: 'maker' },
  { id: 'chemistry', header: 'Chemistry', accessorKey: 'chemistry' },
  {
    id: 'parts',
    header: 'Parts',
    enableSorting: false,
    cell: ({ row: { original } }) => <span className="inline-block min-w-56 text-small text-pencil">{original.parts.join(' + ')}</span>,
  },
  { id: 'facts', header: 'Values', accessorKey: 'facts', enableSorting: false, meta: { numeric: true } },
  { id: 'sheets', header: 'Sheets', accessorKey: 'sheets', enableSorting: false, meta: { numeric: true } },
]

/** All mixes: what goes on the floor. */
export function MixesPage() {
  const address = useListAddress('name')
  const filters = filtersOf(address, false)
  const mixes = useMixes({ q: useSettled(address.q, 120), sort: address.sort, cursor: address.cursor, ...filters })
  const mayWrite = useCan('catalogue:write')
  const filtered = address.q !== '' || Object.values(filters).some(Boolean)
  return (
    <Page
      title="Mixes"
      under="What goes on the floor: one product alone, or parts at a ratio."
      actions={
        <>
          <a href={exportAddress('mixes', { q: address.q, sort: address.sort, ...filters })} download className={buttonClass()}>
            Export CSV
          </a>
          {mayWrite && (
            <Link to={paths.newMix} className={buttonClass('primary')}>
              Add a mix
            </Link>
          )}
        </>
      }
    >
      <Card>
        <ListFilters address={address} withKind={false} />
        <Asking query={mixes} says={sentenceOf}>
          {(page) =>
            page.items.length === 0 ? (
              <Notice>
                {filtered
                  ? 'Nothing matches. Change the search or the filters.'
                  : 'No mixes yet. Add one from the products of the catalogue.'}
              </Notice>
            ) : (
              <ListTable
                caption="Mixes"
                columns={columns}
                page={page}
                sort={address.sort}
                stale={mixes.isPlaceholderData}
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
