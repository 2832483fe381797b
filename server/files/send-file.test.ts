import { describe, expect, it } from 'vitest'
import { cleanFileName } from './file-name.ts'
import { attachment, rangeOf } from './send-file.ts'

// RFC 9110, 14.1.2: the examples for a representation of 10,000 bytes.
describe('the range of a file asked for', () => {
  it.each([
    ['bytes=0-499', { start: 0, end: 499 }],
    ['bytes=500-999', { start: 500, end: 999 }],
    ['bytes=-500', { start: 9500, end: 9999 }],
    ['bytes=9500-', { start: 9500, end: 9999 }],
    ['bytes=9900-20000', { start: 9900, end: 9999 }],
    ['bytes=-20000', { start: 0, end: 9999 }],
  ])('%s', (header, range) => expect(rangeOf(header, 10_000)).toEqual(range))

  it.each(['bytes=10000-', 'bytes=-0'])('%s lies beyond it', (header) => expect(rangeOf(header, 10_000)).toBe('beyond'))

  it.each([undefined, 'bytes=0-0,-1', 'bytes=5-2', 'lines=1-2', 'bytes=-', 'bytes=a-b'])('%s is answered with the whole file', (header) => {
    expect(rangeOf(header, 10_000)).toBeUndefined()
  })
})

// RFC 6266, 4.3 and appendix D; RFC 8187 for the encoding.
describe('the name a file is saved under', () => {
  it('is given plain and whole', () => {
    expect(attachment('Rückblatt €.pdf')).toBe(`attachment; filename="Ruckblatt _.pdf"; filename*=UTF-8''R%C3%BCckblatt%20%E2%82%AC.pdf`)
  })

  it('cannot break out of its quotes or start another header', () => {
    const header = attachment(cleanFileName('a"; filename=b\r\nSet-Cookie: x.pdf', '.pdf'))
    expect(header).not.toMatch(/[\r\n]/)
    expect(header.match(/"/g)).toHaveLength(2)
  })

  it.each([
    ['../../secret.pdf', 'secret.pdf'],
    ['C:\\sheets\\Body.PDF', 'Body.pdf'],
    ['sdp.\u202Efdp.exe', 'sdp.fdp.exe.pdf'],
    ['.pdf', 'sheet.pdf'],
    [`${'x'.repeat(400)}.pdf`, `${'x'.repeat(180)}.pdf`],
    ['a\u0000b\u0007.pdf', 'ab.pdf'],
  ])('%s becomes %s', (name, clean) => expect(cleanFileName(name, '.pdf')).toBe(clean))
})
