import { inflateRawSync } from 'node:zlib'

/** Entries of a ZIP by name, as text. After APPNOTE 4.3: the central directory tells where each entry is. */
export function textsOfZip(zip: Buffer): Record<string, string> {
  const texts: Record<string, string> = {}
  const end = zip.lastIndexOf(Buffer.from('PK\x05\x06', 'latin1'))
  let at = zip.readUInt32LE(end + 16)
  for (let left = zip.readUInt16LE(end + 10); left > 0; left -= 1) {
    const [method, size, nameLength] = [zip.readUInt16LE(at + 10), zip.readUInt32LE(at + 20), zip.readUInt16LE(at + 28)]
    const name = zip.toString('utf8', at + 46, at + 46 + nameLength)
    const local = zip.readUInt32LE(at + 42)
    const start = local + 30 + zip.readUInt16LE(local + 26) + zip.readUInt16LE(local + 28)
    const packed = zip.subarray(start, start + size)
    texts[name] = (method === 8 ? inflateRawSync(packed) : packed).toString('utf8')
    at += 46 + nameLength + zip.readUInt16LE(at + 30) + zip.readUInt16LE(at + 32)
  }
  return texts
}
