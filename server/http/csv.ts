/** Characters that make a spreadsheet take a cell for a formula. Source: OWASP ASVS 5.0.0, 1.2.10. */
const formula = /^[=+\-@\t\r\0]/

function cell(value: string | number | null): string {
  if (value === null) return ''
  if (typeof value === 'number') return String(value)
  const harmless = formula.test(value) ? `'${value}` : value
  return /[",\r\n]/.test(harmless) ? `"${harmless.replaceAll('"', '""')}"` : harmless
}

/** Rows as CSV after RFC 4180: CRLF after each line, quotes doubled, a heading first. What a spreadsheet would run as a formula is made text. */
export function csvOf(heading: readonly string[], rows: readonly (readonly (string | number | null)[])[]): string {
  return [heading, ...rows].map((row) => `${row.map(cell).join(',')}\r\n`).join('')
}
