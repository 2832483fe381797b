import { type ReactNode, useState } from 'react'
import { Link, useParams } from 'react-router'
import { writtenDate } from '../../../shared/domain/sheet-age.ts'
import { type SpecDocument, issueWords } from '../../../shared/domain/specification/document.ts'
import type { Specification } from '../../../shared/api/specifications.ts'
import { sentenceOf } from '../../lib/api.ts'
import { paths } from '../../lib/paths.ts'
import { useCan } from '../../lib/user.ts'
import { Asking } from '../../ui/asking.tsx'
import { Button, buttonClass } from '../../ui/button.tsx'
import { Dialog } from '../../ui/dialog.tsx'
import { Card, Page } from '../../ui/page.tsx'
import { Contents } from './contents.tsx'
import { DocumentView } from './document-view.tsx'
import { IssueForm } from './issue-form.tsx'
import { IssuesCard } from './issues-card.tsx'
import { files, useIssue, useSpecification } from './queries.ts'
import { SectionForm } from './section-form.tsx'
import { SupersededNotice } from './superseded-notice.tsx'

const linkClass = 'text-resin underline underline-offset-4'

function Exports({ address }: { address: (kind: 'docx' | 'pdf') => string }) {
  return (
    <>
      <a href={address('docx')} download className={buttonClass()}>
        Export DOCX
      </a>
      <a href={address('pdf')} download className={buttonClass()}>
        Export PDF
      </a>
      <Button onClick={() => window.print()}>Print</Button>
    </>
  )
}

/** The document with its contents beside it; on a phone the contents fold away above it. */
function Reading({ document, children }: { document: SpecDocument; children?: ReactNode }) {
  return (
    <div className="grid grid-cols-1 gap-5 lg:grid-cols-[minmax(0,1fr)_260px]">
      <details className="no-print border border-rule bg-card lg:hidden">
        <summary className="cursor-pointer px-4 py-2 font-semibold">Contents</summary>
        <Contents document={document} />
      </details>
      <DocumentView document={document} />
      <div className="no-print grid content-start gap-5 lg:sticky lg:top-4 lg:max-h-[calc(100vh-2rem)] lg:self-start lg:overflow-y-auto">
        {children}
        <Card title="Contents" className="hidden lg:block">
          <Contents document={document} />
        </Card>
      </div>
    </div>
  )
}

/** The specification as it would be issued now. */
export function SpecificationPage() {
  const { specificationId = '' } = useParams()
  return (
    <Asking query={useSpecification(specificationId)} says={sentenceOf}>
      {(specification) => <Draft specification={specification} />}
    </Asking>
  )
}

function Draft({ specification }: { specification: Specification }) {
  const [open, setOpen] = useState<'section' | 'issue' | null>(null)
  const mayWrite = useCan('specification:write')
  const close = () => setOpen(null)
  const { id, jobId, jobName, document, sectionNumber, title } = specification
  return (
    <Page
      title={`${sectionNumber} ${title}`}
      under={
        <>
          <Link to={paths.job(jobId)} className={linkClass}>
            {jobName}
          </Link>
          . {issueWords(document.header)}: it follows the facts until it is issued.
        </>
      }
      actions={
        <>
          {mayWrite && <Button onClick={() => setOpen('section')}>Title and number</Button>}
          <Exports address={(kind) => files.draft(id, kind)} />
          {mayWrite && (
            <Button look="primary" onClick={() => setOpen('issue')}>
              Issue
            </Button>
          )}
        </>
      }
    >
      <SupersededNotice titles={specification.restsOnSuperseded} />
      <Reading document={document}>
        <IssuesCard specification={specification} />
      </Reading>
      <Dialog title="Title and number" open={open === 'section'} onClose={close}>
        <SectionForm specification={specification} onDone={close} />
      </Dialog>
      <Dialog title="Issue this specification" open={open === 'issue'} onClose={close}>
        <IssueForm specification={specification} onDone={close} />
      </Dialog>
    </Page>
  )
}

/** One issue, as it was frozen. */
export function IssuePage() {
  const { specificationId = '', number = '' } = useParams()
  return (
    <Asking query={useIssue(specificationId, Number(number))} says={sentenceOf}>
      {(issue) => (
        <Page
          title={`${issue.document.header.sectionNumber} ${issue.document.header.sectionTitle}`}
          under={
            <>
              <Link to={paths.job(issue.jobId)} className={linkClass}>
                {issue.jobName}
              </Link>
              . Issue {issue.number}, {writtenDate(issue.document.header.date)}, by {issue.issuedByName}. It never changes.{' '}
              <Link to={paths.specification(specificationId)} className={linkClass}>
                The specification today
              </Link>
            </>
          }
          actions={<Exports address={(kind) => files.issue(specificationId, issue.number, kind)} />}
        >
          <SupersededNotice titles={issue.restsOnSuperseded} />
          <Reading document={issue.document} />
        </Page>
      )}
    </Asking>
  )
}
