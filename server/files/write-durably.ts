import { closeSync, fsyncSync, openSync, renameSync, writeSync } from 'node:fs'
import { dirname } from 'node:path'

/** Writes a small file so that after a power cut it is there whole or not at all; readable by the owner alone. */
export function writeDurably(path: string, text: string): void {
  const part = `${path}.part`
  const file = openSync(part, 'w', 0o600)
  writeSync(file, text)
  fsyncSync(file)
  closeSync(file)
  renameSync(part, path)
  const folder = openSync(dirname(path), 'r')
  fsyncSync(folder)
  closeSync(folder)
}
