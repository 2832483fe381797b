import { createHash, randomBytes } from 'node:crypto'
import { existsSync, mkdirSync, mkdtempSync, readdirSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import S3rver from 's3rver'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { openS3Store } from './s3-store.ts'
import { type FileStore, openDiskStore, sha256OfFile } from './store.ts'

const folder = mkdtempSync(join(tmpdir(), 'wearcourse-store-'))
// The account that s3rver knows.
const place = { bucket: 'sheets', region: 'us-east-1', accessKeyId: 'S3RVER', secretAccessKey: 'S3RVER' }
let endpoint = ''
const server = new S3rver({
  port: 0,
  address: '127.0.0.1',
  silent: true,
  directory: join(folder, 'bucket'),
  configureBuckets: [{ name: 'sheets' }],
})
beforeAll(async () => {
  endpoint = `http://127.0.0.1:${(await server.run()).port}`
})
afterAll(async () => {
  await server.close()
  rmSync(folder, { recursive: true, force: true })
})

const stores: { name: string; open: (dataDir: string) => Promise<FileStore> }[] = [
  { name: 'on disk', open: openDiskStore },
  { name: 'in an S3 bucket', open: (dataDir) => openS3Store(dataDir, { ...place, endpoint }) },
]
const hashOf = (bytes: Uint8Array) => createHash('sha256').update(bytes).digest('hex')

describe.each(stores)('files $name', ({ open }) => {
  let files: FileStore
  let dataDir: string
  beforeAll(async () => {
    dataDir = mkdtempSync(join(folder, 'data-'))
    mkdirSync(join(dataDir, 'incoming'))
    writeFileSync(join(dataDir, 'incoming', 'left-by-a-crash'), 'x')
    files = await open(dataDir)
  })
  const incoming = (bytes: Uint8Array) => {
    const path = join(files.incoming, randomBytes(6).toString('hex'))
    writeFileSync(path, bytes)
    return path
  }

  it('begin with nothing incoming: what a crash left is gone', () => expect(readdirSync(files.incoming)).toEqual([]))

  it('are taken over by their hash, once, byte for byte', async () => {
    const bytes = randomBytes(3_000_000)
    const path = incoming(bytes)
    const sha256 = await sha256OfFile(path)
    expect(sha256).toBe(hashOf(bytes))
    expect(await files.has(sha256)).toBe(false)
    expect(await files.adopt(path, sha256)).toBe(true)
    expect(existsSync(path)).toBe(false)
    expect(await files.adopt(incoming(bytes), sha256)).toBe(false)
    expect(readdirSync(files.incoming)).toEqual([])
    expect(await files.size(sha256)).toBe(bytes.length)
    expect(hashOf(await files.bytes(sha256))).toBe(sha256)
  })

  it('are read whole or in part', async () => {
    const sha256 = await files.keep(Buffer.from('0123456789'))
    const read = async (range?: { start: number; end: number }) => Buffer.concat(await files.read(sha256, range).toArray()).toString()
    expect(await read()).toBe('0123456789')
    expect(await read({ start: 3, end: 5 })).toBe('345')
  })

  it('can be kept from bytes, twice as one, and discarded', async () => {
    const bytes = randomBytes(1000)
    const sha256 = await files.keep(bytes)
    expect(await files.keep(bytes)).toBe(sha256)
    await files.discard(sha256)
    expect(await files.has(sha256)).toBe(false)
    await expect(files.bytes(sha256)).rejects.toThrow()
  })

  it('have no other names than hashes', async () => {
    await expect(files.has('../../etc/passwd')).rejects.toThrow('not a SHA-256')
  })
})

it('a bucket that does not answer stops the start with its name', async () => {
  await expect(openS3Store(folder, { ...place, endpoint, bucket: 'elsewhere' })).rejects.toThrow(
    /^The bucket elsewhere at http:\/\/127\.0\.0\.1:\d+ cannot be used: NotFound\.$/,
  )
})
