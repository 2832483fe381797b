import { mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { deflateSync } from 'node:zlib'
import { afterAll, describe, expect, it } from 'vitest'
import { makePdf } from '../../../tests/setup/pdf.ts'
import { readPdf } from './read-pdf.ts'

const folder = mkdtempSync(join(tmpdir(), 'wearcourse-read-'))
afterAll(() => rmSync(folder, { recursive: true, force: true }))
const sample = join(import.meta.dirname, '../../../fixtures/sample-sheets/safety-1.pdf')
const keep = (name: string, bytes: Buffer) => {
  writeFileSync(join(folder, name), bytes)
  return join(folder, name)
}
const limits = { milliseconds: 20_000, heapMegabytes: 512, growthMegabytes: 640 }

/** 0.4 MB on the disk, 400 MB of spaces once unpacked. */
function bomb(): Buffer {
  const packed = deflateSync(Buffer.alloc(400 * 1024 * 1024, 0x20), { level: 9 }).toString('latin1')
  const stream = `<< /Length ${packed.length} /Filter /FlateDecode >>\nstream\n${packed}\nendstream`
  const page = '<< /Type /Page /Parent 2 0 R /MediaBox [0 0 612 792] /Contents 3 0 R >>'
  const plain = makePdf([], { objects: [stream, page] }).toString('latin1')
  return Buffer.from(plain.replace('/Count 0 /Kids []', '/Count 1 /Kids [4 0 R]'), 'latin1')
}

describe('reading a PDF in a thread of its own', () => {
  it('gives the pages, for several files side by side', async () => {
    const results = await Promise.all(Array.from({ length: 5 }, () => readPdf(sample)))
    for (const result of results) expect('pages' in result && result.pages.length).toBe(3)
  }, 30_000)

  it('ends what takes longer than allowed', async () => {
    expect(await readPdf(sample, { ...limits, milliseconds: 5 })).toEqual({ problem: 'too-large', detail: 'more than 0.005 s to read' })
  })

  it('ends what unpacks to more memory than allowed', async () => {
    expect(await readPdf(keep('bomb.pdf', bomb()), { ...limits, growthMegabytes: 200 })).toEqual({
      problem: 'too-large',
      detail: 'more memory to read than allowed',
    })
  }, 30_000)

  it('outlives a thread that runs out of memory or breaks, and reads the next file', async () => {
    expect(await readPdf(sample, { ...limits, heapMegabytes: 6 })).toMatchObject({ problem: 'too-large' })
    expect(await readPdf(join(folder, 'not-there.pdf'))).toMatchObject({ problem: 'damaged' })
    expect(await readPdf(sample)).toHaveProperty('pages')
  }, 30_000)
})
