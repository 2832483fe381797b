import { describe, expect, it } from 'vitest'
import { testApp, testPassword } from '../setup/app.ts'

const { as, time, mail } = await testApp()

describe('signing in', () => {
  it('tells who is signed in and sets an HttpOnly cookie that other sites cannot send', async () => {
    const answer = await as.nobody.post('/api/session').send({ email: 'LEAD@brackenholt.example', password: testPassword }).expect(200)
    expect(answer.body.user).toMatchObject({ email: 'lead@brackenholt.example', role: 'lead' })
    const cookie = answer.headers['set-cookie']?.[0] ?? ''
    expect(cookie).toMatch(/^wearcourse=/)
    expect(cookie).toContain('HttpOnly')
    expect(cookie).toContain('SameSite=Strict')
  })
  it('answers the same for a wrong password and an unknown address', async () => {
    const wrong = await as.nobody.post('/api/session').send({ email: 'crew@brackenholt.example', password: 'not the password' }).expect(401)
    const unknown = await as.nobody
      .post('/api/session')
      .send({ email: 'nobody@brackenholt.example', password: 'not the password' })
      .expect(401)
    expect(wrong.body).toEqual(unknown.body)
  })
  it('makes the sixth try in a row wait, whoever it is for', async () => {
    for (let i = 0; i < 5; i++)
      await as.nobody.post('/api/session').send({ email: 'x@brackenholt.example', password: 'wrong wrong wrong' }).expect(401)
    await as.nobody.post('/api/session').send({ email: 'x@brackenholt.example', password: 'wrong wrong wrong' }).expect(429)
    time.now += 2000
    await as.nobody.post('/api/session').send({ email: 'x@brackenholt.example', password: 'wrong wrong wrong' }).expect(401)
  })
  it('forgets the session when signed out', async () => {
    await as.crew.get('/api/session').expect(200)
    await as.crew.delete('/api/session').expect(204)
    await as.crew.get('/api/session').expect(401)
  })
})

describe('invitation', () => {
  it('carries a link by mail that works once', async () => {
    await as.lead.post('/api/people').send({ name: 'Odo Pell', email: 'odo@brackenholt.example', role: 'crew' }).expect(201)
    const [newest] = await mail.outbox()
    const token = newest?.text.match(/#(\S+)/)?.[1] ?? ''
    await as.nobody.post('/api/password').send({ token, password: 'three plain words' }).expect(204)
    await as.nobody.post('/api/password').send({ token, password: 'three plain words' }).expect(422)
    await as.nobody.post('/api/session').send({ email: 'odo@brackenholt.example', password: 'three plain words' }).expect(200)
  })
})
