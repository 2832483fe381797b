import { createHash, randomUUID } from 'node:crypto'
import { createReadStream, createWriteStream } from 'node:fs'
import { mkdir, open, rename, rm, stat } from 'node:fs/promises'
import { join } from 'node:path'
import type { Readable } from 'node:stream'
import { pipeline } from 'node:stream/promises'

/** Files by the SHA-256 of their bytes, never altered. */
export interface FileStore {
  /** Folder for uploads that are not yet accepted; on the same disk as the store. */
  incoming: string
  /** Takes a file of `incoming` over; the same bytes are kept once. True when they were not here before. */
  adopt(path: string, sha256: string): Promise<boolean>
  /** Forgets a file whose adoption was not committed. */
  discard(sha256: string): Promise<void>
  /** Keeps bytes made here (exports) and tells their hash. */
  keep(bytes: Uint8Array): Promise<string>
  has(sha256: string): Promise<boolean>
  size(sha256: string): Promise<number>
  read(sha256: string, range?: { start: number; end: number }): Readable
  bytes(sha256: string): Promise<Uint8Array<ArrayBuffer>>
}

export function isSha256(text: string): boolean {
  return /^[0-9a-f]{64}$/.test(text)
}

/** Makes `DATA_DIR/incoming` and empties it: what a crash left behind was never accepted. */
export async function emptyIncoming(dataDir: string): Promise<string> {
  const incoming = join(dataDir, 'incoming')
  await rm(incoming, { recursive: true, force: true })
  await mkdir(incoming, { recursive: true, mode: 0o700 })
  return incoming
}

/** The store on disk: `DATA_DIR/files/ab/abcd…`. A file appears under its name only when whole and on the disk. */
export async function openDiskStore(dataDir: string): Promise<FileStore> {
  const root = join(dataDir, 'files')
  const incoming = await emptyIncoming(dataDir)
  await mkdir(root, { recursive: true, mode: 0o700 })
  const pathOf = (sha256: string) => {
    if (!isSha256(sha256)) throw new RangeError('not a SHA-256')
    return join(root, sha256.slice(0, 2), sha256)
  }
  const has = async (sha256: string) =>
    stat(pathOf(sha256)).then(
      () => true,
      () => false,
    )
  const adopt = async (path: string, sha256: string) => {
    const target = pathOf(sha256)
    if (await has(sha256)) {
      await rm(path, { force: true })
      return false
    }
    await mkdir(join(root, sha256.slice(0, 2)), { recursive: true, mode: 0o700 })
    await syncToDisk(path)
    await rename(path, target)
    await syncToDisk(join(root, sha256.slice(0, 2)))
    return true
  }
  return {
    incoming,
    adopt,
    has,
    discard: (sha256) => rm(pathOf(sha256), { force: true }),
    async keep(bytes) {
      const sha256 = createHash('sha256').update(bytes).digest('hex')
      const path = join(incoming, randomUUID())
      await pipeline([bytes], createWriteStream(path, { mode: 0o600 }))
      await adopt(path, sha256)
      return sha256
    },
    size: async (sha256) => (await stat(pathOf(sha256))).size,
    read: (sha256, range) => createReadStream(pathOf(sha256), range),
    async bytes(sha256) {
      const file = await open(pathOf(sha256))
      try {
        return new Uint8Array(await file.readFile())
      } finally {
        await file.close()
      }
    },
  }
}

async function syncToDisk(path: string): Promise<void> {
  const handle = await open(path, 'r')
  try {
    await handle.sync()
  } finally {
    await handle.close()
  }
}

/** SHA-256 of a file, read in a stream. */
export async function sha256OfFile(path: string): Promise<string> {
  const hash = createHash('sha256')
  await pipeline(createReadStream(path), hash)
  return hash.digest('hex')
}
