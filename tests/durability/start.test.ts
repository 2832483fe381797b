import { type ChildProcess, spawn } from 'node:child_process'
import { lstatSync, readdirSync } from 'node:fs'
import { mkdtemp, rm } from 'node:fs/promises'
import { createServer } from 'node:net'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import supertest from 'supertest'
import { afterAll, describe, expect, it } from 'vitest'

const root = join(import.meta.dirname, '../..')
const folder = await mkdtemp(join(tmpdir(), 'wearcourse-start-'))
afterAll(() => rm(folder, { recursive: true, force: true }))

interface Running {
  child: ChildProcess
  said: () => string
  ended: Promise<number | null>
  open: Promise<void>
}

function start(variables: Record<string, string>): Running {
  const child = spawn(process.execPath, ['--import', 'tsx', join(root, 'server/main.ts')], {
    cwd: root,
    env: { PATH: process.env['PATH'], HOME: process.env['HOME'], ...variables },
    stdio: ['ignore', 'pipe', 'pipe'],
  })
  let text = ''
  const ended = new Promise<number | null>((resolve) => child.once('close', resolve))
  const open = new Promise<void>((resolve, reject) => {
    child.stdout.on('data', (data: Buffer) => {
      text += data.toString()
      if (text.includes('is open at')) resolve()
    })
    child.stderr.on('data', (data: Buffer) => (text += data.toString()))
    void ended.then(() => reject(new Error(text)))
  })
  open.catch(() => undefined)
  return { child, said: () => text, ended, open }
}

async function freePort(): Promise<string> {
  const server = createServer()
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve))
  const address = server.address()
  await new Promise((resolve) => server.close(resolve))
  return String(typeof address === 'object' && address ? address.port : 0)
}

describe('the server as a process', () => {
  it('starts empty, makes the first technical lead with its code, keeps others out of folder and port, and ends cleanly', async () => {
    const [PORT, DATA_DIR] = [await freePort(), join(folder, 'data')]
    const first = start({ PORT, DATA_DIR, DEMO: 'off' })
    await first.open
    const here = supertest.agent(`http://127.0.0.1:${PORT}`)
    await here.get('/api/health').expect(200, { status: 'ok' })
    await expect.poll(first.said).toMatch(/with the code [0-9a-f]+/)
    const code = /with the code ([0-9a-f]+)/.exec(first.said())?.[1]
    const lead = {
      code,
      firmName: 'Brackenholt Floors',
      name: 'Ines Okafor',
      email: 'lead@brackenholt.example',
      password: 'quillwater-demo-long',
    }
    await here
      .post('/api/first-lead')
      .send({ ...lead, code: 'ffffffffff' })
      .expect(422)
    await here.post('/api/first-lead').send(lead).expect(201)

    const sameFolder = start({ PORT: await freePort(), DATA_DIR, DEMO: 'off' })
    expect(await sameFolder.ended).toBe(1)
    expect(sameFolder.said()).toMatch(/^Wearcourse could not start: The data folder .* is in use by another Wearcourse\. .*$/m)
    const samePort = start({ PORT, DATA_DIR: join(folder, 'other'), DEMO: 'off' })
    expect(await samePort.ended).toBe(1)
    expect(samePort.said()).toBe(
      `Wearcourse could not start: Port ${PORT} is in use by another program. Stop that one, or set another PORT.\n`,
    )

    const open = ['.', ...readdirSync(DATA_DIR, { recursive: true, encoding: 'utf8' })].filter(
      (name) => (lstatSync(join(DATA_DIR, name)).mode & 0o077) !== 0,
    )
    expect(open).toEqual([])

    first.child.kill('SIGINT')
    expect(await first.ended).toBe(0)
    const again = start({ PORT, DATA_DIR, DEMO: 'auto' })
    await again.open
    await here.post('/api/session').send({ email: lead.email, password: lead.password }).expect(200)
    again.child.kill('SIGTERM')
    expect(await again.ended).toBe(0)
    expect(again.said()).not.toMatch(/code|Demo accounts/)
  }, 180_000)

  it('ends with all that is wrong in its environment', async () => {
    const wrong = start({ PORT: 'none', DEMO: 'perhaps', DATABASE_URL: 'mysql://db.example' })
    expect(await wrong.ended).toBe(1)
    expect(
      wrong
        .said()
        .split('\n')
        .slice(1, -1)
        .map((line) => line.trim().split(':')[0]),
    ).toEqual(['PORT', 'DATABASE_URL', 'DEMO'])
  }, 60_000)
})
