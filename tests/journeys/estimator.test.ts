import { readFile } from 'node:fs/promises'
import { expect, it } from 'vitest'
import { idOf, look, startProduct } from './product.ts'

const product = await startProduct()

it('an estimator opens a job on a released floor, orders for it and issues its specification', async () => {
  const page = await product.as('estimator')
  await page.goto('/jobs/new')
  await page.getByLabel('Name').fill('Quillwater Bottling, loading bay')
  await page.getByRole('combobox', { name: 'Build-up' }).selectOption({ label: 'Slurry-filled freight floor, 1/8 in, version 2' })
  await page.getByRole('button', { name: 'Add a bay' }).click()
  await page.getByRole('button', { name: 'Add a bay' }).click()
  const areas = page.getByRole('textbox', { name: 'Area' })
  await areas.nth(0).fill('2500')
  await areas.nth(1).fill('2500')
  await page.getByLabel('Loss', { exact: true }).fill('0')
  await page.getByRole('button', { name: 'Open the job' }).click()
  await page.waitForURL(/\/jobs\/[0-9a-f-]{36}$/)
  // 5,000 ft² at 150 ft²/gal are 33.3 gal a coat before loss (common practice).
  await expect.poll(() => page.getByText(/33\.3 gal/).count()).toBeGreaterThan(1)
  await page.getByRole('heading', { name: 'Order list' }).waitFor()
  await look(page, 'estimator-job-1440')
})

it('the specification goes out as DOCX and PDF, and an issue stays as it was', async () => {
  const page = await product.as('estimator')
  const jobId = await idOf(page, 'jobs', 'filling hall')
  const { items } = (await (await page.request.get(`/api/jobs/${jobId}/specifications`)).json()) as { items: { id: string }[] }
  const id = items[0]?.id ?? ''
  await page.goto(`/specifications/${id}`)
  await page.getByRole('heading', { name: /^part 1/i }).waitFor()
  await look(page, 'estimator-specification-1440')
  for (const kind of ['DOCX', 'PDF']) {
    const waiting = page.waitForEvent('download')
    await page
      .getByRole('link', { name: new RegExp(kind) })
      .or(page.getByRole('button', { name: new RegExp(kind) }))
      .first()
      .click()
    const download = await waiting
    const head = (await readFile(await download.path())).subarray(0, 4).toString('latin1')
    expect(head).toBe(kind === 'PDF' ? '%PDF' : 'PK\u0003\u0004')
  }
  const file = `/api/specifications/${id}/issues/1/files/pdf`
  const [first, second] = [await (await page.request.get(file)).body(), await (await page.request.get(file)).body()]
  expect(first.equals(second)).toBe(true)
})

it('the second of two estimators on one job is told, and loses nothing', async () => {
  const [one, two] = [await product.as('estimator'), await product.as('estimator')]
  const jobId = await idOf(one, 'jobs', 'wash bay')
  for (const page of [one, two]) {
    await page.goto(`/jobs/${jobId}`)
    await page.getByRole('textbox', { name: 'Client' }).waitFor()
  }
  await one.getByRole('textbox', { name: 'Client' }).fill('Quillwater Bottling, works office')
  await one.getByRole('button', { name: 'Save' }).click()
  await one.getByText(/Saved\./).waitFor()
  await two.getByRole('textbox', { name: 'Client' }).fill('Quillwater Bottling, buying')
  await two.getByRole('button', { name: 'Save' }).click()
  await two.getByText(/Someone else saved this job meanwhile/).waitFor()
  expect(await two.getByRole('textbox', { name: 'Client' }).inputValue()).toBe('Quillwater Bottling, buying')
})
