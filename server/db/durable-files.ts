import fs from 'node:fs'
import { syncBuiltinESMExports } from 'node:module'
import { dirname, join } from 'node:path'

/**
 * PGlite writes through this thread's `fs` and never syncs. This stands between: it knows every file that was written since it was last on
 * the disk, and keeps the order that PostgreSQL relies on:
 *  - the write-ahead log is on the disk before a commit is answered (`syncLog`), and before any data page that it describes is written;
 *  - all data pages are on the disk before `pg_control` says that a checkpoint is done.
 * It patches the thread it is called in, so it belongs into the database's own thread, before PGlite is loaded.
 */
export interface DurableFiles {
  /** Puts the write-ahead log on the disk when something was written to it since the last time. Returns whether it had to. */
  syncLog(): boolean
  /** Puts everything on the disk. */
  syncAll(): void
}

const descriptorFolder = '/proc/self/fd'

/** Watches the writes below `folder`. Call once in a thread. */
export function watchWrites(folder: string): DurableFiles {
  const root = fs.realpathSync(folder)
  const logFolder = join(root, 'pg_wal')
  const control = join(root, 'global/pg_control')
  const paths = new Map<number, string>()
  const dirtyLog = new Set<string>()
  const dirtyData = new Set<string>()
  const dirtyFolders = new Set<string>()
  const original = {
    openSync: fs.openSync,
    closeSync: fs.closeSync,
    writeSync: fs.writeSync,
    ftruncateSync: fs.ftruncateSync,
    truncateSync: fs.truncateSync,
    renameSync: fs.renameSync,
    unlinkSync: fs.unlinkSync,
    mkdirSync: fs.mkdirSync,
    rmdirSync: fs.rmdirSync,
    chmodSync: fs.chmodSync,
  }

  const isOurs = (path: string) => path.startsWith(`${root}/`)
  const isLog = (path: string) => path.startsWith(`${logFolder}/`)

  const syncPath = (path: string, dataOnly: boolean) => {
    let descriptor: number
    try {
      descriptor = original.openSync(path, 'r')
    } catch (error) {
      if ((error as NodeJS.ErrnoException).code === 'ENOENT') return
      throw error
    }
    try {
      if (dataOnly) fs.fdatasyncSync(descriptor)
      else fs.fsyncSync(descriptor)
    } finally {
      original.closeSync(descriptor)
    }
  }
  const syncSet = (set: Set<string>, dataOnly: boolean) => {
    for (const path of set) {
      syncPath(path, dataOnly)
      set.delete(path)
    }
  }
  const syncLog = () => {
    if (dirtyLog.size === 0) return false
    syncSet(dirtyLog, true)
    if (dirtyFolders.delete(logFolder)) syncPath(logFolder, false)
    return true
  }
  const syncData = () => {
    syncSet(dirtyData, false)
    for (const path of [...dirtyFolders].filter((path) => path !== logFolder)) {
      syncPath(path, false)
      dirtyFolders.delete(path)
    }
  }
  /** Before a file is written: what must be on the disk earlier goes there first. */
  const beforeWrite = (path: string) => {
    if (isLog(path)) {
      dirtyLog.add(path)
      return
    }
    syncLog()
    if (path === control) syncData()
    dirtyData.add(path)
  }
  const pathOf = (descriptor: number) => {
    let path = paths.get(descriptor)
    if (path === undefined) {
      path = fs.readlinkSync(`${descriptorFolder}/${descriptor}`)
      paths.set(descriptor, path)
    }
    return path
  }
  const entryChanged = (path: fs.PathLike) => {
    const name = String(path)
    if (!isOurs(name)) return
    if (!isLog(name)) syncLog()
    dirtyFolders.add(dirname(name))
  }

  fs.openSync = (path: fs.PathLike, flags?: fs.OpenMode, mode?: fs.Mode | null) => {
    const creates = typeof flags === 'number' ? (flags & fs.constants.O_CREAT) !== 0 : typeof flags === 'string' && /[wa]/.test(flags)
    const isNew = creates && isOurs(String(path)) && !fs.existsSync(path)
    const descriptor = original.openSync(path, flags ?? 'r', mode)
    paths.set(descriptor, String(path))
    if (isNew) dirtyFolders.add(dirname(String(path)))
    return descriptor
  }
  fs.closeSync = (descriptor: number) => {
    paths.delete(descriptor)
    original.closeSync(descriptor)
  }
  fs.writeSync = ((descriptor: number, ...rest: [never]) => {
    const path = pathOf(descriptor)
    if (isOurs(path)) beforeWrite(path)
    return original.writeSync(descriptor, ...rest)
  }) as typeof fs.writeSync
  fs.ftruncateSync = (descriptor: number, length?: number | null) => {
    const path = pathOf(descriptor)
    if (isOurs(path)) beforeWrite(path)
    original.ftruncateSync(descriptor, length ?? 0)
  }
  fs.truncateSync = (path: fs.PathLike, length?: number | null) => {
    if (isOurs(String(path))) beforeWrite(String(path))
    original.truncateSync(path, length ?? 0)
  }
  fs.renameSync = (from: fs.PathLike, to: fs.PathLike) => {
    if (dirtyLog.delete(String(from))) dirtyLog.add(String(to))
    if (dirtyData.delete(String(from))) {
      syncPath(String(from), false)
    }
    entryChanged(from)
    entryChanged(to)
    original.renameSync(from, to)
  }
  fs.unlinkSync = (path: fs.PathLike) => {
    entryChanged(path)
    original.unlinkSync(path)
  }
  fs.mkdirSync = ((path: fs.PathLike, options?: fs.MakeDirectoryOptions) => {
    entryChanged(path)
    return original.mkdirSync(path, options)
  }) as typeof fs.mkdirSync
  // PGlite opens its files to everyone; the folder above is closed to others, and so are they.
  fs.chmodSync = (path: fs.PathLike, mode: fs.Mode) => {
    original.chmodSync(path, isOurs(String(path)) && typeof mode === 'number' ? mode & 0o700 : mode)
  }
  fs.rmdirSync = (path: fs.PathLike) => {
    entryChanged(path)
    original.rmdirSync(path)
  }
  syncBuiltinESMExports()

  return {
    syncLog,
    syncAll() {
      syncLog()
      syncData()
      if (dirtyFolders.delete(logFolder)) syncPath(logFolder, false)
      syncPath(root, false)
    },
  }
}
