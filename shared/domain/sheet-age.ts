/** Years from a sheet's date (ISO, as far as stated) to a day. A date without month or day counts from its beginning, so that age is never made less than it is. */
export function ageInYears(revisionDate: string, today: string): number {
  const [year = 0, month = 1, day = 1] = revisionDate.split('-').map(Number)
  const [nowYear = 0, nowMonth = 1, nowDay = 1] = today.slice(0, 10).split('-').map(Number)
  return nowYear - year + (nowMonth - month) / 12 + (nowDay - day) / 365.25
}

interface Dated {
  revisionDate: string | null
  /** ISO instant. */
  uploadedAt: string
}

/** Revisions oldest first: by their own dates; one without a date counts from the day it was uploaded. The last is in force. */
export function inOrder<T extends Dated>(revisions: readonly T[]): T[] {
  const dayOf = (revision: T) => revision.revisionDate ?? revision.uploadedAt.slice(0, 10)
  const compare = (a: string, b: string) => (a < b ? -1 : a > b ? 1 : 0)
  return [...revisions].sort((a, b) => compare(dayOf(a), dayOf(b)) || compare(a.uploadedAt, b.uploadedAt))
}

/** The day so many years before another, for comparison with a sheet's date: what is older has passed the limit. */
export function dayYearsBefore(today: string, years: number): string {
  const [year = 0, month = 1, day = 1] = today.slice(0, 10).split('-').map(Number)
  const months = year * 12 + month - 1 - Math.round(years * 12)
  const two = (number: number) => String(number).padStart(2, '0')
  return `${String(Math.floor(months / 12)).padStart(4, '0')}-${two((months % 12) + 1)}-${two(day)}`
}

const monthNames = [
  'January',
  'February',
  'March',
  'April',
  'May',
  'June',
  'July',
  'August',
  'September',
  'October',
  'November',
  'December',
]

/** `2024-05-06` as "6 May 2024", `2024-05` as "May 2024"; "not stated" without a date. */
export function writtenDate(revisionDate: string | null): string {
  if (revisionDate === null) return 'not stated'
  const [year = '', month, day] = revisionDate.split('-')
  return [day && String(Number(day)), month && monthNames[Number(month) - 1], year].filter(Boolean).join(' ')
}
