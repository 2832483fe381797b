import { type SpecHeader, issueWords } from './document.ts'

/** What stands under the title: whose floor, on what basis, when and by whom issued. */
export function titleRows(header: SpecHeader): [string, string][] {
  const { firm, project, client, site, buildUp, issue, date } = header
  return [
    ['Project', `${project}, J-${String(header.jobNumber).padStart(3, '0')}`],
    ['Client', client.replaceAll('\n', ', ') || 'not stated'],
    ['Site', site.replaceAll('\n', ', ') || 'not stated'],
    ['Installer', [firm.name, ...firm.address.split('\n'), firm.phone].map((words) => words.trim()).filter(Boolean).join(', ')],
    ['Build-up', `BU-${String(buildUp.number).padStart(3, '0')} ${buildUp.name}, version ${buildUp.version}, ${buildUp.status}`],
    ['Date', date],
    ['Issue', issue ? `${issueWords(header)}, by ${issue.by}` : issueWords(header)],
  ]
}
