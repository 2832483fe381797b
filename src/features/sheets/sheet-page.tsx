import { useState } from 'react'
import { Link, useParams } from 'react-router'
import type { Revision, Sheet } from '../../../shared/api/sheets.ts'
import { writtenDate } from '../../../shared/domain/sheet-age.ts'
import { sentenceOf } from '../../lib/api.ts'
import { paths } from '../../lib/paths.ts'
import { useCan } from '../../lib/user.ts'
import { Asking } from '../../ui/asking.tsx'
import { Button, buttonClass } from '../../ui/button.tsx'
import { Card, Page } from '../../ui/page.tsx'
import { DetailsForm } from './details-form.tsx'
import { DropArea } from './drop-area.tsx'
import { NoText } from './no-text.tsx'
import { fileAddress, useSheet, useSheetChanges } from './queries.ts'
import { SheetAge } from './sheet-age.tsx'
import { refOf } from './subject-picker.tsx'
import { UploadList } from './upload-list.tsx'
import { useUploads } from './use-uploads.ts'

/** One sheet: what it speaks of, and each of its revisions. */
export function SheetPage() {
  const { sheetId = '' } = useParams()
  const sheet = useSheet(sheetId)
  return (
    <Asking query={sheet} says={sentenceOf}>
      {(data) => <SheetRecord key={data.id} sheet={data} />}
    </Asking>
  )
}

function SheetRecord({ sheet }: { sheet: Sheet }) {
  const mayChange = useCan('sheet:write')
  const [editing, setEditing] = useState(false)
  const [inForce] = sheet.revisions
  return (
    <Page
      title={sheet.title}
      under={[sheet.kind === 'data' ? 'Data sheet' : 'Safety sheet', sheet.maker].filter(Boolean).join(' · ')}
      actions={
        <>
          {inForce && (
            <Link className={buttonClass('primary')} to={paths.sheetPage(inForce.id)}>
              Open the PDF
            </Link>
          )}
          {mayChange && !editing && <Button onClick={() => setEditing(true)}>Edit</Button>}
        </>
      }
    >
      <div className="flex flex-col gap-4">
        {editing && inForce && (
          <Card title="Edit" actions={<Button onClick={() => setEditing(false)}>Cancel</Button>}>
            <div className="p-4">
              <DetailsForm
                key={sheet.version}
                sheet={sheet}
                revisionIds={[inForce.id, ...sheet.revisions.slice(1).map((revision) => revision.id)]}
                onSaved={() => setEditing(false)}
              />
            </div>
          </Card>
        )}
        <Card title="Speaks of">
          <SubjectList sheet={sheet} />
        </Card>
        <Card title="Revisions">
          <ol>
            {sheet.revisions.map((revision) => (
              <RevisionItem key={revision.id} sheet={sheet} revision={revision} />
            ))}
          </ol>
        </Card>
        {mayChange && <NewRevision sheet={sheet} />}
      </div>
    </Page>
  )
}

function SubjectList({ sheet }: { sheet: Sheet }) {
  const mayOpen = useCan('catalogue:read')
  if (sheet.subjects.length === 0)
    return (
      <p className="px-4 py-3 text-pencil">
        No product or mix yet. Values can be tied to this sheet once it is attached to what it speaks of.
      </p>
    )
  return (
    <ul className="px-4 py-2">
      {sheet.subjects.map((subject) => (
        <li key={subject.id} className="py-1">
          {mayOpen ? (
            <Link
              className="text-resin underline-offset-4 hover:underline"
              to={subject.kind === 'product' ? paths.product(subject.id) : paths.mix(subject.id)}
            >
              {subject.name}
            </Link>
          ) : (
            subject.name
          )}{' '}
          <span className="text-pencil">
            {subject.kind}, {subject.maker}
          </span>
        </li>
      ))}
    </ul>
  )
}

const sizeOf = (bytes: number) => (bytes < 1024 * 1024 ? `${Math.ceil(bytes / 1024)} kB` : `${(bytes / 1024 / 1024).toFixed(1)} MB`)

function RevisionItem({ sheet, revision }: { sheet: Sheet; revision: Revision }) {
  const uploaded = new Date(revision.uploadedAt).toLocaleDateString('en-US', { day: 'numeric', month: 'short', year: 'numeric' })
  return (
    <li className="flex flex-wrap items-start justify-between gap-x-6 gap-y-2 border-b border-rule px-4 py-3 last:border-b-0">
      <div className="min-w-0">
        <p>
          <Link className="font-semibold text-resin underline-offset-4 hover:underline" to={paths.sheetPage(revision.id)}>
            <SheetAge kind={sheet.kind} revisionDate={revision.revisionDate} superseded={revision.superseded} />
          </Link>{' '}
          <span className={revision.superseded ? 'text-caution' : 'text-met'}>
            <span aria-hidden="true">{revision.superseded ? '▲' : '●'}</span> {revision.superseded ? 'superseded' : 'in force'}
          </span>
        </p>
        <p className="break-all text-pencil">
          {revision.fileName}, {revision.pages} {revision.pages === 1 ? 'page' : 'pages'}, {sizeOf(revision.bytes)}, uploaded {uploaded} by{' '}
          {revision.uploadedByName ?? 'Wearcourse'}
        </p>
        {revision.state === 'no-text' && <NoText />}
        {revision.suggestedDate && <ConfirmDate sheet={sheet} revision={revision} date={revision.suggestedDate} />}
      </div>
      <a className={buttonClass()} href={fileAddress(revision.id)} download={revision.fileName}>
        Download
      </a>
    </li>
  )
}

/** The text gives a date that nobody has confirmed yet. */
function ConfirmDate({ sheet, revision, date }: { sheet: Sheet; revision: Revision; date: string }) {
  const { confirmDate } = useSheetChanges()
  const mayChange = useCan('sheet:write')
  const { id, version, kind, title, maker, subjects } = sheet
  const confirm = () =>
    confirmDate.mutate({
      sheetId: id,
      version,
      kind,
      title,
      maker,
      subjects: subjects.map(refOf),
      dates: [{ revisionId: revision.id, revisionDate: date }],
    })
  return (
    <p className="mt-1 flex flex-wrap items-center gap-2">
      The text seems to give {writtenDate(date)}; nobody has confirmed it.
      {mayChange && (
        <Button busy={confirmDate.isPending} onClick={confirm}>
          Confirm this date
        </Button>
      )}
      {confirmDate.error && <span className="text-stop">{sentenceOf(confirmDate.error)}</span>}
    </p>
  )
}

function NewRevision({ sheet }: { sheet: Sheet }) {
  const { uploads, add } = useUploads(sheet.id)
  return (
    <>
      <DropArea
        label="Add a revision"
        help="or drop the new PDF here. The latest date is in force, whatever the order of upload."
        onFiles={add}
      />
      <UploadList uploads={uploads} />
    </>
  )
}
