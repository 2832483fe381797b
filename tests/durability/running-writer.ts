import { type ChildProcess, spawn } from 'node:child_process'
import { join } from 'node:path'
import { createInterface } from 'node:readline'
import { openDatabase } from '../../server/db/open.ts'

const root = join(import.meta.dirname, '../..')
export const writerCommand = ['--import', 'tsx', join(root, 'tests/durability/writer.ts')]

export interface RunningWriter {
  child: ChildProcess
  /** The last row that was acknowledged. */
  last: () => number
  /** Resolves when so many rows have been acknowledged since the start. */
  reached: (count: number) => Promise<void>
  ended: Promise<void>
}

/** Starts a process that commits rows to a data folder and hears what it acknowledges. */
export function startWriter(dataDir: string): RunningWriter {
  const child = spawn(process.execPath, [...writerCommand, dataDir], { cwd: root, stdio: ['ignore', 'pipe', 'pipe'] })
  let [last, count] = [0, 0]
  let complaint = ''
  const waiting: { count: number; resolve: () => void }[] = []
  child.stderr.on('data', (data: Buffer) => (complaint += data.toString()))
  createInterface({ input: child.stdout }).on('line', (line) => {
    last = Number(line.replace('ack ', ''))
    count += 1
    waiting.filter((one) => count >= one.count).forEach((one) => one.resolve())
  })
  const ended = new Promise<void>((resolve) => child.once('exit', () => resolve()))
  return {
    child,
    last: () => last,
    ended,
    reached: (wanted) =>
      new Promise((resolve, reject) => {
        waiting.push({ count: wanted, resolve })
        void ended.then(() => reject(new Error(`The writer ended early: ${complaint.slice(0, 500)}`)))
      }),
  }
}

/** Rows up to `last` that are not there when the folder is opened again. */
export async function missingRows(dataDir: string, last: number): Promise<number[]> {
  const database = await openDatabase({ dataDir })
  try {
    const { rows } = await database.pool.query<{ n: number }>(
      'select wanted as n from generate_series(1, $1::int) wanted left join acknowledged_rows on acknowledged_rows.n = wanted where acknowledged_rows.n is null',
      [last],
    )
    return rows.map(({ n }) => n)
  } finally {
    await database.close()
  }
}
