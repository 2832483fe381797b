import { type ChildProcess, spawn } from 'node:child_process'
import { mkdirSync } from 'node:fs'
import { mkdtemp, rm } from 'node:fs/promises'
import { createServer } from 'node:net'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import AxeBuilder from '@axe-core/playwright'
import { type Browser, type BrowserContext, type Page, chromium } from 'playwright-core'
import { afterAll, expect } from 'vitest'

const root = join(import.meta.dirname, '../..')
const pictures = join(import.meta.dirname, 'screenshots')
mkdirSync(pictures, { recursive: true })

export interface Product {
  address: string
  /** Signs a person in in a browser of their own. Errors on its console fail the journey at the end. */
  as(who: 'lead' | 'estimator' | 'crew', width?: number): Promise<Page>
}

async function freePort(): Promise<number> {
  const server = createServer()
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve))
  const address = server.address()
  await new Promise((resolve) => server.close(resolve))
  return typeof address === 'object' && address ? address.port : 0
}

async function answers(address: string): Promise<void> {
  for (let tries = 0; tries < 600; tries++) {
    const response = await fetch(`${address}/api/health`).catch(() => undefined)
    if (response?.ok) return
    await new Promise((resolve) => setTimeout(resolve, 200))
  }
  throw new Error('The product did not start.')
}

/** What a browser says of a request that was refused on purpose: a 401 before signing in, a 403, a 404. */
const refusedOnPurpose = /status of (401|403|404|409|422)/

/** Starts the product as `npm start` does, on the demo, with the built pages; closed after the file's tests. */
export async function startProduct(): Promise<Product> {
  const dataDir = await mkdtemp(join(tmpdir(), 'wearcourse-journey-'))
  const port = await freePort()
  const address = `http://localhost:${port}`
  const server: ChildProcess = spawn(process.execPath, ['--import', 'tsx', 'server/main.ts'], {
    cwd: root,
    stdio: 'ignore',
    env: { ...process.env, PORT: String(port), DATA_DIR: dataDir, DEMO: 'auto' },
  })
  const browser: Browser = await chromium.launch({ executablePath: '/usr/bin/chromium', args: ['--no-sandbox'] })
  const complaints: string[] = []
  afterAll(async () => {
    await browser.close()
    const ended = new Promise((resolve) => server.once('exit', resolve))
    server.kill('SIGINT')
    await ended
    await rm(dataDir, { recursive: true, force: true })
    expect(complaints).toEqual([])
  })
  await answers(address)
  return {
    address,
    async as(who, width = 1440) {
      const context: BrowserContext = await browser.newContext({
        viewport: { width, height: 900 },
        baseURL: address,
        acceptDownloads: true,
      })
      const page = await context.newPage()
      page.on('console', (message) => {
        if (message.type() === 'error' && !refusedOnPurpose.test(message.text())) complaints.push(message.text())
      })
      page.on('pageerror', (error) => complaints.push(error.message))
      await page.goto('/')
      await page.getByLabel('E-mail address').fill(`${who}@brackenholt.example`)
      await page.getByLabel('Password').fill('quillwater-demo')
      await page.getByRole('button', { name: 'Sign in' }).click()
      await page.waitForURL((url) => !url.pathname.startsWith('/sign-in'))
      return page
    },
  }
}

/** Keeps a picture of a page and asks axe whether anyone is kept out of it (WCAG 2.2 A and AA). */
export async function look(page: Page, name: string): Promise<void> {
  await page.waitForLoadState('networkidle')
  await page.screenshot({ path: join(pictures, `${name}.png`), fullPage: true })
  const { violations } = await new AxeBuilder({ page }).withTags(['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa']).analyze()
  expect(
    violations.map(
      ({ id, nodes }) =>
        `${name}: ${id}: ${nodes.map(({ html, failureSummary }) => `${html.slice(0, 120)} (${failureSummary?.split('\n').slice(1, 3).join(';') ?? ''})`).join(' | ')}`,
    ),
  ).toEqual([])
}

/** Id of the first record of a list whose name contains the words. */
export async function idOf(page: Page, list: 'products' | 'mixes' | 'build-ups' | 'jobs' | 'site-cards', name: string): Promise<string> {
  const answer = await page.request.get(`/api/${list}?limit=200`)
  const { items } = (await answer.json()) as { items: { id: string; name: string }[] }
  const found = items.find((item) => item.name.includes(name))
  if (!found) throw new Error(`No ${name} among ${list}.`)
  return found.id
}
