import { useMemo, useState } from 'react'
import { Link, useNavigate } from 'react-router'
import type { BuildUpSummary } from '../../../shared/api/build-ups.ts'
import { sentenceOf } from '../../lib/api.ts'
import { useListAddress } from '../../lib/list-address.ts'
import { paths } from '../../lib/paths.ts'
import { useCan } from '../../lib/user.ts'
import { Asking } from '../../ui/asking.tsx'
import { Button } from '../../ui/button.tsx'
import { Dialog } from '../../ui/dialog.tsx'
import { SelectField, TextField } from '../../ui/field.tsx'
import { FigureView } from '../../ui/figure-view.tsx'
import { type ListColumns, ListTable } from '../../ui/list-table.tsx'
import { Card, Notice, Page } from '../../ui/page.tsx'
import { SmallSection } from '../../ui/section-figure.tsx'
import { StatusMark } from '../../ui/status-mark.tsx'
import { buildUpNumber } from './build-up-number.ts'
import { NewBuildUpForm } from './new-build-up-form.tsx'
import { useBuildUps } from './queries.ts'

/** The firm's floors, each by its newest version. */
export function BuildUpsPage() {
  const address = useListAddress('-updatedAt')
  const status = address.filter('status')
  const list = useBuildUps({ q: address.q, sort: address.sort, cursor: address.cursor, status })
  const [beginning, setBeginning] = useState(false)
  const navigate = useNavigate()
  return (
    <Page
      title="Build-ups"
      actions={
        useCan('build-up:draft') && (
          <Button look="primary" onClick={() => setBeginning(true)}>
            Begin a build-up
          </Button>
        )
      }
    >
      <Dialog title="Begin a build-up" open={beginning} onClose={() => setBeginning(false)}>
        <NewBuildUpForm onMade={(made) => void navigate(paths.buildUp(made.id, 1))} />
      </Dialog>
      <Card>
        <div className="flex flex-wrap gap-4 border-b border-rule p-4">
          <TextField
            label="Search"
            type="search"
            defaultValue={address.q}
            onChange={(event) => address.set({ q: event.target.value })}
            className="w-full max-w-sm"
          />
          <SelectField label="Status" value={status} onChange={(event) => address.set({ status: event.target.value })}>
            <option value="">any</option>
            <option>draft</option>
            <option>released</option>
            <option>withdrawn</option>
          </SelectField>
        </div>
        <Asking query={list} says={sentenceOf}>
          {(page) =>
            page.items.length > 0 ? (
              <BuildUpTable page={page} address={address} stale={list.isPlaceholderData} />
            ) : (
              <Notice>
                {address.q || status
                  ? 'No build-up matches. Search for part of its name, its number or a mix in it.'
                  : 'No build-ups yet. Begin one: a floor from the slab upward.'}
              </Notice>
            )
          }
        </Asking>
      </Card>
    </Page>
  )
}

interface BuildUpTableProps {
  page: { items: BuildUpSummary[]; total: number; nextCursor: string | null; previousCursor: string | null }
  address: ReturnType<typeof useListAddress>
  stale: boolean
}

function BuildUpTable({ page, address, stale }: BuildUpTableProps) {
  const columns = useMemo<ListColumns<BuildUpSummary>>(
    () => [
      { id: 'section', header: 'Section', enableSorting: false, cell: ({ row }) => <SmallSection layers={row.original.layers} /> },
      {
        id: 'name',
        header: 'Name',
        cell: ({ row: { original } }) => (
          <>
            <Link to={paths.buildUp(original.id)} className="font-semibold text-resin hover:underline">
              {original.name}
            </Link>
            <span className="block text-small text-pencil">
              {original.courses} {original.courses === 1 ? 'course' : 'courses'}
            </span>
          </>
        ),
      },
      { id: 'number', header: 'Number', cell: ({ row }) => buildUpNumber(row.original.number) },
      { id: 'status', header: 'Status', cell: ({ row }) => <Standing summary={row.original} /> },
      {
        id: 'thickness',
        header: 'Thickness, dry',
        enableSorting: false,
        meta: { numeric: true },
        cell: ({ row }) => <FigureView figure={row.original.thickness} />,
      },
      { id: 'findings', header: 'Checks', enableSorting: false, cell: ({ row }) => <Counts findings={row.original.findings} /> },
      {
        id: 'updatedAt',
        header: 'Changed',
        cell: ({ row: { original } }) => (
          <>
            {new Date(original.newest.updatedAt).toLocaleDateString('en-US', { day: 'numeric', month: 'short', year: 'numeric' })}
            <span className="block text-small text-pencil">{original.newest.updatedByName}</span>
          </>
        ),
      },
    ],
    [],
  )
  return (
    <ListTable
      caption="Build-ups by their newest version"
      columns={columns}
      page={page}
      sort={address.sort}
      stale={stale}
      rowKey={(row) => row.id}
      onSort={(sort) => address.set({ sort })}
      onCursor={(cursor) => address.set({ cursor })}
    />
  )
}

function Standing({ summary: { newest, released } }: { summary: BuildUpSummary }) {
  const apart = released && released.number !== newest.number
  return (
    <>
      version {newest.number}, {newest.status}
      {apart && <span className="block text-small text-pencil">version {released.number} released</span>}
    </>
  )
}

function Counts({ findings }: { findings: BuildUpSummary['findings'] }) {
  return (
    <span className="flex flex-col text-small">
      {(['stop', 'caution', 'unknown', 'met'] as const)
        .filter((status) => findings[status] > 0)
        .map((status) => (
          <span key={status} className="whitespace-nowrap">
            <StatusMark status={status} /> {findings[status]}
          </span>
        ))}
    </span>
  )
}
