import { execFileSync } from 'node:child_process'
import { createHash } from 'node:crypto'
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { eq } from 'drizzle-orm'
import { getDocument } from 'pdfjs-dist/legacy/build/pdf.mjs'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { Job } from '../../shared/api/jobs.ts'
import type { SpecIssue, Specification } from '../../shared/api/specifications.ts'
import { auditTrail } from '../../server/db/schema/firm.ts'
import { sheetRevisions } from '../../server/db/schema/sheets.ts'
import { evaluate } from '../../shared/domain/evaluate.ts'
import { phaseOf } from '../../shared/domain/hazard-phases.ts'
import { numberedArticles } from '../../shared/domain/specification/numbering.ts'
import { registersOf } from '../../shared/domain/specification/registers.ts'
import { titleRows } from '../../shared/domain/specification/title-block.ts'
import { ghsStatement } from '../../shared/reference/ghs.ts'
import { type Run, type SpecDocument, plainText, specDocumentSchema } from '../../shared/domain/specification/document.ts'
import { type TestApp, testApp } from '../setup/app.ts'
import { specifiedJob } from '../setup/specified-job.ts'
import { textsOfZip } from '../setup/zip.ts'

type Items = SpecDocument['front']['unknowns']
const linesOf = (items: Items): Run[][] => items.flatMap(({ runs, items: under }) => [runs, ...linesOf(under)])
const allLines = ({ front, parts, schedules }: SpecDocument): Run[][] => [
  ...Object.values(front).flatMap(linesOf),
  ...parts.flatMap(({ articles }) => articles.flatMap(({ items }) => linesOf(items))),
  ...schedules.flatMap(({ rows }) => rows.flat()),
]
/** Titles of a PDF's outline in reading order, as pdf.js reads them. */
async function bookmarksOf(pdf: Buffer): Promise<string[]> {
  const task = getDocument({ data: new Uint8Array(pdf), verbosity: 0 })
  const outline = await (await task.promise).getOutline()
  const titles = (items: typeof outline): string[] =>
    items.flatMap(({ title, items: under }) => [title, ...titles(under as typeof outline)])
  const found = titles(outline)
  await task.destroy()
  return found
}
const hasTool = (name: string) => {
  try {
    execFileSync(name, ['-v'], { stdio: 'ignore' })
    return true
  } catch {
    return false
  }
}
const poppler = ['pdftotext', 'pdfinfo', 'pdffonts'].every(hasTool)

describe('specifications', () => {
  let t: TestApp
  let job: Job
  let made: Specification
  const folder = mkdtempSync(join(tmpdir(), 'wearcourse-spec-'))
  afterAll(() => rmSync(folder, { recursive: true, force: true }))
  beforeAll(async () => {
    t = await testApp()
    job = await specifiedJob(t)
    made = (await t.as.estimator.post(`/api/jobs/${job.id}/specifications`).send({}).expect(201)).body as Specification
  }, 60_000)

  const read = async () => (await t.as.estimator.get(`/api/specifications/${made.id}`).expect(200)).body as Specification
  const bytes = async (path: string) => {
    const answer = await t.as.estimator.get(`/api/specifications/${made.id}/${path}`).responseType('blob').expect(200)
    return { body: answer.body as Buffer, headers: answer.headers as Record<string, string> }
  }
  const poppled = (tool: string, pdf: Buffer, more: string[] = []) => {
    const path = join(folder, 'a.pdf')
    writeFileSync(path, pdf)
    return execFileSync(tool, [path, ...more], { encoding: 'utf8' })
  }

  it('has three parts in the order of SectionFormat, numbered, with the usual section number', () => {
    const document = specDocumentSchema.parse(made.document)
    expect(document.parts.map(({ number, title }) => `${number} ${title}`)).toEqual(['1 General', '2 Products', '3 Execution'])
    expect(document.header).toMatchObject({
      sectionNumber: '09 67 23',
      sectionTitle: 'Resinous flooring',
      project: 'Filling hall',
      issue: null,
    })
    // SectionFormat (CSI), from memory: warranty is the last article of part 1, schedules of part 3
    expect(document.parts[0]?.articles.at(-1)?.id).toBe('warranty')
    expect(document.parts[2]?.articles.at(-1)?.id).toBe('schedules')
  })

  it('gives every figure that a sheet states a tag that leads to sheet, revision and page', () => {
    const { document } = made
    const figures = allLines(document)
      .flat()
      .flatMap((run) => (run.kind === 'figure' ? [run] : []))
    const stated = figures.filter(({ known }) => known === 'stated')
    expect(stated.length).toBeGreaterThan(20)
    const tags = new Set([...document.sources, ...document.workings, ...document.entered, ...document.typicals].map(({ tag }) => tag))
    for (const figure of stated) {
      const [tag] = figure.tags
      expect(document.sources.find((source) => source.tag === tag)).toMatchObject({
        revisionId: figure.citation?.revisionId,
        page: figure.citation?.page,
      })
    }
    for (const { tags: used, known } of figures) {
      for (const tag of used) expect(tags).toContain(tag)
      if (known === 'computed' && used.length === 0) continue
      if (known === 'stated' || known === 'entered' || known === 'typical') expect(used).not.toEqual([])
    }
    for (const { from } of document.workings) for (const tag of from) expect(tags).toContain(tag)
  })

  it('puts what no sheet states first, with whom to ask, and never calls anything safe', () => {
    const { document } = made
    const unknowns = document.front.unknowns.map(({ runs }) => plainText(runs))
    expect(unknowns).toContainEqual('Foot traffic of Ostrel 220: not stated. Ask the maker, in writing.')
    // The sheet's table goes from 60 to 75 °F; 50 and 90 °F are beyond it.
    expect(unknowns.find((line) => line.startsWith('Recoat window of Ostrel 110'))).toMatch(/stops at 60 °F.*stops at 75 °F/)
    expect(unknowns.find((line) => /Moisture emission rate/i.test(line))).toMatch(/not stated/)
    expect(unknowns).toContainEqual('Pull-off strength: not stated for Ostrel 110; Ostrel 220. Ask the maker, in writing.')
    const silent =
      document.parts[1]?.articles
        .find(({ id }) => id === 'materials')
        ?.items.flatMap(({ items }) => items.map(({ runs }) => plainText(runs)).filter((line) => line.endsWith(': not stated.'))) ?? []
    expect(silent.length).toBeGreaterThan(0)
    for (const line of silent) expect(unknowns.some((one) => one.startsWith(line.slice(0, -'.'.length)))).toBe(true)
    expect(document.front.overrides.map(({ items }) => items.map(({ runs }) => plainText(runs)).join())).toContainEqual(
      'Reason given at release: Agreed with the client on site.',
    )
    const own = allLines(document)
      .flat()
      .filter(({ kind }) => kind === 'text')
      .map(({ text }) => text)
      .join(' ')
    expect(own).not.toMatch(/\bsafe\b/i)
    expect(own).not.toMatch(/\b(must|should|will)\b/i)
  })

  it('tells windows at three temperatures only inside the table of the sheet', () => {
    const windows = made.document.schedules.find(({ id }) => id === 'windows')
    expect(windows?.columns.map(({ label }) => label)).toEqual(['Course', '50 °F', '70 °F', '90 °F', 'Slab of this job, 68 °F'])
    const [prime = []] = windows?.rows ?? []
    expect(plainText(prime[1] ?? [])).toBe('not stated (the sheet stops at 60 °F)')
    // ln t straight over 1/T between 12–36 h at 60 °F and 8–24 h at 75 °F (Arrhenius), by hand: 9.13–27.4 h at 70 °F
    expect(plainText(prime[2] ?? [])).toMatch(/^9\.13–27\.4 h \[W\d+\]$/)
    expect(plainText(prime[3] ?? [])).toBe('not stated (the sheet stops at 75 °F)')
  })

  it('has no number but those of facts, workings, the job and standards', () => {
    const { document } = made
    const known = JSON.stringify([job, document.workings, document.sources, document.header], null, 1)
    const numbers = new Set((known.match(/\d[\d,]*\.?\d*/g) ?? []).map((text) => Number(text.replaceAll(',', ''))))
    for (const run of allLines(document).flat()) {
      if (run.kind === 'text') expect(run.text).not.toMatch(/\d/)
      if (run.kind !== 'figure' || run.known === 'standard') continue
      for (const text of run.text.match(/\d[\d,]*\.?\d*/g) ?? [])
        expect(numbers, `${run.text} (${run.known})`).toContain(Number(text.replaceAll(',', '')))
    }
    // 7,350 ft²: three tests for the first 1,000 ft² and one for each further 1,000 begun is 10 (ASTM F2170, from memory)
    expect(
      allLines(document)
        .map(plainText)
        .find((line) => line.includes('ASTM F2170 or')),
    ).toContain('10 tests [W')
    // 1604.17 ft²·mil/gal ÷ 150 ft²/gal = 10.7 mil
    expect(document.workings.map(({ sum }) => sum)).toContainEqual('1,604.17 ft²·mil/gal ÷ 150 ft²/gal = 10.7 mil')
  })

  it.runIf(poppler)(
    'prints no number that is not a fact, a working, a rule named or a number of its own paragraphs and pages',
    async () => {
      const { document } = await read()
      const { body } = await bytes('draft.pdf')
      const text = poppled('pdftotext', body, ['-'])
      if (!job.buildUp) throw new Error('no build-up')
      const { input } = job.buildUp
      const { findings } = evaluate(input)
      const rules = input.courses.map((course) => phaseOf(course, input))
      const statements = allLines(document)
        .flat()
        .flatMap(({ text: words }) => (/^(EUH|H|P)\d{3}/.test(words) ? [words] : []))
      expect(statements.length).toBeGreaterThan(0)
      for (const words of statements)
        expect(ghsStatement(words.split(' ')[0] ?? '') ?? '', words).toContain(words.slice(words.indexOf(' ') + 1))
      const standards = allLines(document)
        .flat()
        .flatMap((run) => (run.kind === 'figure' && run.known === 'standard' ? [run.text] : []))
      const own = document.parts
        .flatMap((part) => numberedArticles(part))
        .flatMap(({ number, items }) => [number, ...items.map(({ label }) => label)])
      const temperatures = document.schedules.find(({ id }) => id === 'windows')?.columns.map(({ label }) => label)
      const pages = Number(/Pages:\s+(\d+)/.exec(poppled('pdfinfo', body))?.[1])
      const kept = [
        job,
        input,
        document.header,
        document.sources,
        document.workings,
        document.typicals,
        findings,
        rules,
        standards,
        own,
        temperatures,
        registersOf(document),
        titleRows(document.header),
      ]
      const numbersOf = (words: string) => (words.match(/\d[\d,]*(\.\d+)?/g) ?? []).map((one) => Number(one.replaceAll(',', '')))
      const known = new Set([
        ...numbersOf(JSON.stringify(kept).replace(/[\da-f]{8}(-[\da-f]{4}){3}-[\da-f]{12}/g, '')),
        ...Array.from({ length: pages }, (_, index) => index + 1),
      ])
      const strange = numbersOf(text).filter((number) => !known.has(number))
      expect(strange).toEqual([])
      expect([777, 12.5, 33].filter((number) => known.has(number))).toEqual([])
      expect(numbersOf(text).length).toBeGreaterThan(500)
    },
  )

  it('changes title and number, and tells of a change made meanwhile', async () => {
    const { version } = await read()
    const put = (body: object) => t.as.estimator.put(`/api/specifications/${made.id}`).send(body)
    const wrong = await put({ title: '', sectionNumber: '9672', version }).expect(422)
    expect(Object.keys(wrong.body.error.fields).sort()).toEqual(['sectionNumber', 'title'])
    const { body } = await put({ title: 'Seamless flooring', sectionNumber: '09 67 23.13', version }).expect(200)
    expect(body.document.header).toMatchObject({ sectionTitle: 'Seamless flooring', sectionNumber: '09 67 23.13' })
    expect((await put({ title: 'Lost', sectionNumber: '09 67 23', version }).expect(409)).body.error.code).toBe('conflict')
    await put({ title: 'Resinous flooring', sectionNumber: '09 67 23', version: version + 1 }).expect(200)
  })

  it('freezes an issue byte for byte, whatever the facts say later', async () => {
    const before = await read()
    const issue = (await t.as.estimator.post(`/api/specifications/${made.id}/issues`).send({ version: before.version }).expect(201))
      .body as SpecIssue
    expect(issue).toMatchObject({ number: 1, issuedByName: 'Test estimator', restsOnSuperseded: [] })
    expect(issue.document.header.issue).toEqual({ number: 1, by: 'Test estimator' })
    const files = [await bytes('issues/1/files/docx'), await bytes('issues/1/files/pdf')]
    expect(files.map(({ body }) => createHash('sha256').update(body).digest('hex'))).toEqual([issue.docxSha256, issue.pdfSha256])
    expect(files[1]?.headers['content-disposition']).toBe(
      'attachment; filename="09 67 23 Resinous flooring, Filling hall, issue 1.pdf"; filename*=UTF-8\'\'09%2067%2023%20Resinous%20flooring%2C%20Filling%20hall%2C%20issue%201.pdf',
    )
    const { id, number: _, buildUp, siteCardUrl: __, updatedAt: ___, crew: ____, ...rest } = job
    const conditions = { ...rest.conditions, slabTemperature: { value: 74, unit: '°F' } }
    await t.as.estimator
      .put(`/api/jobs/${id}`)
      .send({ ...rest, conditions, crewIds: [], buildUpVersionId: buildUp?.versionId })
      .expect(200)
    const [revision] = await t.db
      .select()
      .from(sheetRevisions)
      .where(eq(sheetRevisions.id, issue.document.sources[0]?.revisionId ?? ''))
    if (!revision) throw new Error('no revision')
    await t.db
      .insert(sheetRevisions)
      .values({ ...revision, id: undefined, sha256: 'newer', sequence: revision.sequence + 1, revisionDate: '2026-01-01' })

    const kept = (await t.as.lead.get(`/api/specifications/${made.id}/issues/1`).expect(200)).body as SpecIssue
    expect(kept.document).toEqual(issue.document)
    expect(kept.restsOnSuperseded).toEqual([issue.document.sources[0]?.title])
    expect([await bytes('issues/1/files/docx'), await bytes('issues/1/files/pdf')].map(({ body }) => body)).toEqual(
      files.map(({ body }) => body),
    )
    const after = await read()
    expect(JSON.stringify(after.document)).toContain('74 °F')
    expect(JSON.stringify(kept.document)).not.toContain('74 °F')
    const second = (await t.as.lead.post(`/api/specifications/${made.id}/issues`).send({ version: after.version }).expect(201))
      .body as SpecIssue
    expect([second.number, second.issuedByName]).toEqual([2, 'Test lead'])
    await t.as.lead.post(`/api/specifications/${made.id}/issues`).send({ version: after.version }).expect(409)
    expect((await read()).issues.map(({ number }) => number)).toEqual([2, 1])
    const trail = await t.db.select().from(auditTrail).where(eq(auditTrail.subjectId, made.id))
    expect(trail.map(({ action }) => action)).toEqual(['added', 'changed', 'changed', 'issued', 'issued'])
  }, 60_000)

  it('makes the same bytes of the same document, at any time', async () => {
    for (const kind of ['docx', 'pdf']) {
      const first = await bytes(`draft.${kind}`)
      await new Promise((resolve) => setTimeout(resolve, 2100))
      const again = await bytes(`draft.${kind}`)
      expect(again.body.equals(first.body)).toBe(true)
      await t.as.estimator
        .get(`/api/specifications/${made.id}/draft.${kind}`)
        .set('If-None-Match', first.headers['etag'] ?? '')
        .expect(304)
    }
  }, 60_000)

  // ECMA-376 part 1: 17.9 numbering, 17.7 styles, 17.4.78 tblHeader, 20.4.2.5 docPr
  it('writes a DOCX with real styles, a multilevel list, tables with repeated heads, and words for the picture', async () => {
    const entries = textsOfZip((await bytes('draft.docx')).body)
    const part = (name: string) => entries[name] ?? ''
    const body = part('word/document.xml')
    for (const level of ['"PART %1"', '"%1.%2"', '"%3."', '"%4."', '"%5."', '"%6)"', '"%7)"'])
      expect(part('word/numbering.xml')).toContain(`w:lvlText w:val=${level}`)
    expect(part('word/numbering.xml')).toContain('w:numFmt w:val="decimalZero"')
    expect(body.match(/w:pStyle w:val="Heading1"/g)?.length).toBe(5)
    expect(body.match(/w:pStyle w:val="Heading2"/g)?.length).toBeGreaterThan(20)
    expect(body.match(/<w:tblHeader\/>/g)?.length).toBeGreaterThan(6)
    expect(body).toMatch(/<wp:docPr [^>]*descr="Section through the floor, from the top down/)
    expect(body).toMatch(/<asvg:svgBlip [^>]*r:embed=/)
    expect(
      Object.keys(entries)
        .filter((name) => name.startsWith('word/media/'))
        .sort(),
    ).toEqual(['word/media/image1.png', 'word/media/image1.svg'])
    expect(part('word/fontTable.xml')).toContain('w:name="Source Sans 3"')
    expect(part('word/header1.xml')).toContain('Draft, not issued')
    expect(part('word/footer1.xml')).toMatch(/PAGE.*NUMPAGES/)
    expect(part('word/styles.xml')).toContain('w:styleId="Heading2"')
  })

  it.runIf(poppler)('writes a PDF with embedded Source Sans 3, bookmarks, language, and a page number on every page', async () => {
    const { body } = await bytes('draft.pdf')
    const pages = Number(/Pages:\s+(\d+)/.exec(poppled('pdfinfo', body))?.[1])
    const text = poppled('pdftotext', body, ['-layout', '-'])
    for (let page = 1; page <= pages; page += 1) expect(text).toContain(`Page ${page} of ${pages}`)
    expect(text.match(/Draft, not issued/g)?.length).toBeGreaterThanOrEqual(pages)
    expect(text).toContain('PART 2 PRODUCTS')
    expect(text.replace(/\s+/g, ' ')).toContain('2.04 MATERIALS A. Ostrel 110: epoxy, by Ostrel. 1. Components')
    const fonts = poppled('pdffonts', body).split('\n').slice(2).filter(Boolean)
    expect(fonts.length).toBeGreaterThanOrEqual(2)
    for (const font of fonts) expect(font).toMatch(/SourceSans3-\w+\s+CID TrueType\s+Identity-H\s+yes yes yes/)
    // ISO 32000-1, 12.3.3 outline and 14.9.2 language
    expect(body.toString('latin1')).toMatch(/\/Outlines \d+ 0 R/)
    expect(body.toString('latin1')).toContain('/Lang (en-US)')
    const bookmarks = await bookmarksOf(body)
    expect(bookmarks).toEqual([
      'READ FIRST',
      ...made.document.parts.flatMap((one) => [
        `PART ${one.number} ${one.title.toUpperCase()}`,
        ...numberedArticles(one).map(({ number, title }) => `${number}  ${title.toUpperCase()}`),
      ]),
      'SCHEDULES',
      'Section through the floor',
      ...made.document.schedules.map(({ title }) => title),
      ...registersOf(made.document).map(({ title }) => title),
    ])
  })

  it('refuses a job without a released build-up, an unknown job, and the crew', async () => {
    const { id: _, number: __, buildUp: ___, siteCardUrl: ____, updatedAt: _____, version: ______, crew: _______, ...rest } = job
    const bare = (
      await t.as.estimator
        .post('/api/jobs')
        .send({ ...rest, name: 'Bare', buildUpVersionId: null, crewIds: [] })
        .expect(201)
    ).body as Job
    const refused = await t.as.estimator.post(`/api/jobs/${bare.id}/specifications`).send({}).expect(422)
    expect(refused.body.error.message).toMatch(/no released build-up/)
    expect((await t.as.estimator.get(`/api/jobs/${bare.id}/specifications`).expect(200)).body.items).toEqual([])
    expect((await t.as.estimator.get(`/api/jobs/${job.id}/specifications`).expect(200)).body.items).toHaveLength(1)
    await t.as.estimator.post('/api/jobs/00000000-0000-4000-8000-000000000000/specifications').send({}).expect(404)
    await t.as.estimator.get(`/api/specifications/${made.id}/issues/99`).expect(404)
    await t.as.crew.get(`/api/specifications/${made.id}`).expect(403)
  })
})
