import { createHash } from 'node:crypto'
import { createReadStream, existsSync } from 'node:fs'
import { type FileHandle, open, rename, rm } from 'node:fs/promises'
import { dirname } from 'node:path'
import { Readable, type Transform, Writable } from 'node:stream'
import { pipeline } from 'node:stream/promises'
import { createGunzip, createGzip } from 'node:zlib'
import { extract, pack } from 'tar-stream'
import * as z from 'zod'

/** The last entry of a backup: what came before it, so that a cut or changed file is noticed. */
const sumsName = 'sums.json'
const sumsSchema = z.record(z.string(), z.string())

export interface BackupWriter {
  add(name: string, bytes: Uint8Array): Promise<void>
  addStream(name: string, size: number, content: Readable): Promise<void>
}

/** Writes a backup: a gzipped tar of what `work` adds. It appears under its name only when whole and on the disk. */
export async function writeBackupFile(path: string, work: (writer: BackupWriter) => Promise<void>): Promise<void> {
  if (existsSync(path)) throw new Error(`${path} is there already; give the backup another name.`)
  const part = `${path}.part`
  const handle = await open(part, 'w', 0o600).catch((error: unknown) => {
    throw new Error(`${path} cannot be written (${(error as NodeJS.ErrnoException).code ?? String(error)}).`)
  })
  try {
    const tar = pack()
    await Promise.all([pipeline(tar, createGzip(), intoHandle(handle)), fill(tar, work)])
    await handle.sync()
    await handle.close()
    await rename(part, path)
    await syncFolder(dirname(path))
  } catch (error) {
    await handle.close().catch(() => undefined)
    await rm(part, { force: true })
    throw error
  }
}

function intoHandle(handle: FileHandle): Writable {
  return new Writable({
    write(chunk: Buffer, _encoding, done) {
      handle.writeFile(chunk).then(() => done(), done)
    },
  })
}

async function syncFolder(path: string): Promise<void> {
  const folder = await open(path, 'r')
  await folder.sync()
  await folder.close()
}

async function fill(tar: ReturnType<typeof pack>, work: (writer: BackupWriter) => Promise<void>): Promise<void> {
  const sums: Record<string, string> = {}
  const header = (name: string, size: number): { name: string; size: number; mode: number; mtime: Date } => ({
    name,
    size,
    mode: 0o600,
    mtime: new Date(0),
  })
  const add = async (name: string, bytes: Uint8Array) => {
    sums[name] = createHash('sha256').update(bytes).digest('hex')
    await pipeline(Readable.from([bytes]), tar.entry(header(name, bytes.length)))
  }
  try {
    await work({
      add,
      async addStream(name, size, content) {
        const hash = createHash('sha256')
        const hashed = async function* (source: AsyncIterable<Buffer>) {
          for await (const chunk of source) {
            hash.update(chunk)
            yield chunk
          }
        }
        await pipeline(content, hashed, tar.entry(header(name, size)))
        sums[name] = hash.digest('hex')
      },
    })
    await add(sumsName, Buffer.from(JSON.stringify(sums)))
    tar.finalize()
  } catch (error) {
    tar.destroy(error as Error)
    throw error
  }
}

export interface BackupEntry {
  name: string
  content: Readable
}

/** Goes through the entries of a backup in order; each must be read to its end. */
export async function readBackupFile(path: string, visit: (entry: BackupEntry) => Promise<void>): Promise<void> {
  const entries = extract()
  const unpacked = pipeline(createReadStream(path), createGunzip() as Transform, entries)
  const visited = (async () => {
    for await (const entry of entries) await visit({ name: entry.header.name, content: Readable.from(entry) })
  })()
  await Promise.all([unpacked, visited])
}

/** @throws Error in one sentence unless the file is a whole, unchanged backup. */
export async function checkBackupFile(path: string): Promise<void> {
  if (!existsSync(path)) throw new Error(`There is no file ${path}.`)
  const found: Record<string, string> = {}
  let sums: z.infer<typeof sumsSchema> | undefined
  try {
    await readBackupFile(path, async ({ name, content }) => {
      if (name === sumsName) {
        sums = sumsSchema.parse(JSON.parse((await bytesOf(content)).toString()))
        return
      }
      const hash = createHash('sha256')
      for await (const chunk of content) hash.update(chunk as Buffer)
      found[name] = hash.digest('hex')
    })
  } catch {
    sums = undefined
  }
  const names = Object.keys(found)
  const isWhole = sums !== undefined && names.length === Object.keys(sums).length && names.every((name) => sums?.[name] === found[name])
  if (!isWhole) throw new Error(`${path} is damaged, cut short, or not a backup of Wearcourse; nothing was restored.`)
}

export async function bytesOf(content: Readable): Promise<Buffer> {
  const chunks: Buffer[] = []
  for await (const chunk of content) chunks.push(chunk as Buffer)
  return Buffer.concat(chunks)
}
