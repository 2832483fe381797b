import { expect, it } from 'vitest'
import { idOf, look, startProduct } from './product.ts'

const product = await startProduct()

it('a crew member opens the mix, the pot life, the window and what to wear on a phone', async () => {
  const page = await product.as('crew', 390)
  await look(page, 'crew-site-cards-390')
  await page.getByRole('link', { name: /^Quillwater Bottling, filling hall/ }).click()
  await page.getByRole('heading', { name: 'Quillwater Bottling, filling hall' }).waitFor()

  for (let step = 0; step < 3; step++) await page.getByRole('button', { name: 'Next course' }).click()
  const pail = page.getByRole('region', { name: 'This pail' })
  await expect.poll(() => pail.textContent()).toContain('Ostrel 110 Clear')
  // 3 gal at 2 : 1 of 9.4 and 8.4 lb/gal: 2 gal × 9.4 = 18.8 lb and 1 gal × 8.4 = 8.4 lb, worked by hand.
  await expect.poll(() => pail.textContent()).toMatch(/18\.8\s*lb/)
  expect(await pail.textContent()).toMatch(/8\.4\s*lb/)
  await page.getByRole('button', { name: '½ kit' }).click()
  await expect.poll(() => pail.textContent()).toMatch(/9\.4\s*lb/)
  await look(page, 'crew-mix-390')

  const clocks = page.getByRole('region', { name: 'Clocks' })
  for (let step = 0; step < 4; step++) await page.getByRole('button', { name: 'One degree warmer' }).click()
  // At 70 °F the sheet itself states 32 min and 9–38 h.
  await expect.poll(() => clocks.textContent()).toMatch(/32\s*min/)
  expect(await clocks.textContent()).toMatch(/9–38\s*h/)
  await page.getByRole('button', { name: 'Laid now' }).click()
  await expect.poll(() => clocks.textContent()).toMatch(/From\s*\w{3} \d\d:\d\d/)
  await page.reload()
  for (let step = 0; step < 3; step++) await page.getByRole('button', { name: 'Next course' }).click()
  await expect.poll(() => page.getByRole('region', { name: 'Clocks' }).textContent()).toMatch(/until\s*\w{3} \d\d:\d\d/)

  await page.getByRole('button', { name: 'Wear' }).click()
  await page.getByText('Butyl rubber, 0.5 mm, changed every 4 hours').first().waitFor()
  await look(page, 'crew-wear-390')
  await page.getByRole('button', { name: 'First aid' }).click()
  await page
    .getByText(/IF IN EYES: Rinse cautiously/)
    .first()
    .waitFor()
  await page
    .getByRole('link', { name: /1-800-555-0141/ })
    .first()
    .waitFor()
  await look(page, 'crew-first-aid-390')
  await page.getByRole('button', { name: 'Sheets' }).click()
  await page.getByRole('link', { name: /Ostrel 110 Clear, data sheet/ }).click()
  await page.waitForURL(/\/sheets\/pages\//)
  await page.locator('canvas').first().waitFor()
})

it('a crew member sees no prices and no other pages', async () => {
  const page = await product.as('crew', 390)
  const jobId = await idOf(page, 'site-cards', 'filling hall')
  const card = await (await page.request.get(`/api/site-cards/${jobId}`)).text()
  expect(card).not.toContain('packPrice')
  for (const path of ['/api/products', '/api/jobs', '/api/build-ups', '/api/people'])
    expect((await page.request.get(path)).status(), path).toBe(403)
  await page.getByRole('button', { name: 'Menu' }).click()
  expect(await page.getByRole('navigation', { name: 'Main' }).getByRole('link').allTextContents()).toEqual(['Site cards'])
})
