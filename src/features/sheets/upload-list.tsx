import { useEffect, useRef } from 'react'
import { Link } from 'react-router'
import type { Sheet, UploadedFile } from '../../../shared/api/sheets.ts'
import { paths } from '../../lib/paths.ts'
import { Button } from '../../ui/button.tsx'
import { DetailsForm } from './details-form.tsx'
import { NoText } from './no-text.tsx'
import { useForgetLists } from './queries.ts'
import { type Upload, uploadQueue } from './upload-queue.ts'

/** Uploads of this visit: how far each is, what came of it, and the details to check. */
export function UploadList({ uploads }: { uploads: Upload[] }) {
  const forget = useForgetLists()
  const done = uploads.filter(({ state }) => state.step === 'done').length
  const known = useRef(0)
  const section = useRef<HTMLElement>(null)
  useEffect(() => {
    if (done > known.current) void forget()
    known.current = done
  }, [done, forget])
  if (uploads.length === 0) return null
  const unchecked = uploads.filter(({ state }) => state.step === 'done' && state.result.outcome === 'added' && !state.saved)
  const saveAll = () => section.current?.querySelectorAll('form').forEach((form) => form.requestSubmit())
  const finished = uploads.filter(({ state }) => state.step === 'done' || state.step === 'failed')
  return (
    <section ref={section} aria-label="Uploads" className="border border-rule bg-card">
      <div className="flex flex-wrap items-center justify-between gap-2 border-b border-rule px-4 py-2">
        <p role="status">
          {finished.length} of {uploads.length} {uploads.length === 1 ? 'file' : 'files'} done
        </p>
        <span className="flex flex-wrap gap-2">
          {unchecked.length > 1 && <Button onClick={saveAll}>Save all {unchecked.length} as shown</Button>}
          {finished.length > 1 && (
            <Button onClick={() => finished.forEach((upload) => uploadQueue.remove(upload.id))}>Clear those done</Button>
          )}
        </span>
      </div>
      <ul>
        {uploads.map((upload) => (
          <li key={upload.id} className="border-b border-rule px-4 py-3 last:border-b-0">
            <UploadRow upload={upload} />
          </li>
        ))}
      </ul>
    </section>
  )
}

function UploadRow({ upload }: { upload: Upload }) {
  const { state, file } = upload
  const failed = state.step === 'failed'
  return (
    <>
      <div className="flex flex-wrap items-baseline justify-between gap-x-4 gap-y-1">
        <span className="font-semibold break-all">{file.name}</span>
        <span className="flex items-center gap-2">
          {state.step === 'waiting' && <span className="text-pencil">Waiting</span>}
          {state.step === 'sending' && <span className="text-pencil">Sending, {Math.round(state.sent * 100)} %</span>}
          {state.step === 'reading' && <span className="text-pencil">Reading the pages …</span>}
          {failed && state.canRetry && <Button onClick={() => uploadQueue.retry(upload.id)}>Send again</Button>}
          {(failed || state.step === 'done') && (
            <button
              type="button"
              className="min-h-8 min-w-8 text-pencil hover:text-ink"
              aria-label={`Take ${file.name} off this list`}
              onClick={() => uploadQueue.remove(upload.id)}
            >
              ✕
            </button>
          )}
        </span>
      </div>
      {(state.step === 'sending' || state.step === 'reading') && (
        <progress
          className="mt-1 h-1.5 w-full accent-resin"
          aria-label={`Progress of ${file.name}`}
          max={1}
          {...(state.step === 'sending' ? { value: state.sent } : {})}
        />
      )}
      {failed && (
        <p role="alert" className="mt-1 text-stop">
          <span aria-hidden="true">■</span> {state.message}
        </p>
      )}
      {state.step === 'done' && <Outcome {...state} onSaved={(sheet) => uploadQueue.checked(upload.id, state.result, sheet)} />}
    </>
  )
}

interface OutcomeProps<R extends UploadedFile = UploadedFile> {
  result: R
  saved?: Sheet
  onSaved: (sheet: Sheet) => void
}

function Outcome({ result, ...rest }: OutcomeProps) {
  if (result.outcome === 'refused') return <p className="mt-1 text-stop">{result.message}</p>
  if (result.outcome === 'added') return <Added result={result} {...rest} />
  return (
    <p className="mt-1">
      This file is already here:{' '}
      <Link className="text-resin underline" to={paths.sheet(result.sheetId)}>
        {result.title}
      </Link>
      . Nothing was added.
    </p>
  )
}

function Added({ result, saved, onSaved }: OutcomeProps<Extract<UploadedFile, { outcome: 'added' }>>) {
  const revision = result.sheet.revisions.find((one) => one.id === result.revisionId)
  if (saved) {
    return (
      <p className="mt-1">
        <span aria-hidden="true" className="text-met">
          ●
        </span>{' '}
        Saved as{' '}
        <Link className="text-resin underline" to={paths.sheet(saved.id)}>
          {saved.title}
        </Link>
        .
      </p>
    )
  }
  const open = (
    <Link className="text-resin underline-offset-4 hover:underline" to={paths.sheetPage(result.revisionId)}>
      Open the PDF
    </Link>
  )
  return (
    <>
      <p className="mt-1 mb-2 text-pencil">
        Kept, {revision?.pages} {revision?.pages === 1 ? 'page' : 'pages'}.{' '}
        {revision?.state === 'no-text' ? <NoText /> : 'Check what the text suggests.'}
      </p>
      <DetailsForm
        sheet={result.sheet}
        revisionIds={[result.revisionId]}
        suggestion={result.suggestion}
        alike={result.alike}
        onSaved={onSaved}
        beside={open}
      />
    </>
  )
}
