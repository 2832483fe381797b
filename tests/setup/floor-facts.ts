import type { Statement } from '../../shared/domain/property.ts'
import type { Database } from '../../server/db/open.ts'
import { mixParts, mixes, products, propertyValues, sheetSubjects } from '../../server/db/schema/catalogue.ts'
import { sheetRevisions, sheets } from '../../server/db/schema/sheets.ts'

type Stated = Omit<Statement, 'part'> & { part?: Statement['part'] }

interface Subject {
  productId?: string
  mixId?: string
}

let files = 0

/** A sheet with one dated revision, speaking of one product or mix. */
async function addSheet(db: Database, subject: Subject, { kind, title, dated }: { kind: 'data' | 'safety'; title: string; dated: string }) {
  const [sheet] = await db.insert(sheets).values({ kind, title, maker: 'Ostrel' }).returning({ id: sheets.id })
  if (!sheet) throw new Error('no sheet')
  files += 1
  const [revision] = await db
    .insert(sheetRevisions)
    .values({
      sheetId: sheet.id,
      sha256: `test-${files}-${title}`,
      bytes: 1000,
      fileName: `${title}.pdf`,
      revisionDate: dated,
      state: 'ready',
      pages: 2,
      sequence: 1,
    })
    .returning({ id: sheetRevisions.id })
  if (!revision) throw new Error('no revision')
  await db.insert(sheetSubjects).values({ sheetId: sheet.id, ...subject })
  return revision.id
}

async function state(db: Database, subject: Subject & { revisionId: string }, facts: readonly Stated[]) {
  if (facts.length === 0) return
  await db
    .insert(propertyValues)
    .values(
      facts.map((fact, position) => ({
        ...subject,
        position,
        kind: 'stated' as const,
        page: 1,
        byName: 'Test lead',
        part: fact.part ?? 'mixed',
        property: fact.property,
        value: fact.value,
        at: fact.at ?? null,
        film: fact.film ?? null,
        of: fact.of ?? null,
        thinned: fact.thinned ?? null,
      })),
    )
}

const exactly = (value: number, unit: 'lb/gal') => ({ min: value, max: value, unit })

/** A component with a safety sheet and what a check needs of it. Invented. */
export async function addProduct(
  db: Database,
  name: string,
  more: { kind?: 'resin' | 'hardener' | 'aggregate'; density?: number; dated?: string } = {},
) {
  const { kind = 'resin', density = 9.2, dated = '2025-05-02' } = more
  const [row] = await db
    .insert(products)
    .values({
      name,
      maker: 'Ostrel',
      kind,
      chemistry: kind === 'aggregate' ? 'silica' : 'epoxy',
      searchText: `${name} ostrel`.toLowerCase(),
    })
    .returning({ id: products.id })
  if (!row) throw new Error('no product')
  const revisionId = await addSheet(db, { productId: row.id }, { kind: 'safety', title: `${name}, safety sheet`, dated })
  await state(db, { productId: row.id, revisionId }, [
    { property: 'density', value: exactly(density, 'lb/gal') },
    { property: 'signalWord', value: { text: 'Warning' } },
    { property: 'hazardStatements', value: { codes: ['H315', 'H317'] } },
  ])
  return row.id
}

/** A two-part mix at 2 : 1 by volume, 100 % solids, with its data sheet and the working properties of one. Invented. */
export async function addMix(db: Database, name: string, more: { color?: string; dated?: string; without?: string[] } = {}) {
  const partA = await addProduct(db, `${name} A`, { density: 9.6, ...(more.dated ? { dated: more.dated } : {}) })
  const partB = await addProduct(db, `${name} B`, { kind: 'hardener', density: 8.3, ...(more.dated ? { dated: more.dated } : {}) })
  const [row] = await db
    .insert(mixes)
    .values({ name, maker: 'Ostrel', chemistry: 'epoxy', color: more.color ?? '#8f9a98', searchText: `${name} ostrel`.toLowerCase() })
    .returning({ id: mixes.id })
  if (!row) throw new Error('no mix')
  await db.insert(mixParts).values([
    { mixId: row.id, part: 'A', productId: partA },
    { mixId: row.id, part: 'B', productId: partB },
  ])
  const revisionId = await addSheet(db, { mixId: row.id }, { kind: 'data', title: name, dated: '2025-03-01' })
  const at = (value: number) => ({ at: { temperature: { value, unit: '°F' as const } } })
  const facts: Stated[] = [
    { property: 'mixRatio', value: { parts: [2, 1], basis: 'volume' } },
    { property: 'mixRatio', value: { parts: [100, 43.2], basis: 'weight' } },
    { property: 'volumeSolids', value: { min: 100, max: 100, unit: '%' } },
    { property: 'voc', value: { max: 20, unit: 'g/L' } },
    { property: 'potLife', value: { min: 35, max: 35, unit: 'min' }, ...at(60) },
    { property: 'potLife', value: { min: 25, max: 25, unit: 'min' }, ...at(75) },
    { property: 'workingTime', value: { min: 30, max: 30, unit: 'min' }, ...at(70) },
    { property: 'recoatWindow', value: { min: 12, max: 36, unit: 'h' }, ...at(60) },
    { property: 'recoatWindow', value: { min: 8, max: 24, unit: 'h' }, ...at(75) },
    { property: 'footTraffic', value: { min: 16, max: 16, unit: 'h' }, ...at(60) },
    { property: 'footTraffic', value: { min: 12, max: 12, unit: 'h' }, ...at(75) },
    { property: 'vehicleTraffic', value: { min: 72, max: 72, unit: 'h' }, ...at(60) },
    { property: 'vehicleTraffic', value: { min: 48, max: 48, unit: 'h' }, ...at(75) },
    { property: 'filmThickness', value: { min: 6, max: 20, unit: 'mil' }, film: 'wet' },
    { property: 'applicationTemperature', value: { min: 50, max: 90, unit: '°F' }, of: 'slab' },
    { property: 'applicationTemperature', value: { min: 50, max: 90, unit: '°F' }, of: 'air' },
    { property: 'dewPointMargin', value: { min: 5, unit: 'Δ°F' } },
    { property: 'substrateRelativeHumidity', value: { max: 85, unit: '%' } },
    { property: 'moistureEmission', value: { max: 5, unit: 'lb/1000 ft²·24 h' } },
    { property: 'surfaceProfile', value: { min: 2, max: 4, unit: 'CSP' } },
  ]
  await state(
    db,
    { mixId: row.id, revisionId },
    facts.filter(({ property }) => !more.without?.includes(property)),
  )
  return row.id
}
