import { useMemo, useState } from 'react'
import { Link } from 'react-router'
import type { Person } from '../../../shared/api/people.ts'
import { sentenceOf } from '../../lib/api.ts'
import { useListAddress } from '../../lib/list-address.ts'
import { paths } from '../../lib/paths.ts'
import { useUser } from '../../lib/user.ts'
import { Asking } from '../../ui/asking.tsx'
import { Button } from '../../ui/button.tsx'
import { Dialog } from '../../ui/dialog.tsx'
import { TextField } from '../../ui/field.tsx'
import { type ListColumns, ListTable } from '../../ui/list-table.tsx'
import { Card, Notice, Page } from '../../ui/page.tsx'
import { InviteForm } from './invite-form.tsx'
import { usePeople, usePeopleChanges } from './queries.ts'

const roleNames = { lead: 'Technical lead', estimator: 'Estimator', crew: 'Crew' } as const
const statusNames = { invited: 'invited, no password yet', active: 'active', disabled: 'disabled' } as const

/** Who works here, and what each may do. */
export function PeoplePage() {
  const address = useListAddress('name')
  const people = usePeople({ q: address.q, sort: address.sort, cursor: address.cursor })
  const [inviting, setInviting] = useState(false)
  return (
    <Page
      title="People"
      actions={
        <>
          <Link className="text-resin underline-offset-4 hover:underline" to={paths.firm}>
            Firm
          </Link>
          <Link className="text-resin underline-offset-4 hover:underline" to={paths.outbox}>
            Outbox
          </Link>
          <Link className="text-resin underline-offset-4 hover:underline" to={paths.changes}>
            Changes
          </Link>
          <Button look="primary" onClick={() => setInviting(true)}>
            Invite a person
          </Button>
        </>
      }
    >
      <Dialog title="Invite a person" open={inviting} onClose={() => setInviting(false)}>
        <InviteForm onDone={() => setInviting(false)} />
      </Dialog>
      <Card>
        <div className="border-b border-rule p-4">
          <TextField
            label="Search"
            type="search"
            defaultValue={address.q}
            onChange={(event) => address.set({ q: event.target.value })}
            className="max-w-sm"
          />
        </div>
        <Asking query={people} says={sentenceOf}>
          {(page) => <PeopleTable page={page} address={address} stale={people.isPlaceholderData} />}
        </Asking>
      </Card>
    </Page>
  )
}

interface PeopleTableProps {
  page: { items: Person[]; total: number; nextCursor: string | null; previousCursor: string | null }
  address: ReturnType<typeof useListAddress>
  stale: boolean
}

function PeopleTable({ page, address, stale }: PeopleTableProps) {
  const columns = useMemo<ListColumns<Person>>(
    () => [
      { id: 'name', accessorKey: 'name', header: 'Name' },
      { id: 'email', accessorKey: 'email', header: 'E-mail address' },
      { id: 'role', accessorKey: 'role', header: 'Role', cell: ({ row }) => roleNames[row.original.role] },
      { id: 'status', header: 'Standing', enableSorting: false, accessorFn: (person) => statusNames[person.status] },
      { id: 'actions', header: 'Actions', enableSorting: false, cell: ({ row }) => <PersonActions person={row.original} /> },
    ],
    [],
  )
  if (page.items.length === 0) return <Notice>Nobody matches this search.</Notice>
  return (
    <ListTable
      caption="People of the firm"
      columns={columns}
      page={page}
      sort={address.sort}
      stale={stale}
      rowKey={(person) => person.id}
      onSort={(sort) => address.set({ sort })}
      onCursor={(cursor) => address.set({ cursor })}
    />
  )
}

function PersonActions({ person }: { person: Person }) {
  const user = useUser()
  const { change, sendLink } = usePeopleChanges()
  const error = change.error ?? sendLink.error
  const update = (changes: { role?: Person['role']; status?: 'active' | 'disabled' }) =>
    change.mutate({ personId: person.id, version: person.version, ...changes })
  return (
    <div className="flex flex-wrap items-center gap-2">
      <select
        aria-label={`Role of ${person.name}`}
        className="min-h-9 border border-pencil bg-card px-1"
        value={person.role}
        disabled={change.isPending || person.id === user.id}
        onChange={(event) => update({ role: event.target.value as Person['role'] })}
      >
        {Object.entries(roleNames).map(([role, name]) => (
          <option key={role} value={role}>
            {name}
          </option>
        ))}
      </select>
      {person.status !== 'disabled' && (
        <Button busy={sendLink.isPending} onClick={() => sendLink.mutate(person.id)}>
          {sendLink.isSuccess ? 'Link sent' : person.status === 'invited' ? 'Invite again' : 'Send password link'}
        </Button>
      )}
      {person.id !== user.id && person.status !== 'invited' && (
        <Button
          look={person.status === 'disabled' ? 'plain' : 'stop'}
          busy={change.isPending}
          onClick={() => update({ status: person.status === 'disabled' ? 'active' : 'disabled' })}
        >
          {person.status === 'disabled' ? 'Enable' : 'Disable'}
        </Button>
      )}
      {error && <p className="w-full font-semibold text-stop">{sentenceOf(error)}</p>}
    </div>
  )
}
