import { describe, expect, it } from 'vitest'
import { csvOf } from './csv.ts'

describe('CSV', () => {
  it('is written as RFC 4180, 2, says: CRLF after each record, quotes doubled, line breaks and commas inside quotes', () => {
    expect(
      csvOf(
        ['a', 'b', 'c'],
        [
          ['aaa', 'b\r\nbb', 'c"c,c'],
          ['', null, 12.5],
        ],
      ),
    ).toBe('a,b,c\r\naaa,"b\r\nbb","c""c,c"\r\n,,12.5\r\n')
  })

  it('makes text of what a spreadsheet would run as a formula (OWASP ASVS 5.0.0, 1.2.10)', () => {
    const bad = ['=1+1', '+1', '-1', '@SUM(A1)', '\tx', '\rx', '\0x']
    for (const text of bad)
      expect(
        csvOf(['x'], [[text]])
          .split('\r\n')
          .slice(1)
          .join('\r\n'),
      ).toMatch(/^"?'/)
    expect(csvOf(['x'], [['=HYPERLINK("http://x.example","y")']])).toBe('x\r\n"\'=HYPERLINK(""http://x.example"",""y"")"\r\n')
    expect(csvOf(['x'], [[-1]])).toBe('x\r\n-1\r\n')
  })
})
