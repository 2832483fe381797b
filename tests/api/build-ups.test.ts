import { eq } from 'drizzle-orm'
import { beforeAll, describe, expect, it } from 'vitest'
import type { BuildUp } from '../../shared/api/build-ups.ts'
import type { Course, EvaluationInput } from '../../shared/domain/build-up.ts'
import { newCourse, reasonKey } from '../../shared/domain/course.ts'
import { evaluate } from '../../shared/domain/evaluate.ts'
import { readBuildUp, readReleasedVersion } from '../../server/features/build-ups/queries.ts'
import { propertyValues } from '../../server/db/schema/catalogue.ts'
import { auditTrail } from '../../server/db/schema/firm.ts'
import { type TestApp, testApp } from '../setup/app.ts'
import { addMix, addProduct } from '../setup/floor-facts.ts'

const nobody = '00000000-0000-4000-8000-000000000000'

describe('build-ups', () => {
  let t: TestApp
  let prime: string
  let top: string
  let sand: string
  beforeAll(async () => {
    t = await testApp()
    prime = await addMix(t.db, 'Ostrel 110', { color: '#cbb98e' })
    top = await addMix(t.db, 'Ostrel 220', { color: '#3f4a4d' })
    sand = await addProduct(t.db, 'Teasel 40-mesh silica', { kind: 'aggregate', density: 22.1 })
  }, 60_000)

  const begin = async (name: string, stages: string[] = []) =>
    (await t.as.lead.post('/api/build-ups').send({ name, stages }).expect(201)).body as BuildUp
  const place = ({ id, opened }: BuildUp) => `/api/build-ups/${id}/versions/${opened.number}`
  const save = (of: BuildUp, courses: Course[], more: object = {}) =>
    t.as.lead.put(place(of)).send({ version: of.opened.version, courses, conditions: of.opened.input.conditions, ...more })
  const read = async ({ id }: BuildUp, version?: number) =>
    (
      await t.as.lead
        .get(`/api/build-ups/${id}`)
        .query(version ? { version } : {})
        .expect(200)
    ).body as BuildUp
  const twoCoats = (): Course[] => [
    { ...newCourse('prep', 'a'), preparation: { method: 'grinding', profile: 3 } },
    { ...newCourse('prime', 'b'), mixId: prime, spreadRate: { value: 150, unit: 'ft²/gal' } },
    { ...newCourse('top', 'c'), mixId: top, thickness: { value: 10, unit: 'mil', film: 'wet' } },
  ]
  const ready = async (name: string, courses = twoCoats(), slabHumidity: number | null = 75) => {
    const made = await begin(name)
    const conditions = {
      ...made.opened.input.conditions,
      substrateRelativeHumidity: slabHumidity,
      moistureEmission: { value: 3, unit: 'lb/1000 ft²·24 h' },
      vocPlace: 'us-national',
    }
    await save(made, courses, { conditions }).expect(200)
    return read(made)
  }
  const reasonsFor = (input: EvaluationInput) =>
    Object.fromEntries(
      evaluate(input)
        .findings.filter(({ status }) => status !== 'met')
        .map((finding) => [reasonKey(finding), 'Agreed with the client on site.']),
    )
  const release = (of: BuildUp, reasons: Record<string, string> = reasonsFor(of.opened.input)) =>
    t.as.lead.post(`${place(of)}/release`).send({ version: of.opened.version, reasons })

  it('begins empty or from a row of stages, bottom up', async () => {
    expect((await begin('Nothing yet')).opened.input.courses).toEqual([])
    const made = await begin('Slurry floor', ['prep', 'fill', 'slurry', 'grind', 'prime', 'top'])
    expect(made.opened.input.courses.map(({ stage }) => stage)).toEqual(['prep', 'fill', 'slurry', 'grind', 'prime', 'top'])
    expect(made.opened).toMatchObject({ number: 1, status: 'draft', version: 1, updatedByName: 'Test lead', evaluation: null })
    expect(new Set(made.opened.input.courses.map(({ id }) => id)).size).toBe(6)
  })

  it('saves a draft whole, counts its edits and gives back the facts it rests on', async () => {
    const made = await begin('Two coats')
    const { body } = await save(made, twoCoats()).expect(200)
    expect(body).toMatchObject({ version: 2, updatedByName: 'Test lead' })
    expect(Object.values(body.findings as Record<string, number>).reduce((sum, one) => sum + one)).toBeGreaterThan(5)
    const { opened } = await read(made)
    expect(opened.input.courses).toEqual(twoCoats())
    expect(Object.keys(opened.input.mixes).sort()).toEqual([prime, top].sort())
    // 1604.17 ft²·mil/gal ÷ 150 ft²/gal = 10.69 mil (231 in³/gal ÷ 144 in²/ft² × 1000 mil/in)
    const wet = evaluate(opened.input).courses[1]?.wetFilm
    expect(wet?.kind === 'computed' && wet.value.min).toBeCloseTo(10.6944, 3)
  })

  it('records each save with what changed, from and to', async () => {
    const made = await ready('Recorded')
    const courses = twoCoats().map((course) => (course.id === 'c' ? { ...course, title: 'Top coat, slate grey' } : course))
    await save(made, courses).expect(200)
    const rows = await t.db.select().from(auditTrail).where(eq(auditTrail.subjectId, made.opened.id))
    expect(rows.at(-1)).toMatchObject({
      personId: t.ids.lead,
      action: 'saved',
      from: { courses: [{ id: 'c', title: 'Top coat' }] },
      to: { courses: [{ id: 'c', title: 'Top coat, slate grey' }] },
    })
  })

  it('tells by name who saved meanwhile, and overwrites neither', async () => {
    const made = await begin('Two people')
    await t.as.estimator.put(place(made)).send({ version: 1, courses: twoCoats(), conditions: made.opened.input.conditions }).expect(200)
    const { body } = await save(made, []).expect(409)
    expect(body.error).toMatchObject({ code: 'conflict', message: 'Test estimator has changed this version meanwhile.' })
    expect((await read(made)).opened.input.courses).toHaveLength(3)
    const kept = await t.as.lead
      .post(`/api/build-ups/${made.id}/versions`)
      .send({ from: 1, work: { courses: twoCoats().slice(0, 1), conditions: made.opened.input.conditions } })
      .expect(201)
    expect(kept.body.opened).toMatchObject({ number: 2, status: 'draft', version: 1 })
    expect(kept.body.opened.input.courses).toHaveLength(1)
  })

  it('names the field that is wrong and writes nothing', async () => {
    const made = await begin('Refused')
    const wrong: [object, string][] = [
      [{ mixId: nobody }, 'courses.0.mixId'],
      [{ filler: { productId: nobody, loading: { value: 10, unit: 'lb/gal' } } }, 'courses.0.filler.productId'],
      [{ filler: { productId: sand, loading: { value: 10, unit: 'mil' } } }, 'courses.0.filler.loading'],
      [{ broadcast: { productId: sand, rate: { value: 0, unit: 'lb/ft²' }, toRefusal: true } }, 'courses.0.broadcast.rate'],
      [{ title: 'a\u0000b' }, 'courses.0.title'],
      [{ title: '' }, 'courses.0.title'],
      [{ startsAfter: -1 }, 'courses.0.startsAfter'],
      [{ thickness: { value: 1, unit: 'mil', film: 'wet' }, spreadRate: { value: 1, unit: 'm²/L' } }, 'courses.0.spreadRate'],
      [{ stage: 'roof' }, 'courses.0.stage'],
      [{ surprise: 1 }, 'courses.0.surprise'],
    ]
    for (const [change, field] of wrong) {
      const { body } = await save(made, [{ ...newCourse('body', 'a'), ...change }]).expect(422)
      expect(Object.keys(body.error.fields)).toContain(field)
    }
    const twice = await save(made, [newCourse('body', 'a'), newCourse('top', 'a')]).expect(422)
    expect(twice.body.error.fields).toHaveProperty('courses')
    const hot = await save(made, [], {
      conditions: { ...made.opened.input.conditions, slabTemperature: { value: 68, unit: 'mil' } },
    }).expect(422)
    expect(hot.body.error.fields).toHaveProperty('conditions.slabTemperature')
    expect((await read(made)).opened).toMatchObject({ version: 1, input: { courses: [] } })
  })

  it('refuses a release that a check stops, and lists the stops', async () => {
    // 25 mil is above the 6–20 mil wet that the sheet allows
    const thick = twoCoats().map((course) =>
      course.id === 'c' ? { ...course, thickness: { value: 25, unit: 'mil' as const, film: 'wet' as const } } : course,
    )
    const made = await ready('Too thick', thick)
    const { body } = await release(made).expect(409)
    expect(body.error.code).toBe('release-refused')
    expect(body.error.fields['film-in-range:c']).toMatch(/25 mil/)
    expect((await read(made)).opened.status).toBe('draft')
  })

  it('asks for a reason for every caution and unknown, and keeps them', async () => {
    const made = await ready(
      'Reasons',
      twoCoats().map((course) => (course.id === 'b' ? { ...course, mixId: null } : course)),
      null,
    )
    const wanted = reasonsFor(made.opened.input)
    expect(evaluate(made.opened.input).findings.map(({ status }) => status)).not.toContain('stop')
    const keys = Object.keys(wanted)
    expect(keys.length).toBeGreaterThan(0)
    const none = await release(made, {}).expect(422)
    expect(none.body.error.code).toBe('reasons-missing')
    expect(Object.keys(none.body.error.fields).sort()).toEqual(keys.sort())
    const blank = await release(made, { ...wanted, [keys[0] ?? '']: '   ' }).expect(422)
    expect(Object.keys(blank.body.error.fields)).toEqual([keys[0]])
    const { body } = await release(made, { ...wanted, 'made-up:b': 'not asked for' }).expect(200)
    expect(body.opened).toMatchObject({ status: 'released', releasedByName: 'Test lead', releaseReasons: wanted })
  })

  it('keeps facts and result of the day of release, whatever the catalogue says later', async () => {
    const made = await ready('Frozen')
    const { body } = await release(made).expect(200)
    const before = (body as BuildUp).opened
    expect(before.evaluation).toEqual(evaluate(before.input))
    const changed = await t.db
      .update(propertyValues)
      .set({ value: { min: 6, max: 8, unit: 'mil' } })
      .where(eq(propertyValues.property, 'filmThickness'))
      .returning({ id: propertyValues.id })
    expect(changed.length).toBeGreaterThan(0)
    const muchLater = t.time.now + 400 * 86_400_000
    try {
      const after = (await readBuildUp(t.db, made.id, { now: muchLater })).opened
      expect(after.evaluation).toEqual(before.evaluation)
      expect(evaluate(after.input)).toEqual(before.evaluation)
      expect((await readReleasedVersion(t.db, after.id, muchLater)).evaluation).toEqual(before.evaluation)
      const draft = (await t.as.lead.post(`/api/build-ups/${made.id}/versions`).send({ from: 1 }).expect(201)).body as BuildUp
      expect(
        evaluate(draft.opened.input).findings.filter(({ checkId, status }) => checkId === 'film-in-range' && status === 'stop'),
      ).toHaveLength(2)
    } finally {
      await t.db
        .update(propertyValues)
        .set({ value: { min: 6, max: 20, unit: 'mil' } })
        .where(eq(propertyValues.property, 'filmThickness'))
    }
  })

  it('supersedes the version released before, and never lets a released one change', async () => {
    const made = await ready('Twice released')
    const first = (await release(made).expect(200)).body as BuildUp
    const refused = await save(first, []).expect(409)
    expect(refused.body.error.message).toBe('This version is no longer a draft. Begin a new draft from it.')
    const second = (await t.as.lead.post(`/api/build-ups/${made.id}/versions`).send({ from: 1 }).expect(201)).body as BuildUp
    const { body } = await release(second).expect(200)
    expect((body as BuildUp).versions.map(({ number, status }) => [number, status])).toEqual([
      [2, 'released'],
      [1, 'superseded'],
    ])
    expect((await read(made, 1)).opened.evaluation).not.toBeNull()
    expect(await readReleasedVersion(t.db, first.opened.id, t.time.now)).toMatchObject({
      status: 'superseded',
      version: 1,
      name: 'Twice released',
    })
    await expect(readReleasedVersion(t.db, nobody, t.time.now)).rejects.toMatchObject({ code: 'invalid' })
  })

  it('does not release an empty build-up, nor one that was saved since', async () => {
    const empty = await begin('Empty')
    expect((await release(empty, {}).expect(422)).body.error.message).toBe('A build-up without courses cannot be released.')
    const made = await ready('Stale')
    await save(made, twoCoats().slice(0, 2)).expect(200)
    expect((await release(made).expect(409)).body.error.code).toBe('conflict')
  })

  it('lets an estimator draft, copy and withdraw a draft, but not release or withdraw what is released', async () => {
    const made = await ready('Estimator’s')
    await t.as.estimator
      .post(`${place(made)}/release`)
      .send({ version: made.opened.version, reasons: {} })
      .expect(403)
    const released = (await release(made).expect(200)).body as BuildUp
    await t.as.estimator
      .post(`${place(released)}/withdraw`)
      .send({ version: released.opened.version })
      .expect(403)
    const copy = (await t.as.estimator.post(`/api/build-ups/${made.id}/copies`).send({ name: 'Adapted', number: 1 }).expect(201))
      .body as BuildUp
    expect(copy).toMatchObject({ name: 'Adapted', opened: { number: 1, status: 'draft', updatedByName: 'Test estimator' } })
    expect(copy.number).not.toBe(made.number)
    expect(copy.opened.input.courses).toEqual(released.opened.input.courses)
    const gone = await t.as.estimator
      .post(`${place(copy)}/withdraw`)
      .send({ version: 1 })
      .expect(200)
    expect(gone.body.opened.status).toBe('withdrawn')
    await t.as.crew.get('/api/build-ups').expect(403)
    await t.as.nobody.get('/api/build-ups').expect(401)
  })

  it('renames with a counter of its own', async () => {
    const made = await begin('Old name')
    await t.as.lead.patch(`/api/build-ups/${made.id}`).send({ name: 'New name', note: 'For the filling hall.', version: 1 }).expect(200)
    await t.as.lead.patch(`/api/build-ups/${made.id}`).send({ name: 'Lost name', note: '', version: 1 }).expect(409)
    expect(await read(made)).toMatchObject({ name: 'New name', note: 'For the filling hall.', version: 2 })
  })

  it('lists by name, number or mix, typing errors and all, with the newest version drawn and summed up', async () => {
    const made = await ready('Brewhouse corridor')
    const find = async (query: object) => (await t.as.estimator.get('/api/build-ups').query(query).expect(200)).body
    for (const q of ['brewhouse', 'brewhuose coridor', `bu-${String(made.number).padStart(3, '0')}`]) {
      expect((await find({ q })).items.map(({ name }: { name: string }) => name)).toContain('Brewhouse corridor')
    }
    const [item] = (await find({ q: 'Brewhouse corridor' })).items
    expect(item).toMatchObject({ courses: 3, newest: { number: 1, status: 'draft' }, released: null, thickness: { kind: 'computed' } })
    expect(item.layers.map(({ stage }: { stage: string }) => stage)).toEqual(['prep', 'prime', 'top'])
    expect(item.layers[1].thickness).toBeCloseTo(10.6944 * 25.4, 1)
    const all = await find({ sort: 'name', limit: 2 })
    const next = await find({ sort: 'name', limit: 2, cursor: all.nextCursor })
    expect([...all.items, ...next.items].map(({ name }: { name: string }) => name)).toEqual(
      (await find({ sort: 'name', limit: 4 })).items.map(({ name }: { name: string }) => name),
    )
    expect(
      (await find({ status: 'released' })).items.every(({ newest }: { newest: { status: string } }) => newest.status === 'released'),
    ).toBe(true)
  })

  it('offers mixes and aggregates to choose, and their facts for a draft at work', async () => {
    const { body } = await t.as.estimator.get('/api/build-ups/choices').query({ q: 'ostrel 22' }).expect(200)
    expect(body.mixes.map(({ name }: { name: string }) => name)).toContain('Ostrel 220')
    expect((await t.as.estimator.get('/api/build-ups/choices').expect(200)).body.aggregates).toEqual([
      { id: sand, name: 'Teasel 40-mesh silica', maker: 'Ostrel' },
    ])
    const facts = await t.as.estimator
      .get('/api/build-ups/facts')
      .query({ mixes: `${prime},${nobody}`, products: sand })
      .expect(200)
    expect(Object.keys(facts.body.mixes)).toEqual([prime])
    expect(facts.body.products[sand].facts.length).toBeGreaterThan(0)
    await t.as.estimator.get('/api/build-ups/facts').query({ mixes: 'x' }).expect(400)
  })

  it('knows of nothing that is not there', async () => {
    await t.as.lead.get(`/api/build-ups/${nobody}`).expect(404)
    await t.as.lead.get('/api/build-ups/not-an-id').expect(404)
    const made = await begin('One version')
    await t.as.lead.get(`/api/build-ups/${made.id}`).query({ version: 7 }).expect(404)
    await t.as.lead
      .put(`/api/build-ups/${made.id}/versions/9`)
      .send({ version: 1, courses: [], conditions: made.opened.input.conditions })
      .expect(404)
  })
})
