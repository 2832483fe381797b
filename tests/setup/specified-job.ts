import { randomUUID } from 'node:crypto'
import type { BuildUp } from '../../shared/api/build-ups.ts'
import type { Job } from '../../shared/api/jobs.ts'
import type { Course } from '../../shared/domain/build-up.ts'
import { newCourse, reasonKey } from '../../shared/domain/course.ts'
import { evaluate } from '../../shared/domain/evaluate.ts'
import type { TestApp } from './app.ts'
import { addMix, addProduct } from './floor-facts.ts'

/** A job of two bays on a released floor of two resin coats with a broadcast: built through the API, invented throughout. */
export async function specifiedJob(t: TestApp, name = 'Filling hall'): Promise<Job> {
  const [prime, top] = [
    await addMix(t.db, 'Ostrel 110', { color: '#cbb98e' }),
    await addMix(t.db, 'Ostrel 220', { color: '#3f4a4d', without: ['footTraffic'] }),
  ]
  const sand = await addProduct(t.db, 'Teasel 40-mesh silica', { kind: 'aggregate', density: 22.1 })
  const courses: Course[] = [
    { ...newCourse('prep', 'a'), preparation: { method: 'grinding', profile: 3 } },
    { ...newCourse('prime', 'b'), mixId: prime, spreadRate: { value: 150, unit: 'ft²/gal' } },
    {
      ...newCourse('top', 'c'),
      mixId: top,
      thickness: { value: 12, unit: 'mil', film: 'wet' },
      broadcast: { productId: sand, rate: { value: 0.4, unit: 'lb/ft²' }, toRefusal: true },
    },
  ]
  const made = (await t.as.lead.post('/api/build-ups').send({ name: 'Two coats with sand', stages: [] }).expect(201)).body as BuildUp
  const place = `/api/build-ups/${made.id}/versions/1`
  const conditions = { ...made.opened.input.conditions, substrateRelativeHumidity: 75, vocPlace: 'us-national' }
  await t.as.lead.put(place).send({ version: 1, courses, conditions }).expect(200)
  const draft = (await t.as.lead.get(`/api/build-ups/${made.id}`).expect(200)).body as BuildUp
  const open = evaluate(draft.opened.input).findings.filter(({ status }) => status !== 'met')
  const reasons = Object.fromEntries(open.map((finding) => [reasonKey(finding), 'Agreed with the client on site.']))
  const { opened } = (await t.as.lead.post(`${place}/release`).send({ version: draft.opened.version, reasons }).expect(200)).body as BuildUp
  const body = {
    name,
    client: 'Quillwater Bottling',
    site: 'Filling hall, north side',
    status: 'open',
    buildUpVersionId: opened.id,
    conditions: { ...conditions, texture: null },
    loss: { percent: 5, convention: 'lost' },
    startsAt: null,
    timeZone: 'America/Chicago',
    crewIds: [],
    bays: [5000, 2350].map((area, index) => ({
      id: randomUUID(),
      name: `Bay ${index + 1}`,
      area: { value: area, unit: 'ft²' },
      joints: [],
      spalls: null,
    })),
  }
  return (await t.as.estimator.post('/api/jobs').send(body).expect(201)).body as Job
}
