import {
  type ColumnDef,
  type RowData,
  type SortingState,
  rowPaginationFeature,
  rowSortingFeature,
  tableFeatures,
  useTable,
} from '@tanstack/react-table'
import { useMemo } from 'react'
import { Button } from './button.tsx'

/** Lists are sorted and paged by the server; the table only keeps the state and draws. */
export const listFeatures = tableFeatures({ rowSortingFeature, rowPaginationFeature })
export type ListColumns<Row extends RowData> = ColumnDef<typeof listFeatures, Row>[]

export interface ListPage<Row> {
  items: Row[]
  total: number
  nextCursor: string | null
  previousCursor: string | null
}

interface ListTableProps<Row extends RowData> {
  /** Said to screen readers. */
  caption: string
  columns: ListColumns<Row>
  page: ListPage<Row>
  sort: string
  onSort: (sort: string) => void
  onCursor: (cursor: string | undefined) => void
  rowKey: (row: Row) => string
  /** While the next page is on its way the present one stays, dimmed. */
  stale?: boolean
}

/** A column's id is the server's sort key; columns with `enableSorting: false` cannot be sorted. `meta: { numeric: true }` sets right. */
export function ListTable<Row extends RowData>(props: ListTableProps<Row>) {
  const { columns, page, sort, onSort, rowKey } = props
  const sorting = useMemo<SortingState>(() => [{ id: sort.replace(/^-/, ''), desc: sort.startsWith('-') }], [sort])
  const table = useTable({
    features: listFeatures,
    columns,
    data: page.items,
    getRowId: rowKey,
    manualSorting: true,
    manualPagination: true,
    enableSortingRemoval: false,
    state: { sorting },
    onSortingChange: (change) => {
      const [next] = typeof change === 'function' ? change(sorting) : change
      if (next) onSort(next.desc ? `-${next.id}` : next.id)
    },
  })
  const numeric = (meta: unknown) => (meta as { numeric?: boolean } | undefined)?.numeric === true
  return (
    <div className={props.stale ? 'opacity-60' : ''}>
      {/* eslint-disable-next-line jsx-a11y/no-noninteractive-tabindex -- a region that scrolls must be reachable by keyboard (WCAG 2.1.1) */}
      <div className="relative overflow-x-auto" tabIndex={0} role="region" aria-label={props.caption}>
        <table className="w-full border-collapse text-left">
          <caption className="sr-only">{props.caption}</caption>
          <thead>
            {table.getHeaderGroups().map((group) => (
              <tr key={group.id} className="border-b border-ink">
                {group.headers.map((header) => {
                  const direction = header.column.getIsSorted()
                  const right = numeric(header.column.columnDef.meta)
                  return (
                    <th
                      key={header.id}
                      scope="col"
                      aria-sort={direction === 'asc' ? 'ascending' : direction === 'desc' ? 'descending' : undefined}
                      className={`px-4 py-2 font-semibold whitespace-nowrap text-pencil ${right ? 'text-right' : ''}`}
                    >
                      {header.column.getCanSort() ? (
                        <button type="button" className="font-semibold hover:text-ink" onClick={header.column.getToggleSortingHandler()}>
                          <table.FlexRender header={header} />
                          <span aria-hidden="true" className="inline-block w-4 text-resin">
                            {direction === 'asc' ? '↑' : direction === 'desc' ? '↓' : ''}
                          </span>
                        </button>
                      ) : (
                        <table.FlexRender header={header} />
                      )}
                    </th>
                  )
                })}
              </tr>
            ))}
          </thead>
          <tbody>
            {table.getRowModel().rows.map((row) => (
              <tr key={row.id} className="border-b border-rule hover:bg-resin-wash/50">
                {row.getAllCells().map((cell) => (
                  <td key={cell.id} className={`px-4 py-2 align-top ${numeric(cell.column.columnDef.meta) ? 'text-right' : ''}`}>
                    <table.FlexRender cell={cell} />
                  </td>
                ))}
              </tr>
            ))}
          </tbody>
        </table>
      </div>
      <PageSteps {...props} />
    </div>
  )
}

function PageSteps<Row extends RowData>({ page, onCursor }: Pick<ListTableProps<Row>, 'page' | 'onCursor'>) {
  const paged = page.previousCursor !== null || page.nextCursor !== null
  return (
    <div className="flex items-center justify-between gap-4 px-4 py-2 text-pencil">
      <span>
        {paged ? `${page.items.length} of ${page.total.toLocaleString('en-US')}` : `${page.total.toLocaleString('en-US')} in all`}
      </span>
      {paged && (
        <span className="flex gap-2">
          <Button disabled={page.previousCursor === null} onClick={() => onCursor(page.previousCursor ?? undefined)}>
            Previous
          </Button>
          <Button disabled={page.nextCursor === null} onClick={() => onCursor(page.nextCursor ?? undefined)}>
            Next
          </Button>
        </span>
      )}
    </div>
  )
}
