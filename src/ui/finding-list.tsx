import { type Finding, findingStatuses } from '../../shared/domain/finding.ts'
import { FigureView } from './figure-view.tsx'
import { StatusMark } from './status-mark.tsx'

interface FindingListProps {
  findings: readonly Finding[]
  /** Course id to its title. */
  titles: Readonly<Record<string, string>>
}

/** What the checks say in short: the open ones with what to do, the met ones as a count. */
export function FindingList({ findings, titles }: FindingListProps) {
  const open = findingStatuses
    .filter((status) => status !== 'met')
    .flatMap((status) => findings.filter((finding) => finding.status === status))
  const met = findings.length - open.length
  return (
    <ul className="grid gap-2">
      {open.map((finding, index) => (
        <li key={`${finding.checkId} ${finding.courseId ?? ''} ${index}`} className="grid grid-cols-[20px_minmax(0,1fr)]">
          <StatusMark status={finding.status} wordless />
          <div>
            <strong className="font-semibold">
              {[finding.courseId && titles[finding.courseId], finding.title].filter(Boolean).join(': ')}
            </strong>
            <p>{finding.says}</p>
            {finding.todo && <p className="text-pencil">{finding.todo}</p>}
            {finding.figures.length > 0 && (
              <p className="text-small text-pencil">
                {finding.figures.map(({ label, figure }) => (
                  <span key={label} className="mr-3 inline-block">
                    {label} <FigureView figure={figure} />
                  </span>
                ))}
              </p>
            )}
          </div>
        </li>
      ))}
      <li className="grid grid-cols-[20px_minmax(0,1fr)]">
        <StatusMark status="met" wordless />
        <span>{met} met against the sheets loaded.</span>
      </li>
    </ul>
  )
}
