import { spawnSync } from 'node:child_process'
import { existsSync, readFileSync } from 'node:fs'
import { mkdtemp, rm } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterAll, describe, expect, it } from 'vitest'
import { openDatabase } from '../../server/db/open.ts'
import { onCutDisk, whyNoCutDisk } from './cut-disk.ts'
import { missingRows, startWriter, writerCommand } from './running-writer.ts'

const folder = await mkdtemp(join(tmpdir(), 'wearcourse-durability-'))
afterAll(() => rm(folder, { recursive: true, force: true }))
const rounds = Number(process.env['DURABILITY_ROUNDS'] ?? 2)

describe('an acknowledged commit of the embedded database', () => {
  it.skipIf(!existsSync('/usr/bin/strace'))(
    'is preceded by an fdatasync of the write-ahead log, each one of them',
    () => {
      const trace = join(folder, 'trace')
      const dataDir = join(folder, 'traced')
      const run = spawnSync(
        '/usr/bin/strace',
        ['-f', '-y', '-s', '40', '-e', 'trace=fdatasync,write', '-o', trace, process.execPath, ...writerCommand, dataDir, '40'],
        { cwd: join(import.meta.dirname, '../..'), encoding: 'utf8' },
      )
      expect(run.status, run.stderr).toBe(0)
      const lines = readFileSync(trace, 'utf8').split('\n')
      const events = lines.flatMap((line) => (/"ack \d+/.test(line) ? ['ack'] : /fdatasync\(\d+<[^>]*pg_wal/.test(line) ? ['sync'] : []))
      const acknowledged = events.flatMap((event, index) => (event === 'ack' ? [index] : []))
      expect(acknowledged).toHaveLength(40)
      for (const [order, index] of acknowledged.entries()) {
        const since = events.slice((acknowledged[order - 1] ?? -1) + 1, index)
        expect(since, `before acknowledgement ${order + 1}`).toContain('sync')
      }
    },
    120_000,
  )

  it('is found again after kill -9', async () => {
    const dataDir = join(folder, 'killed')
    for (let round = 0; round < rounds; round++) {
      const writer = startWriter(dataDir)
      await writer.reached(60 + 40 * round)
      writer.child.kill('SIGKILL')
      await writer.ended
      expect(writer.last()).toBeGreaterThan(0)
      expect(await missingRows(dataDir, writer.last())).toEqual([])
    }
  }, 300_000)

  const why = whyNoCutDisk()
  if (why) process.stdout.write(`No power is cut in this run: ${why}\n`)
  it.skipIf(why !== undefined)(
    'is found again after the power of its disk is cut',
    async () => {
      for (let round = 0; round < rounds; round++) {
        await onCutDisk(join(folder, `disk-${round}`), async (disk) => {
          const writer = startWriter(join(disk.mountedAt, 'data'))
          await writer.reached(150 + 130 * round)
          writer.child.kill('SIGSTOP')
          const last = writer.last()
          disk.cut()
          writer.child.kill('SIGKILL')
          await writer.ended
          const found = disk.powerUp()
          expect(await missingRows(join(found, 'data'), last)).toEqual([])
        })
      }
    },
    300_000,
  )
})

describe('a data folder', () => {
  it('is refused while another process, or this one, has it open', async () => {
    const dataDir = join(folder, 'locked')
    const first = await openDatabase({ dataDir })
    await expect(openDatabase({ dataDir })).rejects.toThrow(/in use by another Wearcourse/)
    await first.close()
    const again = await openDatabase({ dataDir })
    await again.close()
  }, 120_000)

  it('that another version of PGlite wrote is refused with what to do', async () => {
    const dataDir = join(folder, 'locked')
    const { writeFileSync } = await import('node:fs')
    writeFileSync(join(dataDir, 'database.version.json'), JSON.stringify({ pglite: '0.0.1', format: 1 }))
    await expect(openDatabase({ dataDir })).rejects.toThrow(/written by PGlite 0\.0\.1.*npm run backup.*npm run restore/)
  })

  it('answers a query that takes too long with an error, and answers again after it', async () => {
    const database = await openDatabase({ dataDir: join(folder, 'slow'), queryTimeLimitMs: 500 })
    await expect(database.pool.query('select count(*) from generate_series(1, 20000000)')).rejects.toThrow(/timeout/i)
    await expect.poll(() => database.isAnswering(), { timeout: 60_000, interval: 500 }).toBe(true)
    await database.close()
  }, 120_000)
})
