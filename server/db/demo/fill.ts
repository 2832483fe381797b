import { copyFile, readFile } from 'node:fs/promises'
import { join } from 'node:path'
import type { FactBody } from '../../../shared/api/catalogue.ts'
import type { Database, Transaction } from '../open.ts'
import { addJob } from '../../features/jobs/queries.ts'
import { readHead, readVersion } from '../../features/build-ups/queries.ts'
import { addBuildUp, addDraft } from '../../features/build-ups/write-queries.ts'
import { release } from '../../features/build-ups/release.ts'
import { reasonKey, releaseObstacles } from '../../../shared/domain/course.ts'
import { evaluate } from '../../../shared/domain/evaluate.ts'
import type { User } from '../../../shared/api/session.ts'
import { addFactsAtOnce } from '../../features/catalogue/fact-queries.ts'
import { type Writer, ofMix, ofProduct } from '../../features/catalogue/subject.ts'
import { addMix, addProduct } from '../../features/catalogue/write-queries.ts'
import { hashPassword } from '../../features/people/password.ts'
import { addPerson, makeFirm } from '../../features/people/queries.ts'
import { addRevision, addSheet } from '../../features/sheets/queries.ts'
import { issueSpecification } from '../../features/specifications/issue.ts'
import { addSpecification } from '../../features/specifications/queries.ts'
import type { FileStore } from '../../files/store.ts'
import { type DemoBuildUp, type Known, demoBuildUps } from './build-ups.ts'
import { type DemoSheet, demoFolder } from './draw-sheets.ts'
import { demoJobs } from './jobs.ts'
import { demoMixes } from './mixes.ts'
import { demoFirm, demoPassword, demoPeople } from './people.ts'
import { demoProducts } from './products.ts'

interface Filling {
  db: Database
  files: FileStore
  now: number
}

/** Fills an empty database with the demo, in one transaction, through the same functions that people's changes go through. */
export async function fillDemo({ db, files, now }: Filling): Promise<void> {
  const sheets = JSON.parse(await readFile(join(demoFolder, 'sheets.json'), 'utf8')) as DemoSheet[]
  for (const sheet of sheets) {
    const incoming = join(files.incoming, sheet.file)
    await copyFile(join(demoFolder, sheet.file), incoming)
    await files.adopt(incoming, sheet.sha256)
  }
  const passwordHash = await hashPassword(demoPassword)
  const begun = await db.transaction(async (tx) => {
    await makeFirm(tx, { ...demoFirm, isDemo: true })
    const people: User[] = []
    for (const person of demoPeople) {
      const { id, name, email, role } = await addPerson(tx, { ...person, passwordHash }, null)
      people.push({ id, name, email, role })
    }
    const [lead] = people
    if (!lead) throw new Error('The demo has nobody in it.')
    const known = await fillCatalogue(tx, sheets, { id: lead.id, name: lead.name })
    const versions = new Map<string, string>()
    for (const buildUp of demoBuildUps) versions.set(buildUp.name, await fillBuildUp(tx, buildUp, { known, lead, now }))
    const crewIds = people.filter(({ role }) => role === 'crew').map(({ id }) => id)
    const jobIds: string[] = []
    for (const [index, { buildUp, body }] of demoJobs.entries()) {
      const jobId = await addJob(
        tx,
        { ...body, buildUpVersionId: versions.get(buildUp) ?? null, crewIds: index === 0 ? crewIds.slice(0, 1) : crewIds },
        lead.id,
      )
      jobIds.push(jobId)
    }
    const title = 'Resinous flooring, filling hall'
    return { lead, specificationId: await addSpecification(tx, { jobId: jobIds[0] ?? '', title, sectionNumber: '09 67 23' }, lead.id) }
  })
  const { lead, specificationId } = begun
  await issueSpecification({ db, files, now }, { specificationId, version: 1, by: { id: lead.id, name: lead.name } })
}

async function fillCatalogue(tx: Transaction, sheets: readonly DemoSheet[], lead: Writer): Promise<Known> {
  const [products, mixes] = [new Map<string, string>(), new Map<string, string>()]
  for (const { name, maker, kind, chemistry } of demoProducts)
    products.set(name, await addProduct(tx, { name, maker, kind, chemistry, note: '' }, lead))
  const idIn = (map: Map<string, string>) => (name: string) => {
    const id = map.get(name)
    if (!id) throw new Error(`The demo has no ${name}.`)
    return id
  }
  const known = { product: idIn(products), mix: idIn(mixes) }
  for (const { name, maker, chemistry, color, use, parts } of demoMixes) {
    const named = parts.map((part, index) => ({ part: (['A', 'B', 'C'] as const)[index] ?? 'A', productId: known.product(part) }))
    mixes.set(name, await addMix(tx, { name, maker, chemistry, color, note: use, parts: named, ratio: null }, lead))
  }
  await fillSheets(tx, sheets, { known, lead })
  for (const { name, price } of demoMixes) {
    const statement: FactBody['statement'] = { property: 'packPrice', part: 'mixed', value: { min: price, max: price, unit: 'USD' } }
    await addFactsAtOnce(tx, ofMix(known.mix(name)), {
      bodies: [{ statement, how: { kind: 'entered', reason: 'Price list of October 2026' } }],
      by: lead,
    })
  }
  for (const name of ['Corbel 40-mesh silica', 'Corbel 20-40 mesh quartz, dried']) {
    const bag: FactBody['statement'] = { property: 'packSize', part: 'mixed', value: { min: 50, max: 50, unit: 'lb' } }
    const price: FactBody['statement'] = { property: 'packPrice', part: 'mixed', value: { min: 14, max: 14, unit: 'USD' } }
    await addFactsAtOnce(tx, ofProduct(known.product(name)), {
      by: lead,
      bodies: [
        { statement: bag, how: { kind: 'entered', reason: 'Printed on the bag, delivery of 3 October 2026' } },
        { statement: price, how: { kind: 'entered', reason: 'Price list of October 2026' } },
      ],
    })
  }
  return known
}

/** Sheets in the order of their dates, so that the newest revision is the one in force; values rest on that one. */
async function fillSheets(tx: Transaction, sheets: readonly DemoSheet[], { known, lead }: { known: Known; lead: Writer }): Promise<void> {
  const ids = new Map<string, string>()
  for (const sheet of sheets) {
    const subject = sheet.kind === 'data' ? { mixId: known.mix(sheet.of) } : { productId: known.product(sheet.of) }
    const sheetId =
      ids.get(sheet.title) ??
      (await addSheet(tx, { kind: sheet.kind, title: sheet.title, maker: sheet.maker, subjects: [subject] }, lead.id))
    ids.set(sheet.title, sheetId)
    const { sha256, bytes, file: fileName, dated: revisionDate, pages } = sheet
    const uploadedAt = new Date(Date.parse(sheet.dated) + 40 * 86_400_000).toISOString()
    const revisionId = await addRevision(tx, { sheetId, sha256, bytes, fileName, revisionDate, pages, uploadedBy: lead.id, uploadedAt })
    if (sheet.superseded) continue
    const stated = sheet.facts.map(({ statement, page, box, quote }): FactBody => ({
      statement,
      how: { kind: 'stated', revisionId, page, box, quote },
    }))
    await addFactsAtOnce(tx, 'mixId' in subject ? ofMix(subject.mixId) : ofProduct(subject.productId), { bodies: stated, by: lead })
  }
}

const acceptedBecause = 'Looked into by the technical lead; the maker has been asked in writing.'

/** Makes a build-up with its versions, releasing those that are to be; returns the newest released version, or the draft. */
async function fillBuildUp(
  tx: Transaction,
  { name, versions }: DemoBuildUp,
  { known, lead, now }: { known: Known; lead: User; now: number },
): Promise<string> {
  let buildUpId = ''
  let newest = ''
  for (const [index, version] of versions.entries()) {
    const work = { courses: version.courses(known), conditions: version.conditions }
    const number = index + 1
    if (index === 0) buildUpId = (await addBuildUp(tx, { name, work }, { by: lead, now })).buildUpId
    else await addDraft(tx, buildUpId, { from: index, work, by: lead, now })
    const made = (await readHead(tx, buildUpId)).versions.find((one) => one.number === number)
    if (!made) throw new Error(`${name} has no version ${number}.`)
    newest = made.id
    if (!version.release) continue
    const found = await readVersion(tx, made.id, now)
    if (!found) throw new Error(`${name} cannot be read.`)
    const { unreasoned } = releaseObstacles(evaluate(found.input).findings)
    const reasons = Object.fromEntries(unreasoned.map((finding) => [reasonKey(finding), acceptedBecause]))
    await release(tx, { place: { buildUpId, number, version: 1 }, reasons, by: { id: lead.id, name: lead.name }, now })
  }
  return newest
}
