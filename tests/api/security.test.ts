import { describe, expect, it } from 'vitest'
import { testApp } from '../setup/app.ts'

const { as } = await testApp()
const secure = await testApp({ publicUrl: 'https://floors.example', withPeople: false, firstLeadCode: 'abc' })

describe('headers of every answer (OWASP ASVS 5.0, chapter 3.4)', () => {
  it('let the page load only what this server ships, and nobody frame it', async () => {
    const { headers } = await as.nobody.get('/api/start').expect(200)
    const policy = headers['content-security-policy'] ?? ''
    for (const part of [
      "default-src 'self'",
      "object-src 'none'",
      "base-uri 'none'",
      "frame-ancestors 'none'",
      "script-src 'self' 'wasm-unsafe-eval'",
    ])
      expect(policy).toContain(part)
    expect(policy).not.toContain("script-src 'unsafe")
    expect(headers['x-content-type-options']).toBe('nosniff')
    expect(headers['referrer-policy']).toBe('no-referrer')
    expect(headers['x-powered-by']).toBeUndefined()
    expect(headers['cache-control']).toBe('no-store')
    expect(headers['content-type']).toBe('application/json; charset=utf-8')
  })
})

describe('a request from another site', () => {
  it.each([
    ['Origin', 'https://elsewhere.example'],
    ['Origin', 'null'],
    ['Sec-Fetch-Site', 'cross-site'],
    ['Sec-Fetch-Site', 'same-site'],
  ])('that changes something is refused: %s %s', async (header, value) => {
    const answer = await as.lead
      .post('/api/people')
      .set(header, value)
      .send({ name: 'A B', email: 'a@b.example', role: 'crew' })
      .expect(403)
    expect(answer.body.error.code).toBe('wrong-origin')
  })
  it('that only reads is not', async () => {
    await as.lead.get('/api/session').set('Sec-Fetch-Site', 'cross-site').expect(200)
  })
  it('our own passes', async () => {
    await as.lead
      .post('/api/people')
      .set('Origin', 'http://localhost:4620')
      .set('Sec-Fetch-Site', 'same-origin')
      .send({ name: 'A B', email: 'a.b@brackenholt.example', role: 'crew' })
      .expect(201)
  })
})

describe('over https', () => {
  it('the browser is told to stay on https, and the cookie is bound to the host', async () => {
    const start = await secure.as.nobody.get('/api/start').expect(200)
    expect(start.headers['strict-transport-security']).toMatch(/max-age=31536000/)
    const body = {
      code: 'abc',
      firmName: 'Brackenholt Floors',
      name: 'Ines',
      email: 'ines@brackenholt.example',
      password: 'three plain words',
    }
    const made = await secure.as.nobody.post('/api/first-lead').set('X-Forwarded-Proto', 'https').send(body).expect(201)
    expect(made.headers['set-cookie']?.[0]).toMatch(/^__Host-wearcourse=.*Path=\/.*HttpOnly.*Secure.*SameSite=Strict/)
  })
})

describe('people and their sessions', () => {
  it('a change of role is in force at once', async () => {
    const { body } = await as.lead.get('/api/people?q=estimator').expect(200)
    const person = body.items[0]
    await as.estimator.get('/api/jobs').expect(200)
    await as.lead.patch(`/api/people/${person.id}`).send({ version: person.version, role: 'crew' }).expect(200)
    await as.estimator.get('/api/jobs').expect(403)
    await as.lead
      .patch(`/api/people/${person.id}`)
      .send({ version: person.version + 1, role: 'estimator' })
      .expect(200)
  })
  it('a disabled person loses all sessions', async () => {
    const { body } = await as.lead.get('/api/people?q=crew@').expect(200)
    const person = body.items[0]
    await as.crew.get('/api/session').expect(200)
    await as.lead.patch(`/api/people/${person.id}`).send({ version: person.version, status: 'disabled' }).expect(200)
    await as.crew.get('/api/session').expect(401)
    const answer = await as.crew.post('/api/session').send({ email: person.email, password: 'quillwater-demo' }).expect(401)
    expect(answer.body.error.code).toBe('wrong-credentials')
  })
  it('the last technical lead cannot be changed away', async () => {
    const { body } = await as.lead.get('/api/people?q=lead@').expect(200)
    const person = body.items[0]
    const answer = await as.lead.patch(`/api/people/${person.id}`).send({ version: person.version, role: 'crew' }).expect(409)
    expect(answer.body.error.code).toBe('in-use')
  })
  it('two people changing the same record are told', async () => {
    const { body } = await as.lead.get('/api/firm').expect(200)
    const firm = { name: 'Brackenholt Floors', address: '', phone: '', sheetAgeLimitYears: 3 }
    await as.lead
      .put('/api/firm')
      .send({ ...firm, version: body.version })
      .expect(200)
    const answer = await as.lead
      .put('/api/firm')
      .send({ ...firm, version: body.version })
      .expect(409)
    expect(answer.body.error.code).toBe('conflict')
  })
  it('asking for a link answers the same for an unknown address', async () => {
    await as.nobody.post('/api/password-links').send({ email: 'lead@brackenholt.example' }).expect(204)
    await as.nobody.post('/api/password-links').send({ email: 'unknown@brackenholt.example' }).expect(204)
  })
})
