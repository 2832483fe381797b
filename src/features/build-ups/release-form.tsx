import { useState } from 'react'
import { reasonKey, releaseObstacles } from '../../../shared/domain/course.ts'
import type { Finding } from '../../../shared/domain/finding.ts'
import { problemsOf } from '../../lib/form.ts'
import { Button } from '../../ui/button.tsx'
import { AreaField } from '../../ui/field.tsx'
import { Notice } from '../../ui/page.tsx'
import { ProblemSummary } from '../../ui/problem-summary.tsx'
import { StatusMark } from '../../ui/status-mark.tsx'

interface ReleaseFormProps {
  findings: readonly Finding[]
  titles: Readonly<Record<string, string>>
  release: (reasons: Record<string, string>) => Promise<unknown>
}

/** Before a release: what stops it, and a reason for each caution and unknown. The server reckons again and decides. */
export function ReleaseForm({ findings, titles, release }: ReleaseFormProps) {
  const { stops } = releaseObstacles(findings)
  const wanted = releaseObstacles(findings).unreasoned.filter(
    (finding, index, all) => all.findIndex((one) => reasonKey(one) === reasonKey(finding)) === index,
  )
  const [reasons, setReasons] = useState<Record<string, string>>({})
  const [problems, setProblems] = useState<{ fields: Record<string, string>; summary: string | undefined }>({
    fields: {},
    summary: undefined,
  })
  const [busy, setBusy] = useState(false)
  const nameOf = (finding: Finding) => (finding.courseId ? (titles[finding.courseId] ?? '') : 'the whole floor')
  const submit = async (event: React.SubmitEvent) => {
    event.preventDefault()
    const { unreasoned } = releaseObstacles(findings, reasons)
    if (unreasoned.length > 0)
      return setProblems({
        fields: Object.fromEntries(
          unreasoned.map((finding) => [reasonKey(finding), `A reason is needed: ${finding.title}, ${nameOf(finding)}.`]),
        ),
        summary: undefined,
      })
    setBusy(true)
    try {
      await release(reasons)
    } catch (error) {
      setProblems(problemsOf(error))
    } finally {
      setBusy(false)
    }
  }
  if (stops.length > 0) {
    return (
      <>
        <p className="mb-3">This draft cannot be released while a check stops it.</p>
        <ul className="flex flex-col gap-2">
          {stops.map((finding) => (
            <li key={`${reasonKey(finding)} ${finding.says}`}>
              <StatusMark status="stop" /> <strong className="font-semibold">{finding.title}</strong>, {nameOf(finding)}. {finding.says}{' '}
              {finding.todo}
            </li>
          ))}
        </ul>
      </>
    )
  }
  return (
    <form onSubmit={(event) => void submit(event)} noValidate>
      <ProblemSummary problems={problems} />
      <p className="mb-3">
        A released version never changes. It keeps the facts of this moment, and jobs and specifications may be made from it.
        {wanted.length > 0 && ' Each caution and unknown needs a reason, which is kept with it and printed in the specification.'}
      </p>
      {groups(wanted).map(([checkId, group]) => (
        <fieldset key={checkId} className="mb-3 border-t border-rule pt-3">
          <legend className="sr-only">{group[0]?.title}</legend>
          {group.map((finding) => (
            <AreaField
              key={reasonKey(finding)}
              name={reasonKey(finding)}
              rows={2}
              className="mb-3"
              label={`${finding.title}, ${nameOf(finding)}`}
              error={problems.fields[reasonKey(finding)]}
              help={
                <>
                  <StatusMark status={finding.status} /> {finding.says}
                </>
              }
              value={reasons[reasonKey(finding)] ?? ''}
              onChange={(event) => setReasons((now) => ({ ...now, [reasonKey(finding)]: event.target.value }))}
            />
          ))}
          {group.length > 1 && (
            <Button
              onClick={() =>
                setReasons((now) => ({
                  ...now,
                  ...Object.fromEntries(group.map((finding) => [reasonKey(finding), now[reasonKey(group[0] as Finding)] ?? ''])),
                }))
              }
            >
              Give the first reason for all {group.length}
            </Button>
          )}
        </fieldset>
      ))}
      {wanted.length === 0 && (
        <Notice>
          <StatusMark status="met" /> Every check that could be made is met.
        </Notice>
      )}
      <Button type="submit" look="primary" busy={busy} className="mt-3">
        Release this version
      </Button>
    </form>
  )
}

/** Findings by their check, in order. */
function groups(findings: readonly Finding[]): [string, Finding[]][] {
  const byCheck = new Map<string, Finding[]>()
  for (const finding of findings) byCheck.set(finding.checkId, [...(byCheck.get(finding.checkId) ?? []), finding])
  return [...byCheck]
}
