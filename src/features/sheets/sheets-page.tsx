import { useMemo } from 'react'
import { Link } from 'react-router'
import type { SheetRow } from '../../../shared/api/sheets.ts'
import { sentenceOf } from '../../lib/api.ts'
import { type ListAddress, useListAddress } from '../../lib/list-address.ts'
import { paths } from '../../lib/paths.ts'
import { useCan } from '../../lib/user.ts'
import { Asking } from '../../ui/asking.tsx'
import { SelectField, TextField } from '../../ui/field.tsx'
import { type ListColumns, type ListPage, ListTable } from '../../ui/list-table.tsx'
import { Card, Notice, Page } from '../../ui/page.tsx'
import { DropArea } from './drop-area.tsx'
import { type SheetsWanted, useSheets } from './queries.ts'
import { SheetAge } from './sheet-age.tsx'
import { UploadList } from './upload-list.tsx'
import { useUploads } from './use-uploads.ts'

const filters = ['kind', 'standing', 'age'] as const

/** All sheets: upload, search, filter. */
export function SheetsPage() {
  const address = useListAddress('title')
  const [kind, standing, age] = filters.map((name) => address.filter(name) || undefined)
  const sheets = useSheets({ q: address.q, sort: address.sort, cursor: address.cursor, kind, standing, age } as SheetsWanted)
  const mayUpload = useCan('sheet:write')
  return (
    <Page title="Sheets" under="Data sheets and safety sheets, each kept as the PDF it came as.">
      <div className="flex flex-col gap-4">
        {mayUpload && <Uploads />}
        <Card>
          <Filters address={address} />
          <Asking query={sheets} says={sentenceOf}>
            {(page) => <SheetsTable page={page} address={address} stale={sheets.isPlaceholderData} />}
          </Asking>
        </Card>
      </div>
    </Page>
  )
}

function Uploads() {
  const { uploads, add } = useUploads()
  return (
    <>
      <DropArea label="Upload PDFs" help="or drop them here: up to 50 at once, 25 MB and 1,000 pages each" onFiles={add} />
      <UploadList uploads={uploads} />
    </>
  )
}

function Filters({ address }: { address: ListAddress }) {
  return (
    <div className="grid gap-3 border-b border-rule p-4 sm:grid-cols-2 lg:grid-cols-[2fr_1fr_1fr_1fr]">
      <TextField
        label="Search"
        type="search"
        placeholder="Title, maker or file name"
        defaultValue={address.q}
        onChange={(event) => address.set({ q: event.target.value })}
      />
      <SelectField label="Kind" value={address.filter('kind')} onChange={(event) => address.set({ kind: event.target.value })}>
        <option value="">All</option>
        <option value="data">Data sheets</option>
        <option value="safety">Safety sheets</option>
      </SelectField>
      <SelectField label="Revisions" value={address.filter('standing')} onChange={(event) => address.set({ standing: event.target.value })}>
        <option value="">In force</option>
        <option value="superseded">Superseded</option>
        <option value="all">All</option>
      </SelectField>
      <SelectField label="Age" value={address.filter('age')} onChange={(event) => address.set({ age: event.target.value })}>
        <option value="">Any</option>
        <option value="within">Within the firm’s limit</option>
        <option value="beyond">Beyond the firm’s limit</option>
        <option value="undated">No date</option>
      </SelectField>
    </div>
  )
}

function SheetsTable({ page, address, stale }: { page: ListPage<SheetRow>; address: ListAddress; stale: boolean }) {
  const columns = useMemo<ListColumns<SheetRow>>(
    () => [
      { id: 'title', accessorKey: 'title', header: 'Sheet', cell: ({ row }) => <SheetTitle sheet={row.original} /> },
      { id: 'revisionDate', accessorKey: 'revisionDate', header: 'Revision, age', cell: ({ row }) => <SheetAge {...row.original} /> },
      { id: 'kind', header: 'Kind', enableSorting: false, accessorFn: (row) => (row.kind === 'data' ? 'data' : 'safety') },
      {
        id: 'maker',
        accessorKey: 'maker',
        header: 'Maker',
        cell: ({ row }) => row.original.maker || <span className="text-pencil">not given</span>,
      },
      { id: 'subjects', header: 'Speaks of', enableSorting: false, cell: ({ row }) => <Subjects names={row.original.subjects} /> },
      { id: 'pages', accessorKey: 'pages', header: 'Pages', meta: { numeric: true }, cell: ({ row }) => <OpenPdf sheet={row.original} /> },
      {
        id: 'uploadedAt',
        accessorKey: 'uploadedAt',
        header: 'Uploaded',
        cell: ({ row }) => <time dateTime={row.original.uploadedAt}>{dayOf(row.original.uploadedAt)}</time>,
      },
    ],
    [],
  )
  if (page.items.length === 0) {
    const narrowed = address.q !== '' || filters.some((name) => address.filter(name) !== '')
    return (
      <Notice>
        {narrowed
          ? 'No sheet matches. Take a filter off or search for fewer words.'
          : 'There are no sheets yet. Upload the PDFs of the makers to begin.'}
      </Notice>
    )
  }
  return (
    <ListTable
      caption="Sheets"
      columns={columns}
      page={page}
      sort={address.sort}
      stale={stale}
      rowKey={(row) => row.revisionId}
      onSort={(sort) => address.set({ sort })}
      onCursor={(cursor) => address.set({ cursor })}
    />
  )
}

const dayOf = (instant: string) => new Date(instant).toLocaleDateString('en-US', { day: 'numeric', month: 'short', year: 'numeric' })

function SheetTitle({ sheet }: { sheet: SheetRow }) {
  return (
    <span>
      <Link className="font-semibold text-resin underline-offset-4 hover:underline" to={paths.sheet(sheet.sheetId)}>
        {sheet.title}
      </Link>
      {sheet.superseded && <span className="text-caution"> ▲ superseded</span>}
      {sheet.state === 'no-text' && <span className="text-pencil"> pictures, no text</span>}
      {!sheet.superseded && sheet.revisions > 1 && <span className="text-pencil"> {sheet.revisions} revisions</span>}
    </span>
  )
}

function Subjects({ names }: { names: string[] }) {
  if (names.length === 0) return <span className="text-pencil">nothing yet</span>
  return <>{names.length > 2 ? `${names.slice(0, 2).join(', ')} and ${names.length - 2} more` : names.join(', ')}</>
}

function OpenPdf({ sheet }: { sheet: SheetRow }) {
  return (
    <Link
      className="text-resin underline-offset-4 hover:underline"
      aria-label={`Open ${sheet.title}, ${sheet.pages} ${sheet.pages === 1 ? 'page' : 'pages'}`}
      to={paths.sheetPage(sheet.revisionId)}
    >
      {sheet.pages}
    </Link>
  )
}
