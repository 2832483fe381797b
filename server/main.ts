import { randomBytes } from 'node:crypto'
import { mkdir } from 'node:fs/promises'
import { createServer, type RequestListener, type Server } from 'node:http'
import { join } from 'node:path'
import { type OpenDatabase, openDatabase } from './db/open.ts'
import { demoAccounts } from './db/demo/people.ts'
import { readEnvironment } from './env.ts'
import { hasPeople, readFirm } from './features/people/queries.ts'
import { openDiskStore } from './files/store.ts'
import { pages } from './http/pages.ts'
import { outboxMailer, smtpMailer } from './mail/send.ts'
import { sessionSecretIn } from './secrets.ts'

const log = (line: string) => process.stderr.write(`${new Date().toISOString()} ${line}\n`)
const say = (line: string) => process.stdout.write(`${line}\n`)

const starting: RequestListener = (_request, response) => {
  response.writeHead(503, { 'Content-Type': 'application/json; charset=utf-8', 'Retry-After': '2' })
  response.end(JSON.stringify({ error: { code: 'unavailable', message: 'Wearcourse is starting. Try again in a moment.' } }))
}

/** Says in one sentence what a failure of the system means here. */
function inWords(error: unknown, env: { port: number; host: string; dataDir: string }): unknown {
  const { code, syscall } = error as NodeJS.ErrnoException
  if (code === 'EADDRINUSE') return new Error(`Port ${env.port} is in use by another program. Stop that one, or set another PORT.`)
  if (syscall === 'listen' || syscall === 'getaddrinfo')
    return new Error(`Port ${env.port} of ${env.host} cannot be opened (${code}). Set another PORT or HOST.`)
  if (syscall === 'connect') return new Error(`The database server of DATABASE_URL does not answer (${code}).`)
  if (syscall === 'mkdir') return new Error(`The data folder ${env.dataDir} cannot be made (${code}). Set another DATA_DIR.`)
  if (code === 'EACCES' || code === 'EPERM' || code === 'EROFS')
    return new Error(`The data folder ${env.dataDir} cannot be written (${code}). See to its owner, or set another DATA_DIR.`)
  return error
}

async function start(): Promise<void> {
  // Whatever is written from here on is for its owner alone.
  process.umask(0o077)
  const env = readEnvironment(process.env)
  const clock = () => Date.now()
  let listener = starting
  const server = createServer((request, response) => listener(request, response))
  const opened: { database?: OpenDatabase } = {}
  closeOnSignal(server, opened)
  try {
    await new Promise<void>((resolve, reject) => server.once('error', reject).listen(env.port, env.host, resolve))
    await mkdir(env.dataDir, { recursive: true, mode: 0o700 })
    say('Opening the database …')
    // What is lost is told by the log; a process that cannot answer any more ends, for whoever keeps it running to start it again.
    const onLost = () => setTimeout(() => process.exit(1), 1000)
    // The database opens in its own thread while this one reads the routes.
    const [database, { createApp }] = await Promise.all([
      openDatabase({ dataDir: env.dataDir, databaseUrl: env.databaseUrl, log, onLost }),
      import('./app.ts'),
    ])
    const files = env.s3 ? await (await import('./files/s3-store.ts')).openS3Store(env.dataDir, env.s3) : await openDiskStore(env.dataDir)
    const mail = env.smtp ? smtpMailer(env.smtp) : await outboxMailer(env.dataDir, clock)
    if (env.demo === 'auto' && !(await hasPeople(database.db))) {
      say('Filling the empty database with the demo …')
      const { fillDemo } = await import('./db/demo/fill.ts')
      await fillDemo({ db: database.db, files, now: clock() })
    }
    const firstLeadCode = (await hasPeople(database.db)) ? undefined : randomBytes(5).toString('hex')
    listener = createApp({
      db: database.db,
      pool: database.pool,
      isAnswering: () => database.isAnswering(),
      files,
      mail,
      clock,
      log,
      firstLeadCode,
      publicUrl: env.publicUrl,
      sessionSecret: env.sessionSecret ?? (await sessionSecretIn(env.dataDir)),
      demo: demoAccounts,
      pages: pages(join(import.meta.dirname, '../dist')),
    })
    opened.database = database
    say(`Wearcourse is open at ${env.publicUrl}`)
    if (firstLeadCode) say(`No one is here yet. Make the first technical lead there with the code ${firstLeadCode}`)
    else if ((await readFirm(database.db)).isDemo)
      say(`Demo accounts: ${demoAccounts.emails.join(', ')} – password ${demoAccounts.password}`)
  } catch (error) {
    throw inWords(error, env)
  }
}

/** Ctrl-C, a supervisor's stop, a terminal that goes: answers what was asked, closes the database, ends with 0. Before it is open, ends at once. */
function closeOnSignal(server: Server, opened: { database?: OpenDatabase }): void {
  let closing = false
  const close = async () => {
    if (closing) return
    closing = true
    if (opened.database) {
      say('Closing …')
      const answered = new Promise((resolve) => server.close(resolve))
      server.closeIdleConnections()
      setTimeout(() => server.closeAllConnections(), 3000).unref()
      await answered
      await opened.database.close()
    }
    process.exit(0)
  }
  const failed = (error: unknown) => {
    log(`closing ${error instanceof Error ? error.message : String(error)}`)
    process.exit(1)
  }
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP'] as const) process.on(signal, () => void close().catch(failed))
}

process.on('unhandledRejection', (error) => log(`unhandled ${error instanceof Error ? (error.stack ?? error.message) : String(error)}`))
start().catch((error: unknown) => {
  process.stderr.write(`Wearcourse could not start: ${error instanceof Error ? error.message : String(error)}\n`)
  process.exit(1)
})
