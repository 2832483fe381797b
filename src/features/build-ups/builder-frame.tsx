import { type ReactNode, useState } from 'react'
import { useNavigate } from 'react-router'
import { type BuildUp, buildUpEndpoints } from '../../../shared/api/build-ups.ts'
import type { Conditions } from '../../../shared/domain/build-up.ts'
import type { Evaluation } from '../../../shared/domain/evaluation.ts'
import { formatRange } from '../../../shared/domain/format.ts'
import { sentenceOf } from '../../lib/api.ts'
import { paths } from '../../lib/paths.ts'
import { useCan } from '../../lib/user.ts'
import { Button } from '../../ui/button.tsx'
import { Dialog } from '../../ui/dialog.tsx'
import { Notice, Page } from '../../ui/page.tsx'
import { useUnitSystem } from '../../ui/unit-system.tsx'
import { buildUpNumber } from './build-up-number.ts'
import { NameForm } from './name-form.tsx'
import { useBuildUpChanges } from './queries.ts'
import { ReleaseForm } from './release-form.tsx'

interface BuilderFrameProps {
  buildUp: BuildUp
  evaluation: Evaluation
  conditions: Conditions
  titles: Readonly<Record<string, string>>
  /** How the draft is kept. */
  marks?: ReactNode
  /** Actions of the page's own, before those of the frame. */
  actions?: ReactNode
  /** Saves what is not saved yet; false when that fails. */
  beforeLeaving: () => Promise<boolean>
  /** The edit counter as it is now. */
  version: () => number
  children: ReactNode
}

type Asking = 'rename' | 'copy' | 'release' | 'withdraw' | null

/** Head of a build-up: its name, number, version and conditions, and what may be done with it. */
export function BuilderFrame(props: BuilderFrameProps) {
  const { buildUp, conditions, marks, actions, beforeLeaving, children } = props
  const [asking, setAsking] = useState<Asking>(null)
  const [problem, setProblem] = useState<string>()
  const ask = async (what: Asking) => {
    setProblem(undefined)
    if (await beforeLeaving()) setAsking(what)
    else setProblem('The last changes are not saved yet. Save them first.')
  }
  return (
    <Page
      title={buildUp.name}
      under={
        <>
          <span className="flex flex-wrap items-baseline gap-x-2">
            <span>{buildUpNumber(buildUp.number)},</span>
            <VersionSwitch buildUp={buildUp} />
            <ConditionsLine conditions={conditions} />
            {marks}
          </span>
          {buildUp.note && <p className="mt-1">{buildUp.note}</p>}
        </>
      }
      actions={
        <>
          {actions}
          <VersionActions {...props} ask={(what) => void ask(what)} onProblem={setProblem} />
        </>
      }
    >
      {problem && <Notice tone="stop">{problem}</Notice>}
      {children}
      <Asked {...props} asking={asking} onClose={() => setAsking(null)} />
    </Page>
  )
}

function ConditionsLine({ conditions }: { conditions: Conditions }) {
  const { system } = useUnitSystem()
  const { value, unit } = conditions.slabTemperature
  return (
    <span>
      slab at {formatRange({ min: value, max: value, unit }, system)}, {conditions.relativeHumidity} % RH.
    </span>
  )
}

/** The version shown, and the way to the others. */
function VersionSwitch({ buildUp }: { buildUp: BuildUp }) {
  const navigate = useNavigate()
  return (
    <select
      aria-label="Version"
      className="border-b border-pencil bg-transparent py-0.5"
      value={buildUp.opened.number}
      onChange={(event) => void navigate(paths.buildUp(buildUp.id, Number(event.target.value)))}
    >
      {buildUp.versions.map(({ number, status }) => (
        <option key={number} value={number}>
          version {number}, {status}
        </option>
      ))}
    </select>
  )
}

interface VersionActionsProps extends BuilderFrameProps {
  ask: (what: Asking) => void
  onProblem: (says: string) => void
}

function VersionActions({ buildUp, beforeLeaving, ask, onProblem }: VersionActionsProps) {
  const mayDraft = useCan('build-up:draft')
  const mayRelease = useCan('build-up:release')
  const { addDraft } = useBuildUpChanges()
  const navigate = useNavigate()
  const { status, number } = buildUp.opened
  const draftAnew = async () => {
    if (!(await beforeLeaving())) return
    addDraft.mutate(
      { buildUpId: buildUp.id, from: number },
      { onSuccess: (made) => void navigate(paths.buildUp(made.id, made.opened.number)), onError: (error) => onProblem(sentenceOf(error)) },
    )
  }
  if (!mayDraft) return null
  return (
    <>
      <Button onClick={() => ask('rename')}>Rename</Button>
      <Button onClick={() => ask('copy')}>Copy</Button>
      {status !== 'draft' && (
        <Button look={status === 'released' ? 'primary' : 'plain'} busy={addDraft.isPending} onClick={() => void draftAnew()}>
          New draft from this
        </Button>
      )}
      {status !== 'withdrawn' && (mayRelease || status === 'draft') && <Button onClick={() => ask('withdraw')}>Withdraw</Button>}
      {status === 'draft' && mayRelease && (
        <Button look="primary" onClick={() => ask('release')}>
          Release
        </Button>
      )}
    </>
  )
}

/** The dialogs of the head. */
function Asked({ buildUp, evaluation, titles, version, asking, onClose }: BuilderFrameProps & { asking: Asking; onClose: () => void }) {
  const { rename, copy, release, withdraw } = useBuildUpChanges()
  const navigate = useNavigate()
  const { number } = buildUp.opened
  const place = { buildUpId: buildUp.id, number }
  return (
    <>
      <Dialog title="Rename" open={asking === 'rename'} onClose={onClose}>
        <NameForm
          schema={buildUpEndpoints.renameBuildUp.body}
          rest={{ version: buildUp.version }}
          name={buildUp.name}
          note={buildUp.note}
          verb="Rename"
          onDone={onClose}
          send={(body) => rename(buildUp.id, body)}
        />
      </Dialog>
      <Dialog title="Copy into a build-up of its own" open={asking === 'copy'} onClose={onClose}>
        <NameForm
          schema={buildUpEndpoints.copyBuildUp.body}
          rest={{ number }}
          name={`${buildUp.name}, copy`}
          verb="Copy"
          onDone={onClose}
          send={async (body) => {
            const made = await copy(buildUp.id, body)
            await navigate(paths.buildUp(made.id, 1))
          }}
        />
      </Dialog>
      <Dialog title={`Release version ${number}`} open={asking === 'release'} onClose={onClose} wide>
        <ReleaseForm
          findings={evaluation.findings}
          titles={titles}
          release={async (reasons) => {
            await release(place, { version: version(), reasons })
            onClose()
            await navigate(paths.buildUp(buildUp.id, number))
          }}
        />
      </Dialog>
      <Dialog title={`Withdraw version ${number}`} open={asking === 'withdraw'} onClose={onClose}>
        <p className="mb-3">A withdrawn version is kept and can still be read. No new job can be laid by it; a job that is keeps it.</p>
        {withdraw.error && <Notice tone="stop">{sentenceOf(withdraw.error)}</Notice>}
        <Button
          look="stop"
          busy={withdraw.isPending}
          onClick={() => withdraw.mutate({ ...place, version: version() }, { onSuccess: onClose })}
        >
          Withdraw version {number}
        </Button>
      </Dialog>
    </>
  )
}
