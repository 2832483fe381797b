import { Link } from 'react-router'
import type { JobSummary } from '../../../shared/api/jobs.ts'
import { sentenceOf } from '../../lib/api.ts'
import { type ListAddress, useListAddress } from '../../lib/list-address.ts'
import { paths } from '../../lib/paths.ts'
import { useCan } from '../../lib/user.ts'
import { Asking } from '../../ui/asking.tsx'
import { buttonClass } from '../../ui/button.tsx'
import { SelectField, TextField } from '../../ui/field.tsx'
import { type ListColumns, type ListPage, ListTable } from '../../ui/list-table.tsx'
import { Card, Notice, Page } from '../../ui/page.tsx'
import { useJobs } from './queries.ts'

/** The jobs, open ones first. */
export function JobsPage() {
  const address = useListAddress('-updatedAt')
  const status = address.filter('status')
  const jobs = useJobs({ q: address.q, sort: address.sort, cursor: address.cursor, status: status || undefined })
  const mayWrite = useCan('job:write')
  return (
    <Page
      title="Jobs"
      actions={
        mayWrite && (
          <Link to={paths.newJob} className={buttonClass('primary')}>
            Open a job
          </Link>
        )
      }
    >
      <Card>
        <div className="flex flex-wrap gap-4 border-b border-rule p-4">
          <TextField
            label="Search"
            type="search"
            defaultValue={address.q}
            className="w-full max-w-sm"
            placeholder="Name, client or site"
            onChange={(event) => address.set({ q: event.target.value })}
          />
          <SelectField label="Standing" value={status} onChange={(event) => address.set({ status: event.target.value })}>
            <option value="">All</option>
            <option value="open">Open</option>
            <option value="closed">Closed</option>
          </SelectField>
        </div>
        <Asking query={jobs} says={sentenceOf}>
          {(page) => <JobTable page={page} address={address} stale={jobs.isPlaceholderData} filtered={address.q !== '' || status !== ''} />}
        </Asking>
      </Card>
    </Page>
  )
}

const columns: ListColumns<JobSummary> = [
  { id: 'number', header: 'No.', accessorFn: (job) => `J-${String(job.number).padStart(3, '0')}` },
  {
    id: 'name',
    header: 'Job',
    accessorKey: 'name',
    cell: ({ row }) => (
      <>
        <Link to={paths.job(row.original.id)} className="font-semibold text-resin hover:underline">
          {row.original.name}
        </Link>
        <div className="text-small text-pencil">{row.original.site}</div>
      </>
    ),
  },
  { id: 'client', header: 'Client', accessorKey: 'client' },
  {
    id: 'buildUp',
    header: 'Build-up',
    enableSorting: false,
    cell: ({ row: { original } }) =>
      original.buildUp ? (
        <Link to={paths.buildUp(original.buildUp.id, original.buildUp.version)} className="hover:underline">
          {original.buildUp.name}, version {original.buildUp.version}
        </Link>
      ) : (
        <span className="text-pencil">none chosen</span>
      ),
  },
  { id: 'bays', header: 'Bays', accessorKey: 'bays', enableSorting: false, meta: { numeric: true } },
  {
    id: 'startsAt',
    header: 'Start',
    accessorFn: (job) => (job.startsAt ? new Date(job.startsAt).toLocaleDateString(undefined, { dateStyle: 'medium' }) : 'not planned'),
  },
]

interface JobTableProps {
  page: ListPage<JobSummary>
  address: ListAddress
  stale: boolean
  filtered: boolean
}

function JobTable({ page, address, stale, filtered }: JobTableProps) {
  if (page.items.length === 0)
    return (
      <Notice>
        {filtered
          ? 'No job matches. Change the search or the standing.'
          : 'No jobs yet. Open one to work out quantities and write its specification.'}
      </Notice>
    )
  return (
    <ListTable
      caption="Jobs"
      columns={columns}
      page={page}
      sort={address.sort}
      stale={stale}
      rowKey={(job) => job.id}
      onSort={(sort) => address.set({ sort })}
      onCursor={(cursor) => address.set({ cursor })}
    />
  )
}
