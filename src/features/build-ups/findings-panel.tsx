import { memo } from 'react'
import { Link } from 'react-router'
import { type Finding, type FindingStatus, findingStatuses } from '../../../shared/domain/finding.ts'
import type { Missing } from '../../../shared/domain/figure.ts'
import { paths } from '../../lib/paths.ts'
import { FigureView } from '../../ui/figure-view.tsx'
import { Fold } from '../../ui/fold.tsx'
import { StatusMark } from '../../ui/status-mark.tsx'

interface FindingsPanelProps {
  findings: readonly Finding[]
  /** Course id to its title. */
  titles: Readonly<Record<string, string>>
  lit: string | null
  onLight: (courseId: string | null) => void
  /** Why cautions and unknowns were accepted at release, by `checkId:courseId`. */
  reasons: Readonly<Record<string, string>>
}

/** What the checks say, the worst first; one check that says the same of several courses is one line; what is met is folded to its count. */
export const FindingsPanel = memo(function FindingsPanel({ findings, ...rest }: FindingsPanelProps) {
  const by = (status: FindingStatus) => findings.filter((finding) => finding.status === status)
  const met = by('met')
  const open = findingStatuses.filter((status) => status !== 'met').flatMap((status) => groupsOf(by(status)))
  return (
    <section aria-label="Checks">
      <h2 className="mb-2 text-small font-semibold text-pencil">Checks against the sheets loaded</h2>
      {findings.length === 0 && <p className="text-pencil">Nothing to check yet. Add a course and choose its mix.</p>}
      <ul>
        {open.map((group) => (
          <FindingGroup key={`${group[0]?.status} ${group[0]?.checkId}`} group={group} {...rest} />
        ))}
      </ul>
      {met.length > 0 && (
        <Fold
          className="mt-2"
          summary={
            <>
              <StatusMark status="met" /> {met.length} <span className="text-pencil">▾</span>
            </>
          }
        >
          <ul className="mt-2">
            {groupsOf(met).map((group) => (
              <FindingGroup key={group[0]?.checkId} group={group} {...rest} />
            ))}
          </ul>
        </Fold>
      )}
      <p className="mt-3 text-small text-pencil">
        Met means met against the sheets loaded here. The sheet, the label, the law and the competent person decide.
      </p>
    </section>
  )
})

/** Findings of one status by their check, in order. */
function groupsOf(findings: readonly Finding[]): Finding[][] {
  const groups = new Map<string, Finding[]>()
  for (const finding of findings) groups.set(finding.checkId, [...(groups.get(finding.checkId) ?? []), finding])
  return [...groups.values()]
}

type GroupProps = { group: readonly Finding[] } & Omit<FindingsPanelProps, 'findings'>

function FindingGroup({ group, ...rest }: GroupProps) {
  const [first] = group
  if (!first) return null
  if (group.length <= 2 && first.status !== 'met')
    return group.map((finding, index) => <FindingItem key={`${finding.courseId} ${index}`} finding={finding} {...rest} />)
  if (group.length === 1) return <FindingItem finding={first} {...rest} />
  return (
    <li className="-mx-2 mb-1 px-2 py-1">
      <Fold
        summaryClass="grid grid-cols-[20px_1fr]"
        summary={
          <>
            <StatusMark status={first.status} wordless />
            <span>
              <strong className="font-semibold">{first.title}</strong>
              <span className="block text-pencil">{group.length} courses ▾</span>
            </span>
          </>
        }
      >
        <ul className="mt-1 ml-5">
          {group.map((finding, index) => (
            <FindingItem key={`${finding.courseId} ${index}`} finding={finding} {...rest} />
          ))}
        </ul>
      </Fold>
    </li>
  )
}

function FindingItem({ finding, titles, lit, onLight, reasons }: { finding: Finding } & Omit<FindingsPanelProps, 'findings'>) {
  const { courseId } = finding
  const reason = reasons[`${finding.checkId}:${courseId ?? 'floor'}`]
  return (
    <li
      className={`-mx-2 mb-1 px-2 py-1 ${courseId !== null && courseId === lit ? 'bg-resin-wash' : ''}`}
      onPointerEnter={() => onLight(courseId)}
      onPointerLeave={() => onLight(null)}
      onFocus={() => onLight(courseId)}
      onBlur={() => onLight(null)}
    >
      <Fold
        summaryClass="grid grid-cols-[20px_1fr]"
        summary={
          <>
            <StatusMark status={finding.status} wordless />
            <span>
              <strong className="font-semibold">
                {courseId === null ? finding.title : `${titles[courseId] ?? ''}: ${lowered(finding.title)}`}
              </strong>
              <span className="block">{finding.says}</span>
            </span>
          </>
        }
      >
        <div className="mt-1 ml-5 border-l border-rule pl-3 text-small">
          {finding.todo && <p className="mb-1">{finding.todo}</p>}
          <FindingWorking finding={finding} />
        </div>
      </Fold>
      {reason && <p className="ml-5 text-small text-pencil">Accepted at release: {reason}</p>}
    </li>
  )
}

function FindingWorking({ finding }: { finding: Finding }) {
  return (
    <>
      <dl>
        {finding.figures.map(({ label, figure }) => (
          <div key={label} className="flex justify-between gap-3 border-b border-rule py-0.5">
            <dt className="text-pencil">{label}</dt>
            <dd className="text-right">
              <FigureView figure={figure} />
            </dd>
          </div>
        ))}
      </dl>
      {finding.missing.map((missing) => (
        <MissingLine key={`${missing.of} ${missing.property} ${missing.part}`} missing={missing} />
      ))}
      <p className="mt-1 text-pencil">{finding.source}</p>
    </>
  )
}

/** What is not stated, who could state it, and the record to put it in. */
function MissingLine({ missing }: { missing: Missing }) {
  const { subject } = missing
  const to = subject && (subject.kind === 'mix' ? paths.mix(subject.id) : subject.kind === 'product' ? paths.product(subject.id) : null)
  return (
    <p className="mt-1">
      {missing.because ? `${missing.because}. ` : ''}
      {missing.ask}{' '}
      {to && (
        <Link to={to} className="text-resin underline">
          Open {missing.of}
        </Link>
      )}
    </p>
  )
}

const lowered = (text: string) => (/^[A-Z][a-z]/.test(text) ? text.charAt(0).toLowerCase() + text.slice(1) : text)
