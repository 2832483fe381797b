/** 1980-01-01 00:00, the first date that a ZIP can tell (APPNOTE 4.4.6, DOS date and time). */
const firstDate = Buffer.from([0, 0, 0x21, 0])
const [centralHeader, endOfCentral] = [0x02014b50, 0x06054b50]

/**
 * A ZIP with all dates of its entries set alike, so that the same contents are the same bytes. Walks the central directory (APPNOTE 4.3.12)
 * and sets both headers of each entry.
 */
export function withoutZipDates(zip: Buffer): Buffer {
  const bytes = Buffer.from(zip)
  const end = bytes.lastIndexOf(Buffer.from([0x50, 0x4b, 0x05, 0x06]))
  if (end < 0 || bytes.readUInt32LE(end) !== endOfCentral) throw new RangeError('not a ZIP')
  let at = bytes.readUInt32LE(end + 16)
  for (let left = bytes.readUInt16LE(end + 10); left > 0; left -= 1) {
    if (bytes.readUInt32LE(at) !== centralHeader) throw new RangeError('not a ZIP')
    firstDate.copy(bytes, at + 12)
    firstDate.copy(bytes, bytes.readUInt32LE(at + 42) + 10)
    at += 46 + bytes.readUInt16LE(at + 28) + bytes.readUInt16LE(at + 30) + bytes.readUInt16LE(at + 32)
  }
  return bytes
}
