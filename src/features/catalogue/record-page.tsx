import { useState } from 'react'
import { Link, useParams } from 'react-router'
import type { MixRecord, ProductRecord } from '../../../shared/api/catalogue.ts'
import { AppError } from '../../../shared/api/errors.ts'
import { sentenceOf } from '../../lib/api.ts'
import { paths } from '../../lib/paths.ts'
import { useCan } from '../../lib/user.ts'
import { Asking } from '../../ui/asking.tsx'
import { Button, buttonClass } from '../../ui/button.tsx'
import { Notice, Page } from '../../ui/page.tsx'
import { HazardsCard, TransportCard } from './hazards-card.tsx'
import { HistoryCard } from './history-card.tsx'
import { NotStatedCard } from './not-stated-card.tsx'
import { PartsCard } from './parts-card.tsx'
import { SheetsCard } from './sheets-card.tsx'
import { UsesCard } from './uses-card.tsx'
import { ValuesCard } from './values-card.tsx'
import { type RecordKind, useCatalogueChanges, useRecord } from './queries.ts'

export function ProductPage() {
  const { productId = '' } = useParams()
  return <RecordPage kind="product" id={productId} />
}

export function MixPage() {
  const { mixId = '' } = useParams()
  return <RecordPage kind="mix" id={mixId} />
}

function RecordPage({ kind, id }: { kind: RecordKind; id: string }) {
  const record = useRecord(kind, id)
  return (
    <Asking query={record} says={sentenceOf}>
      {(data) => <RecordView kind={kind} record={data} />}
    </Asking>
  )
}

/** All that is known of a product or a mix, with its page; and what is not stated. */
function RecordView({ kind, record }: { kind: RecordKind; record: ProductRecord | MixRecord }) {
  const mayWrite = useCan('catalogue:write')
  const base = kind === 'product' ? paths.product(record.id) : paths.mix(record.id)
  const under = [
    record.maker,
    'kind' in record ? record.kind : `mix of ${record.parts.length === 1 ? 'one part' : `${record.parts.length} parts`}`,
    record.chemistry,
  ].join(', ')
  return (
    <Page
      title={record.name}
      under={under}
      actions={
        mayWrite && (
          <>
            <Link to={`${base}/edit`} className={buttonClass()}>
              Edit
            </Link>
            <Withdraw kind={kind} record={record} />
            <Link to={`${base}/values/new`} className={buttonClass('primary')}>
              Add a value
            </Link>
          </>
        )
      }
    >
      {record.status === 'withdrawn' && (
        <Notice tone="caution">Withdrawn: not to be chosen for new floors. What was built with it stays as it is.</Notice>
      )}
      {record.note && <p className="mb-4 max-w-3xl whitespace-pre-line">{record.note}</p>}
      <div className="grid grid-cols-[minmax(0,1fr)] gap-5 lg:grid-cols-[minmax(0,3fr)_minmax(0,2fr)]">
        <div className="grid grid-cols-[minmax(0,1fr)] content-start gap-5">
          {'parts' in record && <PartsCard mix={record} />}
          <ValuesCard base={base} record={record} />
          <NotStatedCard base={base} kind={kind} record={record} />
        </div>
        <div className="grid grid-cols-[minmax(0,1fr)] content-start gap-5">
          <SheetsCard record={record} />
          <HazardsCard record={record} />
          <TransportCard record={record} />
          <UsesCard uses={record.usedIn} />
          <HistoryCard kind={kind} id={record.id} />
        </div>
      </div>
    </Page>
  )
}

function Withdraw({ kind, record }: { kind: RecordKind; record: ProductRecord | MixRecord }) {
  const { changeProduct, changeMix } = useCatalogueChanges()
  const [error, setError] = useState<string>()
  const [busy, setBusy] = useState(false)
  const status = record.status === 'active' ? 'withdrawn' : 'active'
  const onClick = async () => {
    setBusy(true)
    try {
      await (kind === 'product'
        ? changeProduct(record.id, { version: record.version, status })
        : changeMix(record.id, { version: record.version, status }))
      setError(undefined)
    } catch (thrown) {
      setError(thrown instanceof AppError ? thrown.message : sentenceOf(thrown))
    } finally {
      setBusy(false)
    }
  }
  return (
    <>
      {error && <span className="font-semibold text-stop">{error}</span>}
      <Button busy={busy} onClick={() => void onClick()}>
        {record.status === 'active' ? 'Withdraw' : 'Restore'}
      </Button>
    </>
  )
}
