import { spawnSync } from 'node:child_process'
import { mkdirSync, truncateSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'

/** A disk whose power can be cut: an ext4 file system on a loop-mounted image. */
export interface CutDisk {
  mountedAt: string
  /**
   * Takes what is on the image at this instant, without asking the kernel to write anything more: dirty pages that were never synced are not in
   * it, as at a power cut. Stop the writer first, so that the copy is of one instant.
   */
  cut(): void
  /** Mounts what was on the image; ext4 recovers from its journal. Returns where. */
  powerUp(): string
}

function run(command: string, ...args: string[]): string {
  const done = spawnSync(command, args, { encoding: 'utf8' })
  if (done.status !== 0) throw new Error(`${command} ${args.join(' ')}: ${done.stderr || String(done.error)}`)
  return done.stdout.trim()
}

/** Why this machine cannot cut a disk's power, or undefined. */
export function whyNoCutDisk(): string | undefined {
  if (process.getuid?.() !== 0) return 'it takes root to mount an image'
  for (const command of ['losetup', 'mkfs.ext4', 'mount']) {
    if (spawnSync('which', [command]).status !== 0) return `${command} is not installed`
  }
  return spawnSync('losetup', ['-f']).status === 0 ? undefined : 'there is no loop device'
}

/** Gives a disk to some work and takes it away afterwards, whatever happened. */
export async function onCutDisk(folder: string, work: (disk: CutDisk) => Promise<void>): Promise<void> {
  const [image, kept] = [join(folder, 'image'), join(folder, 'image-at-the-cut')]
  const [mountedAt, again] = [join(folder, 'mount'), join(folder, 'mount-again')]
  for (const path of [folder, mountedAt, again]) mkdirSync(path, { recursive: true })
  writeFileSync(image, '')
  truncateSync(image, 600 * 1024 * 1024)
  run('mkfs.ext4', '-q', image)
  // The journal is committed by syncs alone, not every five seconds by the kernel.
  run('mount', '-o', 'loop,commit=300', image, mountedAt)
  try {
    await work({
      mountedAt,
      cut: () => void run('cp', '--sparse=always', image, kept),
      powerUp() {
        run('mount', '-o', 'loop', kept, again)
        return again
      },
    })
  } finally {
    spawnSync('umount', ['-l', mountedAt])
    spawnSync('umount', ['-l', again])
  }
}
