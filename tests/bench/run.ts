import { spawn } from 'node:child_process'
import { mkdtemp, rm } from 'node:fs/promises'
import { cpus, tmpdir } from 'node:os'
import { join } from 'node:path'
import { sql } from 'drizzle-orm'
import { createApp } from '../../server/app.ts'
import { fillDemo } from '../../server/db/demo/fill.ts'
import { openDatabase } from '../../server/db/open.ts'
import { openDiskStore } from '../../server/files/store.ts'
import { outboxMailer } from '../../server/mail/send.ts'
import { evaluate } from '../../shared/domain/evaluate.ts'
import type { EvaluationInput } from '../../shared/domain/build-up.ts'
import { exampleFloor } from '../setup/example-floor.ts'
import { exporting, reading } from './documents.ts'
import { beside, round, time } from './measure.ts'
import { pageWeights } from './pages.ts'

const note = (line: string) => process.stderr.write(`${line}\n`)
const root = join(import.meta.dirname, '../..')
const folder = await mkdtemp(join(tmpdir(), 'wearcourse-bench-'))
const now = Date.now()

note('A database with the demo and 10,000 products …')
const database = await openDatabase({ dataDir: join(folder, 'data') })
const files = await openDiskStore(join(folder, 'data'))
await fillDemo({ db: database.db, files, now })
await database.db.execute(sql`
  insert into products (name, maker, kind, chemistry, search_text)
  select 'Invented ' || n || ' compound', 'Ostrel', 'resin', 'epoxy', 'invented ' || n || ' compound ostrel resin epoxy' from generate_series(1, 10000) n`)
await database.db.execute(sql`analyze products`)
const app = createApp({
  db: database.db,
  pool: database.pool,
  isAnswering: () => database.isAnswering(),
  files,
  mail: await outboxMailer(folder, () => now),
  clock: () => Date.now(),
  publicUrl: 'http://localhost',
  sessionSecret: 'a secret for the bench, long enough to be one',
  log: note,
  requestsPerMinute: 1_000_000,
})
const server = app.listen(0, '127.0.0.1')
await new Promise((resolve) => server.once('listening', resolve))
const address = server.address()
const base = `http://127.0.0.1:${typeof address === 'object' && address ? address.port : 0}`
const signedIn = await fetch(`${base}/api/session`, {
  method: 'POST',
  headers: { 'Content-Type': 'application/json' },
  body: JSON.stringify({ email: 'lead@brackenholt.example', password: 'quillwater-demo' }),
})
const cookie = signedIn.headers.getSetCookie()[0]?.split(';')[0] ?? ''
const get = async (path: string): Promise<unknown> => (await fetch(`${base}${path}`, { headers: { cookie } })).json()

note('Lists and search …')
const bareList = () =>
  database.pool.query('select id, name, maker, kind, chemistry, status, updated_at from products order by name, id limit 50')
const bareSearch = () =>
  database.pool.query(
    "select id, name from products where 'compuond 4711' <% search_text order by word_similarity('compuond 4711', search_text) desc limit 50",
  )
const list = beside(await time(40, () => get('/api/products?sort=name')), await time(40, bareList))
const search = beside(await time(20, () => get('/api/products?q=compuond%204711')), await time(20, bareSearch))

note('Working a floor out …')
const buildUps = (await get('/api/build-ups?sort=number')) as { items: { id: string }[] }
const slurry = ((await get(`/api/build-ups/${buildUps.items[0]?.id ?? ''}`)) as { opened: { input: EvaluationInput } }).opened.input
const { input } = exampleFloor()
const [prep, prime, top] = input.courses
const fourteen = {
  ...input,
  courses: Array.from({ length: 14 }, (_, index) => ({
    ...((index === 0 ? prep : index === 1 ? prime : top) ?? input.courses[0]),
    id: `c${index}`,
  })),
} as EvaluationInput
const evaluated = { demoSlurryFloor: await time(200, () => evaluate(slurry)), fourteenCourses: await time(200, () => evaluate(fourteen)) }

note('Documents …')
const jobs = (await get('/api/jobs?sort=number')) as { items: { id: string }[] }
const specifications = (await get(`/api/jobs/${jobs.items[0]?.id ?? ''}/specifications`)) as { items: { id: string }[] }
const issue = (await get(`/api/specifications/${specifications.items[0]?.id ?? ''}/issues/1`)) as { document: unknown }
const documents = { reading: await reading(), exporting: await exporting(issue.document) }
server.closeAllConnections()
server.close()
await database.close()

note('First response of a built tree …')
const started = performance.now()
const child = spawn(process.execPath, ['server/start.mjs'], {
  cwd: root,
  stdio: 'ignore',
  env: { ...process.env, PORT: '4799', DATA_DIR: join(folder, 'data') },
})
while (!(await fetch('http://127.0.0.1:4799/api/health').catch(() => undefined))?.ok)
  await new Promise((resolve) => setTimeout(resolve, 50))
const firstResponse = round((performance.now() - started) / 1000)
child.kill('SIGINT')
await new Promise((resolve) => child.once('exit', resolve))

note('Bytes of pages …')
const pages = await pageWeights()
await rm(folder, { recursive: true, force: true })
const machine = { cpu: cpus()[0]?.model ?? '', cores: cpus().length, node: process.version }
process.stdout.write(
  `${JSON.stringify({ machine, milliseconds: { listOf10000: list, searchWithTypo: search, evaluated, ...documents }, firstResponseSeconds: firstResponse, pages }, null, 2)}\n`,
)
process.exit(0)
