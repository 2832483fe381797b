import type { Suggestion } from '../../../shared/api/sheets.ts'
import type { ReadPage } from './page-reader.ts'

/** Lines of a page with the height of their largest word in points. */
function linesOf({ text, words }: Pick<ReadPage, 'text' | 'words'>): { text: string; height: number }[] {
  let at = 0
  return text.split('\n').map((line) => {
    const count = line === '' ? 0 : line.split(' ').length
    const own = words.slice(at, (at += count))
    return { text: line, height: Math.max(0, ...own.map(([, , top, , bottom]) => bottom - top)) }
  })
}

/** The sixteen headings of a safety sheet (GHS, annex 4; 29 CFR 1910.1200, appendix D) by a word that each has in every edition. */
const headings = [
  /identification/i,
  /hazards?(\(s\))? identification/i,
  /composition/i,
  /first[- ]aid/i,
  /fire[- ]?fighting/i,
  /accidental release/i,
  /handling and storage/i,
  /exposure controls?/i,
  /physical and chemical/i,
  /stability and reactivity/i,
  /toxicolog/i,
  /ecolog/i,
  /disposal/i,
  /transport/i,
  /regulat/i,
  /other information/i,
]
const enoughHeadings = 9
const safetyName = /\b(material )?safety data sheets?\b/i
const genericTitle =
  /safety data sheet|product data|technical (data|information)|product information|data ?sheet|information sheet|^page\b|regulation|^\W*\d/i

/** Kind, title and date as the text suggests them, simply; a person checks each. */
export function suggestDetails(pages: readonly Pick<ReadPage, 'text' | 'words'>[], fileName: string): Suggestion {
  const text = pages.map((page) => page.text).join('\n')
  const first = pages[0] ? linesOf(pages[0]) : []
  const kind = isSafety(first, text) ? 'safety' : 'data'
  return { kind, title: (titleOf(first, text, kind) ?? titleOfFile(fileName)).slice(0, 200), revisionDate: findRevisionDate(text) }
}

function isSafety(first: readonly { text: string }[], text: string): boolean {
  const onTop = first
    .slice(0, 8)
    .some((line) => safetyName.test(line.text) && line.text.length < 90 && !/\bsee\b|\bread\b|\bconsult\b/i.test(line.text))
  const numbered = text.split('\n').filter((line) => /^(section\s*)?\d{1,2}\s*[.:\-–]?\s+\S/i.test(line))
  return onTop || headings.filter((heading) => numbered.some((line) => heading.test(line))).length >= enoughHeadings
}

function titleOf(first: readonly { text: string; height: number }[], text: string, kind: Suggestion['kind']): string | undefined {
  if (kind === 'safety') {
    const named = /^(?:\d+(?:\.\d+)*\.?\s+)?(?:product (?:name|identifier)|trade name|name of product)\b\s*:?\s+(\S.{1,150})$/im.exec(text)
    if (named?.[1]) return named[1].trim()
  }
  const candidates = first
    .slice(0, 25)
    .filter((line) => (line.text.match(/\p{L}/gu)?.length ?? 0) >= 3 && line.text.length <= 120 && !genericTitle.test(line.text))
  const largest = Math.max(0, ...candidates.map((line) => line.height))
  return candidates.find((line) => line.height > largest - 0.5)?.text
}

function titleOfFile(fileName: string): string {
  return (
    fileName
      .replace(/\.pdf$/i, '')
      .replace(/[_\s]+/g, ' ')
      .trim() || 'Untitled sheet'
  )
}

const months = ['jan', 'feb', 'mar', 'apr', 'may', 'jun', 'jul', 'aug', 'sep', 'oct', 'nov', 'dec']
const monthName = '(jan|feb|mar|apr|may|jun|jul|aug|sep|oct|nov|dec)[a-z]*\\.?'
const saysRevised =
  /\b(revised|revision(?: date)?|date of (?:issue|revision)|issue date|issued?(?: of| on)?|version date|last updated?|prepared)\b[^0-9a-z]{0,3}(?:on |of |date:? )?/gi
const saysOlder = /\b(replaces?|supersedes?|superseding|previous|instead of)\b/i

/** The date a sheet gives itself, only when it is said plainly to be that and cannot be taken for another. */
export function findRevisionDate(text: string): string | null {
  const found = new Set<string>()
  for (const line of text.split('\n')) {
    const own = line.split(saysOlder)[0] ?? ''
    for (const match of own.matchAll(saysRevised)) {
      const date = dateAtStart(own.slice(match.index + match[0].length))
      if (date) found.add(date)
    }
  }
  const [only, another] = found
  return only !== undefined && another === undefined ? only : null
}

interface DateForm {
  pattern: RegExp
  /** Year, month and day among the pattern's groups; undefined where the digits could be read two ways. */
  read: (groups: string[]) => [year: number, month: number, day?: number] | undefined
}
const monthNumber = (name: string) => months.indexOf(name.slice(0, 3).toLowerCase()) + 1
const forms: DateForm[] = [
  {
    pattern: /^(\d{4})-(\d{2})(?:-(\d{2}))?(?![\d-])/,
    read: ([y, m, d]) => [Number(y), Number(m), d ? Number(d) : undefined] as [number, number, number?],
  },
  {
    pattern: new RegExp(`^${monthName}\\s+(\\d{1,2})(?:st|nd|rd|th)?,?\\s+(\\d{4})\\b`, 'i'),
    read: ([m = '', d, y]) => [Number(y), monthNumber(m), Number(d)],
  },
  {
    pattern: new RegExp(`^(\\d{1,2})(?:st|nd|rd|th)?\\.?\\s+${monthName},?\\s+(\\d{4})\\b`, 'i'),
    read: ([d, m = '', y]) => [Number(y), monthNumber(m), Number(d)],
  },
  { pattern: new RegExp(`^${monthName},?\\s+(\\d{4})\\b`, 'i'), read: ([m = '', y]) => [Number(y), monthNumber(m)] },
  { pattern: /^(\d{1,2})\.(\d{1,2})\.(\d{4})\b/, read: ([d, m, y]) => [Number(y), Number(m), Number(d)] },
  { pattern: /^(\d{1,2})\/(\d{1,2})\/(\d{4})\b/, read: ([a, b, y]) => slashed(Number(a), Number(b), Number(y)) },
  { pattern: /^(\d{1,2})\/(\d{4})\b/, read: ([m, y]) => [Number(y), Number(m)] },
]

/** 05/06/2024 is May in one country and June in another: read only where one number cannot be a month, or both are the same. */
function slashed(a: number, b: number, year: number): [number, number, number] | undefined {
  if (a > 12 || a === b) return [year, b, a]
  return b > 12 ? [year, a, b] : undefined
}

function dateAtStart(text: string): string | undefined {
  for (const { pattern, read } of forms) {
    const match = pattern.exec(text)
    if (!match) continue
    const parts = read(match.slice(1))
    if (!parts) return undefined
    const [year, month, day] = parts
    if (year < 1980 || year > 2100 || month < 1 || month > 12 || (day !== undefined && (day < 1 || day > 31))) return undefined
    return [year, ...[month, ...(day === undefined ? [] : [day])].map((part) => String(part).padStart(2, '0'))].join('-')
  }
  return undefined
}
