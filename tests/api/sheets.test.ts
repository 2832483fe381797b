import { randomBytes } from 'node:crypto'
import { mkdtempSync, readFileSync, readdirSync, rmSync, writeFileSync } from 'node:fs'
import { type AddressInfo, connect } from 'node:net'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { buildUpVersions, buildUps, courses } from '../../server/db/schema/build-ups.ts'
import { mixParts, mixes, products, sheetSubjects } from '../../server/db/schema/catalogue.ts'
import { jobPeople, jobs } from '../../server/db/schema/jobs.ts'
import { type TestApp, testApp, testPassword } from '../setup/app.ts'
import { makePdf } from '../setup/pdf.ts'

const sample = (name: string) => join(import.meta.dirname, '../../fixtures/sample-sheets', name)
/** Made with qpdf 11: `--encrypt PASSWORD owner 256`, with an empty password for the second. */
const locked = (name: string) => join(import.meta.dirname, '../../fixtures/locked-sheets', name)
const scratch = mkdtempSync(join(tmpdir(), 'wearcourse-pdf-'))
afterAll(() => rmSync(scratch, { recursive: true, force: true }))
const onePage = (line: string) => makePdf([{ lines: [line] }])

/** A job of the crew's, laid with a mix of one product, which the sheet speaks of; the same in the sand of another course. */
async function putOnFloor({ db, ids }: TestApp, { sheetId }: { sheetId: string }): Promise<void> {
  await db.transaction(async (tx) => {
    const [product] = await tx
      .insert(products)
      .values({ name: 'Ostrel Prime A', maker: 'Ostrel', kind: 'resin', chemistry: 'epoxy' })
      .returning()
    const [mix] = await tx.insert(mixes).values({ name: 'Ostrel Prime', maker: 'Ostrel', chemistry: 'epoxy', color: '#c08040' }).returning()
    await tx.insert(mixParts).values({ mixId: mix!.id, part: 'A', productId: product!.id })
    await tx.insert(sheetSubjects).values({ sheetId, productId: product!.id })
    const [buildUp] = await tx.insert(buildUps).values({ name: 'Floor of one coat' }).returning()
    const conditions = {
      slabTemperature: { value: 70, unit: '°F' as const },
      airTemperature: { value: 70, unit: '°F' as const },
      relativeHumidity: 50,
      substrateRelativeHumidity: null,
      moistureEmission: null,
      vocPlace: null,
    }
    const [version] = await tx
      .insert(buildUpVersions)
      .values({ buildUpId: buildUp!.id, number: 1, status: 'released', conditions })
      .returning()
    const course = {
      id: 'c1',
      stage: 'prime' as const,
      title: 'Primer',
      mixId: mix!.id,
      thickness: null,
      spreadRate: null,
      filler: null,
      broadcast: null,
      preparation: null,
      startsAfter: null,
      note: '',
    }
    await tx.insert(courses).values({ versionId: version!.id, courseId: 'c1', position: 0, stage: 'prime', mixId: mix!.id, course })
    const [job] = await tx
      .insert(jobs)
      .values({ name: 'Filling hall', buildUpVersionId: version!.id, conditions: conditions as never, loss: {} as never, timeZone: 'UTC' })
      .returning()
    await tx.insert(jobPeople).values({ jobId: job!.id, personId: ids.crew })
  })
}

describe('sheets', () => {
  let t: TestApp
  beforeAll(async () => {
    t = await testApp()
  }, 60_000)
  const upload = (bytes: Buffer | string, name = 'sheet.pdf', fields: Record<string, string> = {}) => {
    const request = t.as.lead.post('/api/sheets')
    for (const [key, value] of Object.entries(fields)) void request.field(key, value)
    return request.attach('files', bytes, name)
  }
  const left = () => readdirSync(join(t.dataDir, 'incoming'))

  it('keeps an uploaded data sheet with its pages, words and what the text suggests', async () => {
    const { body } = await upload(sample('data-1.pdf'), 'Märlstone Prime 14.pdf').expect(200)
    const [file] = body.files
    expect(file).toMatchObject({
      outcome: 'added',
      fileName: 'Märlstone Prime 14.pdf',
      suggestion: { kind: 'data', title: 'Marlstone Prime 14', revisionDate: '2024-05-06' },
    })
    expect(file.sheet.revisions[0]).toMatchObject({
      pages: 1,
      state: 'ready',
      revisionDate: null,
      suggestedDate: '2024-05-06',
      superseded: false,
      uploadedByName: 'Test lead',
    })
    const { body: page } = await t.as.estimator.get(`/api/sheet-revisions/${file.revisionId}/pages/1`).expect(200)
    expect(page).toMatchObject({ width: 612, height: 792, rotation: 0 })
    expect(page.words.length).toBeGreaterThan(150)
    expect(left()).toEqual([])
  })

  it('recognises the same bytes and names the sheet that holds them', async () => {
    const { body: first } = await upload(onePage('Twice'), 'a.pdf').expect(200)
    const { body } = await upload(onePage('Twice'), 'b.pdf').expect(200)
    expect(body.files).toEqual([
      { outcome: 'duplicate', fileName: 'b.pdf', revisionId: first.files[0].revisionId, sheetId: first.files[0].sheet.id, title: 'Twice' },
    ])
    expect(left()).toEqual([])
  })

  it('takes the same file twice in one request as one sheet and one duplicate', async () => {
    const { body } = await upload(onePage('Thrice'), 'a.pdf').attach('files', onePage('Thrice'), 'b.pdf').expect(200)
    expect(body.files.map((file: { outcome: string }) => file.outcome).sort()).toEqual(['added', 'duplicate'])
  })

  it('answers for each file of many', async () => {
    const { body } = await upload(onePage('One of many'), 'one.pdf')
      .attach('files', Buffer.from('no pdf'), 'two.pdf')
      .attach('files', sample('safety-2.pdf'), 'three.pdf')
      .expect(200)
    expect(body.files.map((file: { outcome: string; code?: string }) => file.code ?? file.outcome)).toEqual(['added', 'not-a-pdf', 'added'])
    expect(body.files[2].suggestion.kind).toBe('safety')
    expect(left()).toEqual([])
  })

  describe('refuses, with a clear answer and nothing left behind', () => {
    const png = Buffer.concat([Buffer.from('89504e470d0a1a0a', 'hex'), randomBytes(2000)])
    const whole = readFileSync(sample('data-2.pdf'))
    const cases: { title: string; code: string; bytes: () => Buffer; name?: string }[] = [
      { title: 'random bytes', code: 'not-a-pdf', bytes: () => randomBytes(5000) },
      { title: 'an empty file', code: 'not-a-pdf', bytes: () => Buffer.alloc(0) },
      { title: 'a picture under the name of a PDF', code: 'not-a-pdf', bytes: () => png },
      { title: 'a PDF under the name of a picture', code: 'not-a-pdf', bytes: () => whole, name: 'sheet.png' },
      {
        title: 'a file that only begins like a PDF',
        code: 'damaged',
        bytes: () => Buffer.concat([Buffer.from('%PDF-1.7\n'), randomBytes(4000)]),
      },
      { title: 'a PDF cut in the middle', code: 'damaged', bytes: () => whole.subarray(0, whole.length / 2) },
      { title: 'a PDF without pages', code: 'damaged', bytes: () => makePdf([]) },
      { title: 'a PDF of 1,001 pages', code: 'too-large', bytes: () => makePdf(Array.from({ length: 1001 }, () => ({}))) },
    ]
    it.each(cases)('$title: $code', async ({ code, bytes, name }) => {
      const { body } = await upload(bytes(), name).expect(code === 'too-large' ? 413 : 422)
      expect(body.error.code).toBe(code)
      expect(left()).toEqual([])
    })

    it('one that needs a password, and reads one that only its owner locked', async () => {
      const { body } = await upload(locked('needs-a-password.pdf')).expect(422)
      expect(body.error.code).toBe('encrypted')
      const { body: owned } = await upload(locked('locked-by-its-owner.pdf')).expect(200)
      expect(owned.files[0]).toMatchObject({ outcome: 'added', suggestion: { title: 'Teasel Sealer 5' } })
      expect(left()).toEqual([])
    })

    it('a file over 25 MB', async () => {
      const path = join(scratch, 'large.pdf')
      writeFileSync(path, Buffer.concat([onePage('Large'), Buffer.alloc(25 * 1024 * 1024)]))
      const { body } = await upload(path).expect(413)
      expect(body.error).toEqual({ code: 'too-large', message: 'This file is larger than 25 MB.' })
      expect(left()).toEqual([])
    })

    it('an upload that its sender breaks off', async () => {
      const server = t.app.listen(0)
      const { port } = server.address() as AddressInfo
      const signIn = {
        method: 'POST',
        headers: { 'Content-Type': 'application/json' },
        body: JSON.stringify({ email: 'lead@brackenholt.example', password: testPassword }),
      }
      const [cookie = ''] = (await fetch(`http://127.0.0.1:${port}/api/session`, signIn)).headers
        .getSetCookie()
        .map((line) => line.split(';')[0])
      const socket = connect(port, '127.0.0.1')
      const head = [
        'POST /api/sheets HTTP/1.1',
        `Host: 127.0.0.1:${port}`,
        `Cookie: ${cookie}`,
        'Content-Type: multipart/form-data; boundary=b',
        'Content-Length: 9000000',
        '',
        '',
      ]
      socket.write(`${head.join('\r\n')}--b\r\nContent-Disposition: form-data; name="files"; filename="x.pdf"\r\n\r\n%PDF-1.7\n`)
      socket.write(Buffer.alloc(500_000, 0x20))
      await expect.poll(() => left().length).toBe(1)
      socket.destroy()
      await expect.poll(left).toEqual([])
      server.close()
    })

    it('what is no upload: JSON, no file, a strange field, a body cut short', async () => {
      await t.as.lead.post('/api/sheets').send({ files: [] }).expect(415)
      const { body } = await t.as.lead.post('/api/sheets').field('kind', 'data').expect(422)
      expect(body.error.fields).toEqual({ files: 'Choose at least one PDF.' })
      await upload(onePage('x'), 'x.pdf', { colour: 'red' }).expect(422)
      await upload(onePage('x'), 'x.pdf', { kind: 'poem' }).expect(422)
      await upload(onePage('x'), 'x.pdf', { sheetId: '00000000-0000-4000-8000-000000000000' }).expect(404)
      const cut = '--b\r\nContent-Disposition: form-data; name="files"; filename="x.pdf"\r\n\r\n%PDF-1.7'
      await t.as.lead.post('/api/sheets').set('Content-Type', 'multipart/form-data; boundary=b').send(cut).expect(400)
      await t.as.lead.post('/api/sheets').set('Content-Type', 'multipart/form-data').send('x').expect(400)
      await expect.poll(left).toEqual([])
    })
  })

  it('keeps a PDF of pictures alone and says that nothing can be read from it', async () => {
    const { body } = await upload(makePdf([{}, {}]), 'scan.pdf').expect(200)
    expect(body.files[0]).toMatchObject({ outcome: 'added', suggestion: { kind: 'data', title: 'scan', revisionDate: null } })
    expect(body.files[0].sheet.revisions[0]).toMatchObject({ state: 'no-text', pages: 2 })
  })

  it('takes PDFs with scripts and embedded files as paper: nothing in them runs', async () => {
    const script = makePdf([{ lines: ['With a script'] }], {
      catalog: '/OpenAction 3 0 R /Names << /JavaScript << /Names [(a) 3 0 R] >> >>',
      objects: ["<< /S /JavaScript /JS (app.alert('x'); while (true) {}) >>"],
    })
    const embedded = makePdf([{ lines: ['With a file inside'] }], {
      catalog: '/Names << /EmbeddedFiles << /Names [(a.exe) 3 0 R] >> >>',
      objects: ['<< /Type /Filespec /F (a.exe) /EF << /F 4 0 R >> >>', '<< /Type /EmbeddedFile /Length 3 >>\nstream\nMZx\nendstream'],
    })
    for (const bytes of [script, embedded]) expect((await upload(bytes).expect(200)).body.files[0].outcome).toBe('added')
    await t.as.nobody.get('/api/health').expect(200)
  })

  it('cleans the names of files', async () => {
    const { body } = await upload(onePage('Named'), '../../etc/\u202epasswd<1>.PDF').expect(200)
    expect(body.files[0].fileName).toBe('passwd_1_.pdf')
  })

  it('adds a revision to a sheet; the later date is in force whatever the order of upload', async () => {
    const { body: newer } = await upload(onePage('Revised 2025'), 'new.pdf', {
      title: 'Ostrel Sealer 3',
      kind: 'data',
      revisionDate: '2025-03-01',
    }).expect(200)
    const sheetId = newer.files[0].sheet.id
    const { body: older } = await upload(onePage('Revised 2022'), 'old.pdf', { sheetId, revisionDate: '2022-02' }).expect(200)
    expect(
      older.files[0].sheet.revisions.map((revision: { revisionDate: string; superseded: boolean }) => [
        revision.revisionDate,
        revision.superseded,
      ]),
    ).toEqual([
      ['2025-03-01', false],
      ['2022-02', true],
    ])
    const { body: list } = await t.as.lead.get('/api/sheets?standing=superseded&q=sealer').expect(200)
    expect(list.items).toHaveLength(1)
    expect(list.items[0]).toMatchObject({ revisionId: older.files[0].revisionId, superseded: true, revisions: 2 })
  })

  it('makes an upload a revision of a sheet that was there, and the emptied sheet goes', async () => {
    const { body: a } = await upload(onePage('Sheet A'), 'a1.pdf', { title: 'Teasel Fill 20' }).expect(200)
    const { body: b } = await upload(onePage('Sheet B'), 'b1.pdf', { title: 'Teasel Fill 20 rev 2' }).expect(200)
    expect(b.files[0].alike.map((sheet: { title: string }) => sheet.title)).toContain('Teasel Fill 20')
    const { body: moved } = await t.as.lead
      .put(`/api/sheet-revisions/${b.files[0].revisionId}/sheet`)
      .send({ sheetId: a.files[0].sheet.id })
      .expect(200)
    expect(moved.revisions).toHaveLength(2)
    await t.as.lead.get(`/api/sheets/${b.files[0].sheet.id}`).expect(404)
    await t.as.estimator.put(`/api/sheet-revisions/${b.files[0].revisionId}/sheet`).send({ sheetId: a.files[0].sheet.id }).expect(403)
  })

  it('changes title, kind, maker and dates; a stale version is a conflict; each change is in the trail', async () => {
    const { body } = await upload(onePage('To change'), 'c.pdf').expect(200)
    const { sheet, revisionId } = body.files[0]
    const change = {
      version: sheet.version,
      kind: 'safety',
      title: 'Corbel Hardener',
      maker: 'Corbel',
      subjects: [],
      dates: [{ revisionId, revisionDate: '2023-11' }],
    }
    const { body: changed } = await t.as.lead.put(`/api/sheets/${sheet.id}`).send(change).expect(200)
    expect(changed).toMatchObject({
      kind: 'safety',
      title: 'Corbel Hardener',
      version: 2,
      revisions: [{ revisionDate: '2023-11', suggestedDate: null }],
    })
    await t.as.lead.put(`/api/sheets/${sheet.id}`).send(change).expect(409)
    const bad = { ...change, version: 2, title: ' ', dates: [{ revisionId, revisionDate: '2023-02-30' }] }
    const { body: refused } = await t.as.lead.put(`/api/sheets/${sheet.id}`).send(bad).expect(422)
    expect(Object.keys(refused.error.fields).sort()).toEqual(['dates.0.revisionDate', 'title'])
    const { body: trail } = await t.as.lead.get(`/api/audit?subjectKind=sheet&subjectId=${sheet.id}`).expect(200)
    expect(trail.items.map((item: { action: string }) => item.action)).toEqual(['changed', 'revision-added', 'added'])
  })

  it('finds sheets in spite of a typo, by title, maker and file name, and filters by kind and age', async () => {
    await upload(onePage('Aged'), 'quarzin_slurry_tds.pdf', {
      title: 'Quarzin slurry',
      maker: 'Ostrel',
      kind: 'data',
      revisionDate: '2019-06',
    }).expect(200)
    for (const q of ['quarzin', 'quartzin slury', 'ostrel quarzin', 'slurry tds']) {
      const { body } = await t.as.estimator.get('/api/sheets').query({ q }).expect(200)
      expect(
        body.items.map((row: { title: string }) => row.title),
        q,
      ).toContain('Quarzin slurry')
    }
    const { body: beyond } = await t.as.lead.get('/api/sheets?age=beyond&kind=data&sort=revisionDate').expect(200)
    expect(beyond.items.map((row: { title: string }) => row.title)).toEqual(['Quarzin slurry'])
    const { body: page } = await t.as.lead.get('/api/sheets?limit=2&sort=-uploadedAt').expect(200)
    expect(page.items).toHaveLength(2)
    const { body: next } = await t.as.lead.get(`/api/sheets?limit=2&sort=-uploadedAt&cursor=${page.nextCursor}`).expect(200)
    expect(next.items[0].revisionId).not.toBe(page.items[0].revisionId)
  })

  it('sends the file to be saved, whole or in ranges, and never as a page of this site', async () => {
    const bytes = onePage('Download')
    const { body } = await upload(bytes, 'Höhe 1.pdf').expect(200)
    const path = `/api/sheet-revisions/${body.files[0].revisionId}/file`
    const whole = await t.as.lead.get(path).buffer(true).expect(200)
    expect(whole.body).toEqual(bytes)
    expect(whole.headers).toMatchObject({
      'content-type': 'application/pdf',
      'x-content-type-options': 'nosniff',
      'content-security-policy': "sandbox; default-src 'none'",
      'accept-ranges': 'bytes',
      'content-disposition': `attachment; filename="Hohe 1.pdf"; filename*=UTF-8''H%C3%B6he%201.pdf`,
    })
    const part = await t.as.lead.get(path).set('Range', 'bytes=0-4').expect(206)
    expect(String(part.body)).toBe('%PDF-')
    expect(part.headers['content-range']).toBe(`bytes 0-4/${bytes.length}`)
    const tail = await t.as.lead.get(path).set('Range', 'bytes=-6').expect(206)
    expect(String(tail.body)).toBe('%%EOF\n')
    await t.as.lead.get(path).set('Range', `bytes=${bytes.length}-`).expect(416)
    await t.as.lead.get(path).set('If-None-Match', String(whole.headers['etag'])).expect(304)
  })

  it('finds a phrase on every page, across spaces and dashes, with its boxes', async () => {
    const { body } = await upload(
      makePdf([
        { lines: ['Pot life 25\u201330 min'.replace('\u2013', '-')] },
        { lines: ['nothing'] },
        { lines: ['the pot', 'life again'] },
      ]),
      'search.pdf',
    ).expect(200)
    const path = `/api/sheet-revisions/${body.files[0].revisionId}/hits`
    const { body: found } = await t.as.lead.get(path).query({ q: 'POT  life' }).expect(200)
    expect(found.hits.map((hit: { page: number }) => hit.page)).toEqual([1, 3])
    expect(found.hits[1].boxes).toHaveLength(2)
    const [left0, top] = found.hits[0].boxes[0]
    expect(left0).toBeCloseTo(72, 0)
    expect(top).toBeGreaterThan(792 - 720 - 14)
    await t.as.lead.get(path).query({ q: '' }).expect(400)
  })

  it('shows a crew only the sheets of its jobs, and no list', async () => {
    const { body } = await upload(onePage('Not theirs'), 'n.pdf').expect(200)
    const { revisionId, sheet } = body.files[0]
    await t.as.crew.get('/api/sheets').expect(403)
    for (const path of [
      `/api/sheets/${sheet.id}`,
      `/api/sheet-revisions/${revisionId}`,
      `/api/sheet-revisions/${revisionId}/file`,
      `/api/sheet-revisions/${revisionId}/pages/1`,
      `/api/sheet-revisions/${revisionId}/hits?q=a`,
    ]) {
      await t.as.crew.get(path).expect(404)
      await t.as.nobody.get(path).expect(401)
      await t.as.estimator.get(path).expect(200)
    }
    await putOnFloor(t, { sheetId: sheet.id })
    await t.as.crew.get(`/api/sheets/${sheet.id}`).expect(200)
    await t.as.crew.get(`/api/sheet-revisions/${revisionId}/file`).expect(200)
    await t.as.crew.post('/api/sheets').attach('files', onePage('x'), 'x.pdf').expect(403)
    await t.as.estimator.post('/api/sheets').attach('files', onePage('x'), 'x.pdf').expect(403)
  })
})
