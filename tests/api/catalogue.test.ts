import { eq } from 'drizzle-orm'
import { randomUUID } from 'node:crypto'
import { beforeAll, describe, expect, it } from 'vitest'
import type { MixRecord, MixRow, ProductRecord, ProductRow } from '../../shared/api/catalogue.ts'
import type { Fact } from '../../shared/domain/fact.ts'
import { propertyValues, sheetSubjects } from '../../server/db/schema/catalogue.ts'
import { auditTrail } from '../../server/db/schema/firm.ts'
import { sheetPages, sheetRevisions, sheets } from '../../server/db/schema/sheets.ts'
import { readMixFacts, readProductFacts } from '../../server/features/catalogue/queries.ts'
import { type TestApp, testApp } from '../setup/app.ts'

const aResin = { name: 'Ostrel 110 Clear, part A', maker: 'Ostrel', kind: 'resin', chemistry: 'epoxy', note: '' }
const entered = { kind: 'entered', reason: 'Maker’s letter of 3 May' }
const density = (value: number, how: object = entered) => ({
  statement: { property: 'density', value: { min: value, max: value, unit: 'lb/gal' } },
  how,
})
const potLife = (minutes: number, temperature: number) => ({
  statement: {
    property: 'potLife',
    value: { min: minutes, max: minutes, unit: 'min' },
    at: { temperature: { value: temperature, unit: '°F' } },
  },
  how: entered,
})
let counter = 0

describe('the catalogue', () => {
  let t: TestApp
  beforeAll(async () => {
    t = await testApp()
  }, 60_000)

  const addProduct = async (more: object = {}) => {
    counter += 1
    return (
      await t.as.lead
        .post('/api/products')
        .send({ ...aResin, name: `Product ${counter}`, ...more })
        .expect(201)
    ).body as ProductRecord
  }
  const addMix = async (parts: string[], more: object = {}) => {
    counter += 1
    const body = {
      name: `Mix ${counter}`,
      maker: 'Ostrel',
      chemistry: 'epoxy',
      color: '#8f9a98',
      note: '',
      ratio: null,
      parts: parts.map((productId, index) => ({ part: 'ABC'[index], productId })),
      ...more,
    }
    return (await t.as.lead.post('/api/mixes').send(body).expect(201)).body as MixRecord
  }
  const two = async () => [(await addProduct()).id, (await addProduct({ kind: 'hardener' })).id]
  const read = async (kind: 'products' | 'mixes', id: string) =>
    (await t.as.lead.get(`/api/${kind}/${id}`).expect(200)).body as ProductRecord & MixRecord
  const trail = (id: string) => t.db.select().from(auditTrail).where(eq(auditTrail.subjectId, id)).orderBy(auditTrail.id)
  const find = async (kind: 'products' | 'mixes', query: object) =>
    (await t.as.estimator.get(`/api/${kind}`).query(query).expect(200)).body as {
      items: (ProductRow & MixRow)[]
      total: number
      nextCursor: string | null
    }
  const names = async (kind: 'products' | 'mixes', query: object) => (await find(kind, query)).items.map(({ name }) => name)

  /** A sheet of one revision with pages of US Letter size, attached to a product or a mix. */
  const addSheet = async (subject: { productId: string } | { mixId: string }, { pages = 2 } = {}) => {
    const [sheet] = await t.db
      .insert(sheets)
      .values({ kind: 'data', title: 'Ostrel 110, data sheet', maker: 'Ostrel' })
      .returning({ id: sheets.id })
    await t.db.insert(sheetSubjects).values({ sheetId: sheet!.id, ...subject })
    return { sheetId: sheet!.id, revisionId: await addRevision(sheet!.id, { pages, sequence: 1 }) }
  }
  const addRevision = async (sheetId: string, { pages = 2, sequence = 1, revisionDate = '2025-03' }) => {
    const values = {
      sheetId,
      sha256: randomUUID(),
      bytes: 1000,
      fileName: 'ostrel-110.pdf',
      revisionDate,
      state: 'ready' as const,
      pages,
      sequence,
    }
    const [revision] = await t.db.insert(sheetRevisions).values(values).returning({ id: sheetRevisions.id })
    const all = Array.from({ length: pages }, (_, index) => ({
      revisionId: revision!.id,
      page: index + 1,
      width: 612,
      height: 792,
      text: '',
      words: [],
    }))
    await t.db.insert(sheetPages).values(all)
    return revision!.id
  }

  describe('products', () => {
    it.each(['resin', 'hardener', 'primer', 'aggregate', 'filler', 'additive'])('keeps a %s', async (kind) => {
      const made = await addProduct({ kind, note: 'Two lines\nof a note.' })
      expect(await read('products', made.id)).toMatchObject({
        kind,
        version: 1,
        status: 'active',
        note: 'Two lines\nof a note.',
        facts: [],
        sheets: [],
        usedIn: [],
      })
    })

    it('names the field that is wrong and writes nothing', async () => {
      const before = (await find('products', {})).total
      const wrong: [object, string][] = [
        [{ name: '' }, 'name'],
        [{ name: '   ' }, 'name'],
        [{ name: 'x'.repeat(161) }, 'name'],
        [{ name: 'a\u0000b' }, 'name'],
        [{ name: 'a\nb' }, 'name'],
        [{ name: 'a\ud800' }, 'name'],
        [{ name: 7 }, 'name'],
        [{ maker: '' }, 'maker'],
        [{ maker: 'x'.repeat(121) }, 'maker'],
        [{ kind: 'paint' }, 'kind'],
        [{ kind: null }, 'kind'],
        [{ chemistry: 'magic' }, 'chemistry'],
        [{ note: 'x'.repeat(2001) }, 'note'],
        [{ note: 'a\u0007b' }, 'note'],
        [{ surprise: 1 }, 'surprise'],
        [{ id: randomUUID() }, 'id'],
        [{ status: 'withdrawn' }, 'status'],
      ]
      for (const [change, field] of wrong) {
        const { body } = await t.as.lead
          .post('/api/products')
          .send({ ...aResin, name: 'Wrong', ...change })
          .expect(422)
        expect(Object.keys(body.error.fields), JSON.stringify(change)).toContain(field)
      }
      expect((await find('products', {})).total).toBe(before)
    })

    it('takes every field at its limit', async () => {
      const made = await addProduct({ name: 'µ'.repeat(160), maker: 'Ω'.repeat(120), note: '😀'.repeat(1000) })
      expect((await read('products', made.id)).name).toHaveLength(160)
    })

    it('refuses a second of one maker and name, whatever the capitals, and names the field', async () => {
      const made = await addProduct({ name: 'Twice' })
      const { body } = await t.as.lead
        .post('/api/products')
        .send({ ...aResin, name: 'TWICE', maker: 'ostrel' })
        .expect(409)
      expect(body.error).toMatchObject({ code: 'duplicate', fields: { name: 'This maker already has one of this name.' } })
      await addProduct({ name: 'Twice', maker: 'Teasel' })
      const other = await addProduct({ name: 'Other' })
      const renamed = await t.as.lead.patch(`/api/products/${other.id}`).send({ version: 1, name: 'twice' }).expect(409)
      expect(renamed.body.error.fields).toHaveProperty('name')
      await t.as.lead.patch(`/api/products/${made.id}`).send({ version: 1, name: 'TWICE' }).expect(200)
    })

    it('lets only one of two people add the same at the same moment', async () => {
      const both = await Promise.all([1, 2].map(() => t.as.lead.post('/api/products').send({ ...aResin, name: 'At once' })))
      expect(both.map(({ status }) => status).sort()).toEqual([201, 409])
      expect(await names('products', { q: 'at once' })).toHaveLength(1)
    })

    it('tells of a change made meanwhile and overwrites nothing', async () => {
      const { id } = await addProduct({ name: 'Meanwhile' })
      await t.as.lead.patch(`/api/products/${id}`).send({ version: 1, note: 'First' }).expect(200)
      const { body } = await t.as.lead.patch(`/api/products/${id}`).send({ version: 1, note: 'Second' }).expect(409)
      expect(body.error.code).toBe('conflict')
      expect(await read('products', id)).toMatchObject({ note: 'First', version: 2 })
    })

    it('records what changed, from and to, and nothing where nothing did', async () => {
      const { id, name } = await addProduct({ note: 'Old' })
      await t.as.lead.patch(`/api/products/${id}`).send({ version: 1, name, note: 'New', kind: 'resin' }).expect(200)
      await t.as.lead.patch(`/api/products/${id}`).send({ version: 2, note: 'New' }).expect(200)
      const rows = await trail(id)
      expect(rows.map(({ action }) => action)).toEqual(['added', 'changed'])
      expect(rows[1]).toMatchObject({ personId: t.ids.lead, subjectKind: 'product', from: { note: 'Old' }, to: { note: 'New' } })
      expect((await read('products', id)).version).toBe(2)
    })

    it('withdraws and restores', async () => {
      const { id } = await addProduct()
      expect((await t.as.lead.patch(`/api/products/${id}`).send({ version: 1, status: 'withdrawn' }).expect(200)).body.status).toBe(
        'withdrawn',
      )
      expect((await t.as.lead.patch(`/api/products/${id}`).send({ version: 2, status: 'active' }).expect(200)).body.status).toBe('active')
      expect((await trail(id)).map(({ action }) => action)).toEqual(['added', 'withdrawn', 'restored'])
    })

    it('is read by an estimator and changed by a lead alone', async () => {
      const { id } = await addProduct()
      await t.as.estimator.get(`/api/products/${id}`).expect(200)
      await t.as.estimator.patch(`/api/products/${id}`).send({ version: 1, note: 'x' }).expect(403)
      await t.as.estimator.post(`/api/products/${id}/facts`).send(density(9)).expect(403)
      await t.as.crew.get(`/api/products/${id}`).expect(403)
      await t.as.nobody.get(`/api/products/${id}`).expect(401)
    })

    it('knows of nothing that is not there', async () => {
      for (const kind of ['products', 'mixes']) {
        await t.as.lead.get(`/api/${kind}/${randomUUID()}`).expect(404)
        await t.as.lead.get(`/api/${kind}/none`).expect(404)
        await t.as.lead.patch(`/api/${kind}/${randomUUID()}`).send({ version: 1, note: 'x' }).expect(404)
        await t.as.lead.post(`/api/${kind}/${randomUUID()}/facts`).send(density(9)).expect(404)
      }
      await t.as.lead.put(`/api/facts/${randomUUID()}`).send(density(9)).expect(404)
      await t.as.lead.delete(`/api/facts/${randomUUID()}`).expect(404)
    })
  })

  describe('mixes', () => {
    it('keeps one product alone, and two or three parts at a ratio with its basis', async () => {
      const alone = await addMix([(await addProduct()).id])
      expect(alone.parts.map(({ part }) => part)).toEqual(['A'])
      const [a, b] = await two()
      const c = (await addProduct({ kind: 'filler' })).id
      const mix = await addMix([a!, b!, c], { ratio: { value: { parts: [2, 1, 8.5], basis: 'weight' }, reason: 'Label of the kit' } })
      expect(mix.parts.map(({ product }) => product.id)).toEqual([a, b, c])
      expect(mix.facts).toMatchObject([
        {
          property: 'mixRatio',
          value: { parts: [2, 1, 8.5], basis: 'weight' },
          origin: { kind: 'entered', reason: 'Label of the kit', by: 'Test lead' },
        },
      ])
      expect((await read('products', c)).usedIn).toEqual([{ kind: 'mix', id: mix.id, name: mix.name, version: null }])
    })

    it('names the field that is wrong and writes nothing', async () => {
      const [a, b] = await two()
      const gone = await addProduct()
      await t.as.lead.patch(`/api/products/${gone.id}`).send({ version: 1, status: 'withdrawn' }).expect(200)
      const before = (await find('mixes', {})).total
      const ratio = (parts: unknown[], more: object = {}) => ({ value: { parts, basis: 'volume' }, reason: 'Label', ...more })
      const part = (letter: string, productId: unknown) => ({ part: letter, productId })
      const wrong: [object, string][] = [
        [{ parts: [] }, 'parts'],
        [{ parts: [part('A', a), part('B', b), part('C', gone.id), part('C', a)] }, 'parts'],
        [{ parts: [part('B', a)] }, 'parts'],
        [{ parts: [part('A', a), part('B', a)] }, 'parts.1.productId'],
        [{ parts: [part('A', a), part('B', randomUUID())] }, 'parts.1.productId'],
        [{ parts: [part('A', a), part('B', '')] }, 'parts.1.productId'],
        [{ parts: [part('A', a), part('B', gone.id)] }, 'parts.1.productId'],
        [{ ratio: ratio([2]) }, 'ratio.value.parts'],
        [{ ratio: ratio([2, 0]) }, 'ratio.value.parts.1'],
        [{ ratio: ratio([2, -1]) }, 'ratio.value.parts.1'],
        [{ ratio: ratio([2, 10_001]) }, 'ratio.value.parts.1'],
        [{ ratio: ratio([2, 1, 1]) }, 'ratio.value.parts'],
        [{ ratio: ratio([2, 'x']) }, 'ratio.value.parts.1'],
        [{ ratio: ratio([2, 1], { reason: '' }) }, 'ratio.reason'],
        [{ ratio: { value: { parts: [2, 1], basis: 'length' }, reason: 'Label' } }, 'ratio.value.basis'],
        [{ parts: [part('A', a)], ratio: ratio([2, 1]) }, 'ratio'],
        [{ color: 'red' }, 'color'],
        [{ color: '#FFFFFF00' }, 'color'],
        [{ chemistry: '' }, 'chemistry'],
        [{ name: '' }, 'name'],
      ]
      for (const [change, field] of wrong) {
        const body = {
          name: 'Wrong',
          maker: 'Ostrel',
          chemistry: 'epoxy',
          color: '#8f9a98',
          note: '',
          parts: [part('A', a), part('B', b)],
          ratio: null,
          ...change,
        }
        const answer = await t.as.lead.post('/api/mixes').send(body)
        expect(answer.status, JSON.stringify(change)).toBe(422)
        expect(Object.keys(answer.body.error.fields), JSON.stringify(change)).toContain(field)
      }
      expect((await find('mixes', {})).total).toBe(before)
    })

    it('keeps a withdrawn part that was there before, and takes no other', async () => {
      const [a, b] = await two()
      const mix = await addMix([a!, b!])
      await t.as.lead.patch(`/api/products/${b}`).send({ version: 1, status: 'withdrawn' }).expect(200)
      const parts = [
        { part: 'A', productId: b },
        { part: 'B', productId: a },
      ]
      expect((await t.as.lead.patch(`/api/mixes/${mix.id}`).send({ version: 1, parts }).expect(200)).body.parts[0].product).toMatchObject({
        id: b,
        status: 'withdrawn',
      })
    })

    it('takes out ratio and values that no longer fit when a part goes, and says so in the history', async () => {
      const [a, b] = await two()
      const mix = await addMix([a!, b!], { ratio: { value: { parts: [2, 1], basis: 'volume' }, reason: 'Label of the kit' } })
      await t.as.lead
        .post(`/api/mixes/${mix.id}/facts`)
        .send({ ...density(8.3), statement: { ...density(8.3).statement, part: 'B' } })
        .expect(201)
      await t.as.lead.post(`/api/mixes/${mix.id}/facts`).send(potLife(25, 75)).expect(201)
      const { body } = await t.as.lead
        .patch(`/api/mixes/${mix.id}`)
        .send({ version: 1, parts: [{ part: 'A', productId: a }] })
        .expect(200)
      expect(body.facts.map(({ property }: Fact) => property)).toEqual(['potLife'])
      const removed = (await trail(mix.id)).filter(({ action }) => action === 'value-removed')
      expect(removed.map(({ from }) => (from as Fact).property).sort()).toEqual(['density', 'mixRatio'])
    })

    it('tells of a change made meanwhile', async () => {
      const [a, b] = await two()
      const { id } = await addMix([a!, b!])
      await t.as.lead.patch(`/api/mixes/${id}`).send({ version: 1, color: '#112233' }).expect(200)
      expect(
        (
          await t.as.lead
            .patch(`/api/mixes/${id}`)
            .send({ version: 1, parts: [{ part: 'A', productId: a }] })
            .expect(409)
        ).body.error.code,
      ).toBe('conflict')
      expect(await read('mixes', id)).toMatchObject({ color: '#112233', version: 2, parts: [{ part: 'A' }, { part: 'B' }] })
      expect((await trail(id)).at(-1)).toMatchObject({ from: { color: '#8f9a98' }, to: { color: '#112233' } })
    })
  })

  describe('values', () => {
    it('are entered with a reason and carry who and when', async () => {
      const { id } = await addProduct()
      const { body } = await t.as.lead.post(`/api/products/${id}/facts`).send(density(9.4)).expect(201)
      expect(body).toMatchObject({
        property: 'density',
        part: 'mixed',
        value: { min: 9.4, max: 9.4, unit: 'lb/gal' },
        origin: { kind: 'entered', reason: 'Maker’s letter of 3 May', by: 'Test lead' },
      })
      expect(Math.abs(Date.parse(body.origin.at) - Date.now())).toBeLessThan(60_000)
    })

    it('are stated on a page of a sheet of the record, with box and words', async () => {
      const { id } = await addProduct()
      const { revisionId, sheetId } = await addSheet({ productId: id })
      const how = { kind: 'stated', revisionId, page: 2, box: [72, 214.5, 310.2, 226.1], quote: 'Density 9.4 lb/gal' }
      const { body } = await t.as.lead.post(`/api/products/${id}/facts`).send(density(9.4, how)).expect(201)
      expect(body.origin).toMatchObject({
        kind: 'stated',
        by: 'Test lead',
        citation: {
          sheetId,
          revisionId,
          sheetTitle: 'Ostrel 110, data sheet',
          revisionDate: '2025-03',
          page: 2,
          box: [72, 214.5, 310.2, 226.1],
          quote: 'Density 9.4 lb/gal',
        },
      })
    })

    it('are refused where the page, the sheet or the box is not there', async () => {
      const { id } = await addProduct()
      const other = await addProduct()
      const { revisionId } = await addSheet({ productId: id })
      const elsewhere = await addSheet({ productId: other.id })
      const how = { kind: 'stated', revisionId, page: 1, box: null, quote: null }
      const wrong: [object, string][] = [
        [{ page: 3 }, 'how.page'],
        [{ page: 0 }, 'how.page'],
        [{ page: 1.5 }, 'how.page'],
        [{ page: 'one' }, 'how.page'],
        [{ revisionId: elsewhere.revisionId }, 'how.revisionId'],
        [{ revisionId: randomUUID() }, 'how.revisionId'],
        [{ revisionId: 'x' }, 'how.revisionId'],
        [{ box: [0, 0, 613.5, 10] }, 'how.box'],
        [{ box: [10, 10, 10, 20] }, 'how.box'],
        [{ box: [20, 10, 10, 20] }, 'how.box'],
        [{ box: [-5, 0, 10, 10] }, 'how.box'],
        [{ box: [0, 0, 10] }, 'how.box'],
        [{ quote: 'a\u0000' }, 'how.quote'],
        [{ quote: 'x'.repeat(1001) }, 'how.quote'],
        [{ kind: 'typical' }, 'how.kind'],
        [{ kind: 'computed' }, 'how.kind'],
        [{ reason: 'x' }, 'how.reason'],
      ]
      for (const [change, field] of wrong) {
        const answer = await t.as.lead.post(`/api/products/${id}/facts`).send(density(9.4, { ...how, ...change }))
        expect(answer.status, JSON.stringify(change)).toBe(422)
        expect(Object.keys(answer.body.error.fields), JSON.stringify(change)).toContain(field)
      }
      const noReason = await t.as.lead
        .post(`/api/products/${id}/facts`)
        .send(density(9.4, { kind: 'entered', reason: ' ' }))
        .expect(422)
      expect(noReason.body.error.fields).toHaveProperty(['how.reason'])
      expect((await read('products', id)).facts).toEqual([])
    })

    it('are refused with the field named where value, unit, condition or part cannot be', async () => {
      const [a, b] = await two()
      const mix = await addMix([a!, b!])
      const wrong: [object, string][] = [
        [{ property: 'colour', value: { text: 'grey' } }, 'statement.property'],
        [{ property: 'density', value: { min: 9, max: 9, unit: 'min' } }, 'statement.value.unit'],
        [{ property: 'density', value: { min: 9, max: 8, unit: 'lb/gal' } }, 'statement.value'],
        [{ property: 'density', value: { unit: 'lb/gal' } }, 'statement.value'],
        [{ property: 'density', value: null }, 'statement.value'],
        [{ property: 'volumeSolids', value: { min: 140, max: 140, unit: '%' } }, 'statement.value.min'],
        [{ property: 'ingredient', value: { name: 'Benzyl alcohol', cas: '100-51-7', unit: '%' } }, 'statement.value.cas'],
        [{ property: 'hazardStatements', value: { codes: ['P280'] } }, 'statement.value.codes'],
        [{ property: 'gloves', value: { text: 'a\u0000b' } }, 'statement.value.text'],
        [
          { property: 'potLife', value: { min: 20, max: 20, unit: 'min' }, at: { temperature: { value: 70, unit: 'mil' } } },
          'statement.at.temperature.value',
        ],
        [{ property: 'potLife', value: { min: 20, max: 20, unit: 'min' }, at: { wind: { value: 70, unit: 'mil' } } }, 'statement.at.wind'],
        [{ property: 'potLife', value: { min: 20, max: 20, unit: 'min' }, part: 'A' }, 'statement.part'],
        [{ property: 'density', value: { min: 9, max: 9, unit: 'lb/gal' }, part: 'C' }, 'statement.part'],
        [{ property: 'density', value: { min: 9, max: 9, unit: 'lb/gal' }, part: 'D' }, 'statement.part'],
        [{ property: 'mixRatio', value: { parts: [2, 1, 1], basis: 'volume' } }, 'statement.value.parts'],
        [{ property: 'density', value: { min: 9, max: 9, unit: 'lb/gal' }, film: 'wet' }, 'statement.film'],
      ]
      for (const [statement, field] of wrong) {
        const answer = await t.as.lead.post(`/api/mixes/${mix.id}/facts`).send({ statement, how: entered })
        expect(answer.status, JSON.stringify(statement)).toBe(422)
        expect(Object.keys(answer.body.error.fields), JSON.stringify(statement)).toContain(field)
      }
      const price = await t.as.lead
        .post(`/api/mixes/${mix.id}/facts`)
        .send({
          statement: { property: 'packPrice', value: { min: 210, max: 210, unit: 'USD' } },
          how: { kind: 'stated', revisionId: randomUUID(), page: 1, box: null, quote: null },
        })
        .expect(422)
      expect(price.body.error.fields).toHaveProperty(['how.kind'])
      const onProduct = await t.as.lead
        .post(`/api/products/${a}/facts`)
        .send({ ...density(9), statement: { ...density(9).statement, part: 'A' } })
        .expect(422)
      expect(onProduct.body.error.fields).toHaveProperty(['statement.part'])
      expect((await read('mixes', mix.id)).facts).toEqual([])
    })

    it('that do not repeat take each other’s place; the old one ends and the trail tells from what to what', async () => {
      const { id } = await addProduct()
      const first = (await t.as.lead.post(`/api/products/${id}/facts`).send(density(9.4)).expect(201)).body as Fact
      const second = (await t.as.lead.post(`/api/products/${id}/facts`).send(density(9.5)).expect(201)).body as Fact
      expect((await read('products', id)).facts.map((fact) => fact.id)).toEqual([second.id])
      const [ended] = await t.db.select().from(propertyValues).where(eq(propertyValues.id, first.id))
      expect(ended?.endedAt).not.toBeNull()
      expect((await trail(id)).at(-1)).toMatchObject({
        action: 'value-set',
        personId: t.ids.lead,
        from: { property: 'density', value: { max: 9.4 }, origin: { kind: 'entered' } },
        to: { value: { max: 9.5 } },
      })
    })

    it('that repeat stand side by side in the order they were put in, the same one never twice', async () => {
      const [a, b] = await two()
      const { id } = await addMix([a!, b!])
      for (const [minutes, at] of [
        [35, 60],
        [25, 75],
        [18, 90],
      ] as const)
        await t.as.lead.post(`/api/mixes/${id}/facts`).send(potLife(minutes, at)).expect(201)
      const again = await t.as.lead.post(`/api/mixes/${id}/facts`).send(potLife(25, 75)).expect(409)
      expect(again.body.error.code).toBe('duplicate')
      expect((await read('mixes', id)).facts.map(({ at }) => at?.temperature?.value)).toEqual([60, 75, 90])
    })

    it('are amended in their place, and removed, each with its row in the trail', async () => {
      const [a, b] = await two()
      const { id } = await addMix([a!, b!])
      const cells: Fact[] = []
      for (const [minutes, at] of [
        [35, 60],
        [25, 75],
        [18, 90],
      ] as const)
        cells.push((await t.as.lead.post(`/api/mixes/${id}/facts`).send(potLife(minutes, at)).expect(201)).body as Fact)
      const { body } = await t.as.lead.put(`/api/facts/${cells[1]!.id}`).send(potLife(27, 75)).expect(200)
      expect((await read('mixes', id)).facts.map(({ value }) => (value as { min: number }).min)).toEqual([35, 27, 18])
      await t.as.lead.delete(`/api/facts/${body.id}`).expect(204)
      expect((await read('mixes', id)).facts).toHaveLength(2)
      expect((await trail(id)).slice(-2)).toMatchObject([
        { action: 'value-amended', from: { value: { min: 25 } }, to: { value: { min: 27 } } },
        { action: 'value-removed', from: { value: { min: 27 }, origin: { reason: 'Maker’s letter of 3 May' } }, to: null },
      ])
    })

    it('that someone has amended or removed meanwhile are told as a conflict', async () => {
      const { id } = await addProduct()
      const first = (await t.as.lead.post(`/api/products/${id}/facts`).send(density(9.4)).expect(201)).body as Fact
      await t.as.lead.put(`/api/facts/${first.id}`).send(density(9.5)).expect(200)
      expect((await t.as.lead.put(`/api/facts/${first.id}`).send(density(9.6)).expect(409)).body.error.code).toBe('conflict')
      await t.as.lead.delete(`/api/facts/${first.id}`).expect(409)
      expect((await read('products', id)).facts).toMatchObject([{ value: { max: 9.5 } }])
    })

    it('stay of one property when amended, and one a part', async () => {
      const [a, b] = await two()
      const { id } = await addMix([a!, b!])
      const of = (value: number, part: string) => ({ ...density(value), statement: { ...density(value).statement, part } })
      const partA = (await t.as.lead.post(`/api/mixes/${id}/facts`).send(of(9.4, 'A')).expect(201)).body as Fact
      await t.as.lead.post(`/api/mixes/${id}/facts`).send(of(8.3, 'B')).expect(201)
      expect((await t.as.lead.put(`/api/facts/${partA.id}`).send(potLife(25, 75)).expect(422)).body.error.fields).toHaveProperty([
        'statement.property',
      ])
      expect((await t.as.lead.put(`/api/facts/${partA.id}`).send(of(9.4, 'B')).expect(422)).body.error.fields).toHaveProperty([
        'statement.part',
      ])
      expect((await read('mixes', id)).facts.map(({ part }) => part)).toEqual(['A', 'B'])
    })

    it('of two people at the same moment leave one', async () => {
      const { id } = await addProduct()
      const both = await Promise.all([9.4, 9.5].map((value) => t.as.lead.post(`/api/products/${id}/facts`).send(density(value))))
      expect(both.map(({ status }) => status)).toEqual([201, 201])
      expect((await read('products', id)).facts).toHaveLength(1)
    })

    it('cite the revision they were read on, while the record shows the one in force', async () => {
      const { id } = await addProduct()
      const { sheetId, revisionId } = await addSheet({ productId: id })
      await t.as.lead
        .post(`/api/products/${id}/facts`)
        .send(density(9.4, { kind: 'stated', revisionId, page: 1, box: null, quote: null }))
        .expect(201)
      const newer = await addRevision(sheetId, { sequence: 2, revisionDate: '2026-02-01' })
      const record = await read('products', id)
      expect(record.sheets).toMatchObject([{ id: sheetId, revisionId: newer, revisionDate: '2026-02-01', superseded: false }])
      expect(record.facts[0]?.origin).toMatchObject({ citation: { revisionId, revisionDate: '2025-03' } })
    })
  })

  describe('lists', () => {
    beforeAll(async () => {
      const fill: [string, string, string, string][] = [
        ['Corbel 20-40 mesh quartz', 'Corbel', 'aggregate', 'silica'],
        ['Teasel Scald 6, component B', 'Teasel', 'hardener', 'urethane cement'],
        ['teasel Swift 90', 'Teasel', 'resin', 'polyaspartic'],
        ['Brindle 100 % plain_wax', 'Corbel', 'additive', 'other'],
      ]
      for (const [name, maker, kind, chemistry] of fill) await addProduct({ name, maker, kind, chemistry })
    })

    it('find by name, maker, kind and chemistry, words in any order, letters wrong', async () => {
      for (const q of ['quartz', 'QUARTZ', 'quarz', 'qaurtz corbel', 'mesh aggregate', 'corbel silica', '20-40'])
        expect((await names('products', { q }))[0], q).toBe('Corbel 20-40 mesh quartz')
      for (const q of ['urethane cement', 'uretane', 'scald hardner', 'tesel scald'])
        expect(await names('products', { q }), q).toContain('Teasel Scald 6, component B')
      expect(await names('products', { q: 'zzzzzz' })).toEqual([])
    })

    it('take marks of patterns as they are typed', async () => {
      expect(await names('products', { q: '100 % plain_wax' })).toEqual(['Brindle 100 % plain_wax'])
      for (const q of ['%', '_wax', '100 %'])
        expect(
          (await names('products', { q })).every((name) => name.includes('%') || name.includes('_')),
          q,
        ).toBe(true)
      expect(await names('products', { q: '100\\' })).toEqual([])
      for (const q of ["' or 1=1 --", '"', '((', '<%']) await find('products', { q })
    })

    it('find by CAS number and hazard code, exactly, as soon as the value is there and no longer than it is', async () => {
      const { id, name } = await addProduct({ kind: 'hardener' })
      const fact = {
        statement: { property: 'ingredient', value: { name: 'Isophorone diamine', cas: '2855-13-2', min: 10, max: 30, unit: '%' } },
        how: entered,
      }
      const { body } = await t.as.lead.post(`/api/products/${id}/facts`).send(fact).expect(201)
      await t.as.lead
        .post(`/api/products/${id}/facts`)
        .send({ statement: { property: 'hazardStatements', value: { codes: ['H314', 'H412'] } }, how: entered })
        .expect(201)
      const mix = await addMix([(await addProduct()).id, id])
      for (const q of ['2855-13-2', 'h412', 'H314 hardener', 'isophorone', 'isoforone'])
        expect(await names('products', { q }), q).toEqual([name])
      expect(await names('products', { q: '2855-13-3' })).toEqual([])
      expect(await names('mixes', { q: '2855-13-2' })).toEqual([mix.name])
      expect(await names('mixes', { q: name })).toContain(mix.name)
      await t.as.lead.delete(`/api/facts/${body.id}`).expect(204)
      expect(await names('products', { q: '2855-13-2' })).toEqual([])
      expect(await names('mixes', { q: '2855-13-2' })).toEqual([])
      await t.as.lead.patch(`/api/products/${id}`).send({ version: 1, name: 'Brambling' }).expect(200)
      expect(await names('mixes', { q: 'brambling' })).toEqual([mix.name])
    })

    it('filter, sort either way without regard to capitals, and page', async () => {
      expect(await names('products', { maker: 'Teasel', sort: 'name', chemistry: 'polyaspartic' })).toEqual(['teasel Swift 90'])
      expect((await find('products', { kind: 'aggregate' })).items.every(({ kind }) => kind === 'aggregate')).toBe(true)
      expect((await find('products', { status: 'withdrawn' })).items.every(({ status }) => status === 'withdrawn')).toBe(true)
      const up = await names('products', { maker: 'Teasel', sort: 'name' })
      expect(up.map((name) => name.toLowerCase())).toEqual([...up.map((name) => name.toLowerCase())].sort())
      expect(await names('products', { maker: 'Teasel', sort: '-name' })).toEqual([...up].reverse())
      const whole = await find('products', { sort: 'updatedAt', limit: 200 })
      const seen: string[] = []
      let cursor: string | undefined
      do {
        const page = await find('products', { sort: 'updatedAt', limit: 7, ...(cursor ? { cursor } : {}) })
        seen.push(...page.items.map(({ id }) => id))
        expect(page.total).toBe(whole.total)
        cursor = page.nextCursor ?? undefined
      } while (cursor)
      expect(seen).toEqual(whole.items.map(({ id }) => id))
      for (const query of [{ sort: 'price' }, { kind: 'paint' }, { status: 'gone' }, { limit: 0 }, { cursor: '../x' }])
        await t.as.lead.get('/api/products').query(query).expect(400)
    })

    it('name makers, each once', async () => {
      const { body } = await t.as.estimator.get('/api/makers').expect(200)
      expect(body.items).toEqual(expect.arrayContaining(['Corbel', 'Ostrel', 'Teasel']))
      expect(new Set(body.items).size).toBe(body.items.length)
    })

    it('are exported whole as CSV, as searched and filtered, with no formula in any cell', async () => {
      await addProduct({ name: '=HYPERLINK("http://x.example")', maker: '@Corbel', kind: 'filler' })
      const answer = await t.as.estimator.get('/api/products.csv').query({ kind: 'filler', q: 'hyperlink' }).expect(200)
      expect(answer.headers['content-type']).toBe('text/csv; charset=utf-8')
      expect(answer.headers['content-disposition']).toBe('attachment; filename=products.csv')
      const [heading, row, end] = answer.text.split('\r\n')
      expect(heading).toBe('id,name,maker,kind,chemistry,standing,values,sheets,changed')
      expect(row).toMatch(/^[0-9a-f-]{36},"'=HYPERLINK\(""http:\/\/x\.example""\)",'@Corbel,filler,epoxy,active,0,0,\d{4}-/)
      expect(end).toBe('')
      const mixes = await t.as.estimator.get('/api/mixes.csv').expect(200)
      expect(mixes.text.split('\r\n')).toHaveLength((await find('mixes', {})).total + 2)
      await t.as.crew.get('/api/products.csv').expect(403)
      await t.as.lead.get('/api/products.csv').query({ sort: 'price' }).expect(400)
    })
  })

  it('gives many mixes and products with their facts to those who build on them, and leaves out what is not there', async () => {
    const [a, b] = await two()
    const made = await Promise.all([addMix([a!, b!]), addMix([a!, b!])])
    const ids = [...made.map(({ id }) => id), randomUUID()]
    const facts = await readMixFacts(t.db, ids)
    expect(Object.keys(facts).sort()).toEqual(made.map(({ id }) => id).sort())
    expect(await readProductFacts(t.db, [])).toEqual({})
  })
})
