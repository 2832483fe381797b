import { type Response, Router } from 'express'
import { catalogueEndpoints as wire } from '../../../shared/api/catalogue.ts'
import type { User } from '../../../shared/api/session.ts'
import type { AppContext } from '../../http/context.ts'
import { serve } from '../../http/serve.ts'
import { csvOf } from '../../http/csv.ts'
import { addFact, amendFact, endFact } from './fact-queries.ts'
import { allMixes, allProducts, listMakers, listMixes, listProducts } from './list-queries.ts'
import { type Writer, ofMix, ofProduct } from './subject.ts'
import { addMix, addProduct, changeMix, changeProduct, readMix, readProduct } from './write-queries.ts'

const writer = ({ id, name }: User): Writer => ({ id, name })

function sendCsv(response: Response, name: string, text: string): void {
  response.attachment(name).type('text/csv; charset=utf-8').send(text)
}

/** Products, mixes and what is known of them. */
export function catalogueRoutes({ db }: AppContext): Router {
  const router = Router()

  serve(router, wire.listProducts, ({ query }) => listProducts(db, query))
  serve(router, wire.exportProducts, async ({ query, http }) => {
    const rows = await allProducts(db, query)
    const heading = ['id', 'name', 'maker', 'kind', 'chemistry', 'standing', 'values', 'sheets', 'changed']
    sendCsv(
      http.response,
      'products.csv',
      csvOf(
        heading,
        rows.map((row) => [row.id, row.name, row.maker, row.kind, row.chemistry, row.status, row.facts, row.sheets, row.updatedAt]),
      ),
    )
  })
  serve(router, wire.addProduct, async ({ body, user }) =>
    readProduct(db, await db.transaction((tx) => addProduct(tx, body, writer(user)))),
  )
  serve(router, wire.readProduct, ({ params }) => readProduct(db, params.productId))
  serve(router, wire.changeProduct, async ({ params, body, user }) => {
    await db.transaction((tx) => changeProduct(tx, params.productId, { ...body, by: writer(user) }))
    return readProduct(db, params.productId)
  })
  serve(router, wire.addProductFact, ({ params, body, user }) =>
    db.transaction((tx) => addFact(tx, ofProduct(params.productId), { body, by: writer(user) })),
  )
  serve(router, wire.listMixes, ({ query }) => listMixes(db, query))
  serve(router, wire.exportMixes, async ({ query, http }) => {
    const rows = await allMixes(db, query)
    const heading = ['id', 'name', 'maker', 'chemistry', 'part A', 'part B', 'part C', 'standing', 'values', 'sheets', 'changed']
    const cells = ({ parts: [a, b, c], ...row }: (typeof rows)[number]) => [
      row.id,
      row.name,
      row.maker,
      row.chemistry,
      a ?? '',
      b ?? '',
      c ?? '',
      row.status,
      row.facts,
      row.sheets,
      row.updatedAt,
    ]
    sendCsv(http.response, 'mixes.csv', csvOf(heading, rows.map(cells)))
  })
  serve(router, wire.addMix, async ({ body, user }) => readMix(db, await db.transaction((tx) => addMix(tx, body, writer(user)))))
  serve(router, wire.readMix, ({ params }) => readMix(db, params.mixId))
  serve(router, wire.changeMix, async ({ params, body, user }) => {
    await db.transaction((tx) => changeMix(tx, params.mixId, { ...body, by: writer(user) }))
    return readMix(db, params.mixId)
  })
  serve(router, wire.addMixFact, ({ params, body, user }) =>
    db.transaction((tx) => addFact(tx, ofMix(params.mixId), { body, by: writer(user) })),
  )
  serve(router, wire.amendFact, ({ params, body, user }) =>
    db.transaction((tx) => amendFact(tx, params.factId, { body, by: writer(user) })),
  )
  serve(router, wire.endFact, ({ params, user }) => db.transaction((tx) => endFact(tx, params.factId, writer(user))))
  serve(router, wire.listMakers, async () => ({ items: await listMakers(db) }))

  return router
}
