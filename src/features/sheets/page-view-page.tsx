import { useQuery } from '@tanstack/react-query'
import { useCallback, useEffect, useState } from 'react'
import { Link, useParams, useSearchParams } from 'react-router'
import type { Revision, Sheet } from '../../../shared/api/sheets.ts'
import type { Box } from '../../../shared/domain/fact.ts'
import { writtenDate } from '../../../shared/domain/sheet-age.ts'
import { sentenceOf } from '../../lib/api.ts'
import { paths } from '../../lib/paths.ts'
import { Asking } from '../../ui/asking.tsx'
import { buttonClass } from '../../ui/button.tsx'
import { Notice, Page } from '../../ui/page.tsx'
import { FindPanel } from './find-panel.tsx'
import { MarkLayer } from './mark-layer.tsx'
import { MarkPanel } from './mark-panel.tsx'
import { boxOf } from './marking.ts'
import { NoText } from './no-text.tsx'
import { PageBoxes } from './page-boxes.tsx'
import { usePdf } from './pdf-document.ts'
import { PdfPage } from './pdf-page.tsx'
import { fileAddress, pageWordsOptions, useRevision } from './queries.ts'
import { useFind } from './use-find.ts'
import { useWidth } from './use-width.ts'
import { ViewToolbar } from './view-toolbar.tsx'

/** A page of a sheet as it came, at a place that a value is cited from or that is being marked for one. */
export function PageViewPage() {
  const { revisionId = '' } = useParams()
  const query = useRevision(revisionId)
  // Fetched side by side with what is said of it.
  const file = usePdf(revisionId)
  return (
    <Asking query={query} says={sentenceOf}>
      {({ sheet, revision }) => <PageView key={revision.id} sheet={sheet} revision={revision} file={file} />}
    </Asking>
  )
}

type File = ReturnType<typeof usePdf>

function PageView({ sheet, revision, file }: { sheet: Sheet; revision: Revision; file: File }) {
  const [newest] = sheet.revisions
  const date = revision.revisionDate === null ? 'no date confirmed' : writtenDate(revision.revisionDate)
  return (
    <Page
      title={sheet.title}
      under={`${sheet.kind === 'data' ? 'Data sheet' : 'Safety sheet'} · ${date} · ${revision.fileName}`}
      actions={
        <>
          <Link className={buttonClass()} to={paths.sheet(sheet.id)}>
            About this sheet
          </Link>
          <a className={buttonClass()} href={fileAddress(revision.id)} download={revision.fileName}>
            Download
          </a>
        </>
      }
    >
      {revision.superseded && newest && (
        <div className="mb-3">
          <Notice tone="caution">
            This revision is superseded.{' '}
            <Link className="text-resin underline" to={paths.sheetPage(newest.id)}>
              Open the one in force
            </Link>
          </Notice>
        </div>
      )}
      {revision.state === 'no-text' && (
        <p className="mb-3">
          <NoText />
        </p>
      )}
      <Pages revision={revision} file={file} />
    </Page>
  )
}

function Pages({ revision, file: { pdf, error } }: { revision: Revision; file: File }) {
  const { page, cited, marking, returnTo, goTo } = useViewAddress(revision.pages)
  const [zoom, setZoom] = useState(1)
  const [mark, setMark] = useState<{ page: number; box: Box }>()
  const { ref, width } = useWidth()
  const find = useFind(revision.id)
  const words = useQuery({ ...pageWordsOptions(revision.id, page), enabled: marking })
  const marked = mark?.page === page ? mark.box : undefined
  const hits = find.hits.flatMap((hit, index) =>
    hit.page === page ? [{ boxes: hit.boxes, current: index === find.current && !cited && !marked }] : [],
  )
  const setBox = useCallback((box: Box) => setMark({ page, box }), [page])
  const currentHit = find.hits[find.current]
  const markHit = () => {
    const [box] = currentHit?.boxes ?? []
    if (!currentHit || !box) return
    setMark({ page: currentHit.page, box })
    find.goTo(find.current)
  }
  return (
    <div className="grid items-start gap-4 lg:grid-cols-[minmax(0,1fr)_320px]">
      <div className="min-w-0 max-lg:order-2">
        <ViewToolbar page={page} pages={revision.pages} onPage={goTo} zoom={zoom} onZoom={setZoom} />
        <div
          ref={ref}
          className="mt-3 overflow-x-auto"
          // eslint-disable-next-line jsx-a11y/no-noninteractive-tabindex -- what scrolls must be reachable by keyboard
          tabIndex={0}
          role="region"
          data-wide={zoom > 1 || undefined}
          aria-label={`Page ${page} of ${revision.pages}`}
        >
          {error !== undefined && <Notice tone="stop">The PDF could not be fetched. Load the page again, or download the file.</Notice>}
          {pdf && width > 0 && (
            <PdfPage pdf={pdf} page={page} fitWidth={width} zoom={zoom}>
              {(scale) => (
                <>
                  <PageBoxes scale={scale} cited={cited} hits={hits} />
                  {marking && words.data && (
                    <MarkLayer scale={scale} size={words.data} words={words.data.words} box={marked} onBox={setBox} />
                  )}
                </>
              )}
            </PdfPage>
          )}
          {!pdf && error === undefined && (
            <p role="status" className="min-h-[70vh] p-4 text-pencil">
              Loading the PDF …
            </p>
          )}
        </div>
      </div>
      {/* One column on a phone: search, page, and the mark's panel at the foot of the screen. */}
      <div className="flex flex-col gap-4 max-lg:contents lg:sticky lg:top-3">
        {marking && (
          <div className="max-lg:sticky max-lg:bottom-0 max-lg:z-10 max-lg:order-3">
            <MarkPanel
              revisionId={revision.id}
              page={page}
              size={words.data}
              words={words.data?.words ?? []}
              box={marked}
              onBox={setBox}
              returnTo={returnTo}
            />
          </div>
        )}
        {revision.state === 'ready' && (
          <div className="max-lg:order-1">
            <FindPanel find={find} onMark={marking ? markHit : undefined} />
          </div>
        )}
      </div>
    </div>
  )
}

/** Page, cited box and marking mode in the address; arrow keys turn pages. */
function useViewAddress(pages: number) {
  const [search, setSearch] = useSearchParams()
  const page = Math.min(Math.max(1, Math.round(Number(search.get('page') ?? 1)) || 1), pages)
  const goTo = useCallback(
    (next: number) =>
      setSearch(
        (before) => {
          const after = new URLSearchParams(before)
          after.set('page', String(next))
          after.delete('box')
          after.delete('hit')
          return after
        },
        { replace: true, preventScrollReset: true },
      ),
    [setSearch],
  )
  useEffect(() => {
    const onKey = (event: KeyboardEvent) => {
      const by = event.key === 'ArrowRight' ? 1 : event.key === 'ArrowLeft' ? -1 : 0
      const elsewhere = (event.target as HTMLElement).closest(
        'input, textarea, select, [contenteditable], [role="application"], [data-wide]',
      )
      if (by === 0 || elsewhere || event.ctrlKey || event.metaKey || event.altKey || event.shiftKey) return
      if (page + by >= 1 && page + by <= pages) {
        event.preventDefault()
        goTo(page + by)
      }
    }
    window.addEventListener('keydown', onKey)
    return () => window.removeEventListener('keydown', onKey)
  }, [page, pages, goTo])
  return { page, goTo, cited: boxOf(search.get('box')), marking: search.get('mark') === '1', returnTo: search.get('return') ?? '' }
}
