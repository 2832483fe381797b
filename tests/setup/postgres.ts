import { type ChildProcess, spawn, spawnSync } from 'node:child_process'
import { chownSync, existsSync, mkdtempSync, readdirSync, rmSync } from 'node:fs'
import { createServer } from 'node:net'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import pg from 'pg'

// Runs tests on a PostgreSQL server of its own in a temporary folder: `node --import tsx tests/setup/postgres.ts [test file …]`.
const root = join(import.meta.dirname, '../..')
const packages = '/usr/lib/postgresql'

/** The programs of Debian's newest PostgreSQL from 14 on. */
function programs(): string | undefined {
  const versions = existsSync(packages)
    ? readdirSync(packages)
        .map(Number)
        .filter((version) => version >= 14)
    : []
  const folder = join(packages, String(Math.max(...versions)), 'bin')
  return existsSync(join(folder, 'postgres')) ? folder : undefined
}

/** PostgreSQL does not run as root: then it runs as the user that Debian made for it. */
function owner(): { uid: number; gid: number } | undefined {
  if (process.getuid?.() !== 0) return undefined
  const id = (flag: string) => Number(spawnSync('id', [flag, 'postgres'], { encoding: 'utf8' }).stdout)
  return { uid: id('-u'), gid: id('-g') }
}

async function freePort(): Promise<number> {
  const server = createServer()
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve))
  const address = server.address()
  await new Promise((resolve) => server.close(resolve))
  return typeof address === 'object' && address ? address.port : 54329
}

async function answering(url: string, server: ChildProcess): Promise<void> {
  for (let attempt = 0; attempt < 100 && server.exitCode === null; attempt++) {
    const client = new pg.Client({ connectionString: url })
    client.on('error', () => undefined)
    const isUp = await client.connect().then(
      () => true,
      () => false,
    )
    await client.end().catch(() => undefined)
    if (isUp) return
    await new Promise((resolve) => setTimeout(resolve, 100))
  }
  throw new Error('The PostgreSQL server did not start.')
}

async function stop(server: ChildProcess | undefined): Promise<void> {
  if (!server || server.exitCode !== null) return
  const ended = new Promise((resolve) => server.once('exit', resolve))
  server.kill('SIGINT')
  await ended
}

/** Gives the address of a fresh server to some work, and takes the server away afterwards. */
async function onFreshServer<T>(bin: string, work: (url: string) => T): Promise<T> {
  const folder = mkdtempSync(join(tmpdir(), 'wc-pg-'))
  const as = owner()
  if (as) chownSync(folder, as.uid, as.gid)
  const data = join(folder, 'data')
  let server: ChildProcess | undefined
  try {
    const made = spawnSync(join(bin, 'initdb'), ['-D', data, '-U', 'postgres', '-A', 'trust', '-E', 'UTF8', '--locale', 'C.UTF-8', '-N'], {
      ...as,
      cwd: folder,
      encoding: 'utf8',
    })
    if (made.status !== 0) throw new Error(`initdb failed: ${made.stderr}`)
    const port = await freePort()
    const settings = [
      `port=${port}`,
      'listen_addresses=127.0.0.1',
      `unix_socket_directories=${folder}`,
      'fsync=off',
      'max_connections=200',
    ].flatMap((setting) => ['-c', setting])
    server = spawn(join(bin, 'postgres'), ['-D', data, ...settings], { ...as, cwd: folder, stdio: 'ignore' })
    const url = `postgres://postgres@127.0.0.1:${port}/postgres`
    await answering(url, server)
    return work(url)
  } finally {
    await stop(server)
    rmSync(folder, { recursive: true, force: true })
  }
}

const bin = programs()
if (bin === undefined) {
  process.stdout.write(`Skipped: no PostgreSQL server (14 or later) is installed in ${packages}; apt-get install postgresql brings one.\n`)
} else {
  const files = process.argv.length > 2 ? process.argv.slice(2) : ['tests/api', 'server/db/backup.test.ts']
  const status = await onFreshServer(bin, (url) => {
    const run = spawnSync(process.execPath, [join(root, 'node_modules/vitest/vitest.mjs'), 'run', '--project', 'unit', ...files], {
      cwd: root,
      stdio: 'inherit',
      env: { ...process.env, TEST_DATABASE_URL: url },
    })
    return run.status ?? 1
  })
  process.exit(status)
}
