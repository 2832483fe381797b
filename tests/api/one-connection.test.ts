import { sql } from 'drizzle-orm'
import { beforeAll, describe, expect, it } from 'vitest'
import { firm } from '../../server/db/schema/firm.ts'
import { type TestApp, testApp } from '../setup/app.ts'

describe('many at once', () => {
  let t: TestApp
  beforeAll(async () => {
    t = await testApp()
  }, 60_000)

  const resin = (name: string) => ({ name, maker: 'Ostrel', kind: 'resin', chemistry: 'epoxy', note: '' })
  const nameIn = (body: unknown) => (body as { name: string }).name

  it('requests of several kinds and transactions each get their own answer', async () => {
    const asked = Array.from({ length: 20 }, (_, index) => [
      async () => {
        const made = await t.as.lead
          .post('/api/products')
          .send(resin(`Resin ${index}`))
          .expect(201)
        const read = await t.as.estimator.get(`/api/products/${(made.body as { id: string }).id}`).expect(200)
        expect([nameIn(made.body), nameIn(read.body)]).toEqual([`Resin ${index}`, `Resin ${index}`])
      },
      async () => {
        const { body } = await t.as.crew.get('/api/session').expect(200)
        expect(body).toMatchObject({ user: { role: 'crew', id: t.ids.crew } })
      },
      async () => {
        const { body } = await t.as.lead.get('/api/people').expect(200)
        expect((body as { items: unknown[] }).items).toHaveLength(3)
      },
      () =>
        t.as.lead
          .post('/api/products')
          .send({ ...resin('x'), kind: 'no such kind' })
          .expect(422),
      () => t.as.nobody.get('/api/products').expect(401),
      async () => {
        const sum = await t.db.transaction(async (tx) => {
          await tx.execute(sql`select set_config('wearcourse.test', ${String(index)}, true)`)
          await new Promise((resolve) => setTimeout(resolve, index % 5))
          const { rows } = await tx.execute<{ value: string; twice: string }>(
            sql`select current_setting('wearcourse.test') as value, (2 * ${index}::int)::text as twice`,
          )
          return rows[0]
        })
        expect(sum).toEqual({ value: String(index), twice: String(2 * index) })
      },
    ]).flat()
    await Promise.all(asked.map((ask) => ask()))
    const { body } = await t.as.lead.get('/api/products?limit=200').expect(200)
    expect((body as { items: unknown[] }).items).toHaveLength(20)
    expect(t.logged.filter((line) => line.startsWith('error'))).toEqual([])
  }, 60_000)

  it('a transaction that is rolled back takes nothing of another with it', async () => {
    await t.db.execute(sql`create table kept_rows (n int primary key)`)
    const one = (n: number) =>
      t.db.transaction(async (tx) => {
        await tx.execute(sql`insert into kept_rows values (${n})`)
        if (n % 2) throw new Error('back')
      })
    const results = await Promise.allSettled(Array.from({ length: 20 }, (_, n) => one(n)))
    expect(results.map(({ status }) => status)).toEqual(Array.from({ length: 20 }, (_, n) => (n % 2 ? 'rejected' : 'fulfilled')))
    const { rows } = await t.db.execute<{ n: number }>(sql`select n from kept_rows order by n`)
    expect(rows.map(({ n }) => n)).toEqual([0, 2, 4, 6, 8, 10, 12, 14, 16, 18])
  })

  it('the database asked from inside a transaction, past its tx, answers with an error at once', async () => {
    const begun = Date.now()
    await expect(t.db.transaction(async () => t.db.select().from(firm))).rejects.toMatchObject({
      cause: { message: expect.stringContaining('without its tx') as string },
    })
    await expect(t.db.transaction(() => t.db.transaction(() => Promise.resolve(1)))).rejects.toThrow('without its tx')
    expect(Date.now() - begun).toBeLessThan(2000)
    expect(await t.db.transaction((tx) => tx.transaction((inner) => inner.select().from(firm)))).toHaveLength(1)
  })

  it('code that outlives the transaction it was started in may ask again', async () => {
    let later: Promise<unknown[]> | undefined
    await t.db.transaction(async (tx) => {
      await tx.select().from(firm)
      later = new Promise((resolve) => setTimeout(resolve, 200)).then(() => t.db.select().from(firm))
    })
    expect(await later).toHaveLength(1)
  })
})
