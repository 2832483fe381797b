import { writtenDate } from '../sheet-age.ts'
import { type SpecHeader, issueWords } from './document.ts'

/** "released on 3 October 2026 by Ines Okafor"; a version that a newer one has replaced says so. */
function released({ status, releasedAt, releasedByName }: SpecHeader['buildUp']): string {
  const when = releasedAt ? ` on ${writtenDate(releasedAt.slice(0, 10))}` : ''
  return `released${when}${releasedByName ? ` by ${releasedByName}` : ''}${status === 'released' ? '' : `, ${status} since`}`
}

/** What stands under the title: whose floor, on what basis, when and by whom issued. */
export function titleRows(header: SpecHeader): [string, string][] {
  const { firm, project, client, site, buildUp, issue, date } = header
  return [
    ['Project', `${project}, J-${String(header.jobNumber).padStart(3, '0')}`],
    ['Client', client.replaceAll('\n', ', ') || 'not stated'],
    ['Site', site.replaceAll('\n', ', ') || 'not stated'],
    [
      'Installer',
      [firm.name, ...firm.address.split('\n'), firm.phone]
        .map((words) => words.trim())
        .filter(Boolean)
        .join(', '),
    ],
    ['Build-up', `BU-${String(buildUp.number).padStart(3, '0')} ${buildUp.name}, version ${buildUp.version}, ${released(buildUp)}`],
    ['Date', writtenDate(date)],
    ['Issue', issue ? `${issueWords(header)}, by ${issue.by}` : issueWords(header)],
  ]
}
