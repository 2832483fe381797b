import { mkdtemp, writeFile } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { expect, it } from 'vitest'
import { printPdf } from '../../server/documents/print-pdf.ts'
import { idOf, look, startProduct } from './product.ts'

const product = await startProduct()

it('a technical lead adds a product, uploads its sheet and ties a value to the page', async () => {
  const page = await product.as('lead')
  await page.goto('/products/new')
  await page.getByLabel('Name').fill('Ostrel 90 Flex, Part A')
  await page.getByLabel('Maker').fill('Ostrel')
  await page.getByRole('button', { name: 'Add the product' }).click()
  await page.getByRole('heading', { name: 'Ostrel 90 Flex, Part A' }).waitFor()
  const id = await idOf(page, 'products', 'Ostrel 90 Flex')

  const folder = await mkdtemp(join(tmpdir(), 'wearcourse-sheet-'))
  const path = join(folder, 'ostrel-90-flex.pdf')
  await writeFile(
    path,
    await printPdf({
      content: [
        { text: 'Ostrel 90 Flex, Part A', fontSize: 22 },
        { text: 'Safety data sheet' },
        { text: 'Density 9.3 lb/gal', margin: [0, 40, 0, 0] },
      ],
    }),
  )
  const answer = await page.request.get('/api/openapi.json')
  expect(answer.ok()).toBe(true)
  await page.goto('/sheets')
  await page.locator('input[type="file"]').first().setInputFiles(path)
  await page
    .getByText(/ostrel-90-flex\.pdf/)
    .first()
    .waitFor()
  await look(page, 'lead-upload-1440')

  await page.goto(`/products/${id}/values/new?property=density`)
  await page.getByLabel('Figure').fill('9.3')
  await page.getByLabel('Unit, as stated').selectOption('lb/gal')
  await page.getByRole('button', { name: 'Add', exact: true }).click()
  await page.getByText('There is a problem').waitFor()
  await page.getByLabel('Reason').fill('Maker’s letter of 3 May')
  await page.getByRole('button', { name: 'Add', exact: true }).click()
  await expect.poll(async () => (await (await page.request.get(`/api/products/${id}`)).json()).facts.length as number).toBe(1)
  await page.goto(`/products/${id}`)
  await page.getByText('9.3 lb/gal').first().waitFor()
  await look(page, 'lead-product-1440')

  const found = (await (await page.request.get('/api/sheets?q=ostrel-90-flex')).json()) as { items: { sheetId: string; title: string }[] }
  const { version } = (await (await page.request.get(`/api/sheets/${found.items[0]?.sheetId ?? ''}`)).json()) as { version: number }
  const attached = await page.request.put(`/api/sheets/${found.items[0]?.sheetId ?? ''}`, {
    data: { version, kind: 'safety', title: 'Ostrel 90 Flex, Part A, safety sheet', maker: 'Ostrel', subjects: [{ productId: id }] },
  })
  expect(attached.ok()).toBe(true)
  await page.reload()
  await page.getByRole('link', { name: /^Amend Density/ }).click()
  await page.getByLabel('Stated on a sheet').check()
  await page.getByRole('link', { name: 'Mark the place on the page' }).click()
  await page.getByRole('button', { name: 'Put a box on the page' }).click()
  await page.getByLabel('The sheet’s words').fill('Density 9.3 lb/gal')
  await page.getByRole('button', { name: 'Use this place' }).click()
  await page.getByText('A place is marked on page 1.').waitFor()
  expect(await page.getByLabel('Figure').inputValue()).toBe('9.3')
  await look(page, 'lead-value-1440')
  await page.getByRole('button', { name: 'Save', exact: true }).click()
  await page.getByRole('heading', { name: 'History' }).waitFor()
  await page.getByRole('link', { name: '9.3 lb/gal', exact: true }).first().click()
  await page.waitForURL(/\/sheets\/pages\/.*box=/)
})

it('a technical lead sees what stops a draft; a released floor stays as it is', async () => {
  const page = await product.as('lead')
  await page.goto(`/build-ups/${await idOf(page, 'build-ups', 'Water-borne primer')}`)
  await page
    .getByText(/Ratio by volume and by weight agree|ratio by volume and by weight agree/)
    .first()
    .waitFor()
  await look(page, 'lead-draft-1440')
  await page.goto(`/build-ups/${await idOf(page, 'build-ups', 'Slurry-filled')}`)
  await page.getByRole('heading', { name: /Slurry-filled freight floor/ }).waitFor()
  await look(page, 'builder')
  await page.setViewportSize({ width: 390, height: 844 })
  await look(page, 'lead-builder-390')
})

it('every list of the office can be read by everyone, at the desk and on a phone', async () => {
  for (const width of [1440, 390]) {
    const page = await product.as('lead', width)
    for (const path of [
      '/products',
      '/mixes',
      '/sheets',
      '/build-ups',
      '/jobs',
      '/people',
      '/firm',
      '/outbox',
      '/changes',
      '/account',
      '/nothing-here',
    ]) {
      await page.goto(path)
      await page.locator('h1').first().waitFor()
      await look(page, `list${path.replaceAll('/', '-')}-${width}`)
    }
  }
})
