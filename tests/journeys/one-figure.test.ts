import { expect, it } from 'vitest'
import { idOf, look, startProduct } from './product.ts'

const product = await startProduct()
const words = '9–38 h'

it('one figure, followed from the page of its sheet to the specification and the site card', async () => {
  const page = await product.as('lead')
  const mixId = await idOf(page, 'mixes', 'Ostrel 110 Clear')
  await page.goto(`/mixes/${mixId}`)
  const figure = page.getByRole('link', { name: words })
  await figure.waitFor()
  await look(page, 'figure-mix-1440')

  await figure.click()
  await page.waitForURL(/\/sheets\/pages\/.*box=/)
  await page.locator('canvas').first().waitFor()
  const address = new URL(page.url())
  const revisionId = address.pathname.split('/').pop() ?? ''
  await look(page, 'figure-sheet-1440')

  // The page itself says so: the words inside the box of the citation.
  const mix = (await (await page.request.get(`/api/mixes/${mixId}`)).json()) as {
    facts: {
      property: string
      at?: { temperature?: { value: number } }
      origin: { citation?: { quote: string; revisionId: string } }
      value: object
    }[]
  }
  const fact = mix.facts.find(({ property, at }) => property === 'recoatWindow' && at?.temperature?.value === 70)
  expect(fact?.value).toEqual({ min: 9, max: 38, unit: 'h' })
  expect(fact?.origin.citation?.revisionId).toBe(revisionId)
  expect(fact?.origin.citation?.quote).toContain('9–38 h')

  const jobId = await idOf(page, 'jobs', 'filling hall')
  const { items } = (await (await page.request.get(`/api/jobs/${jobId}/specifications`)).json()) as { items: { id: string }[] }
  await page.goto(`/specifications/${items[0]?.id ?? ''}`)
  await page.getByRole('heading', { name: /^part 1/i }).waitFor()
  await expect.poll(() => page.locator('main').textContent()).toContain(words)

  await page.goto(`/site-cards/${jobId}`)
  for (let step = 0; step < 3; step++) await page.getByRole('button', { name: 'Next course' }).click()
  for (let step = 0; step < 4; step++) await page.getByRole('button', { name: 'One degree warmer' }).click()
  await expect.poll(() => page.getByRole('region', { name: 'Clocks' }).textContent()).toMatch(/9–38\s*h/)
})
