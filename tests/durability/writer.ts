import { openDatabase } from '../../server/db/open.ts'

// Commits row after row and says so only after the database has answered. Run as a process of its own, to be killed.
const [, , dataDir = '', most = '1000000'] = process.argv
const database = await openDatabase({ dataDir })
await database.pool.query('create table if not exists acknowledged_rows (n int primary key, filler text)')
const { rows } = await database.pool.query<{ next: number }>('select coalesce(max(n), 0) + 1 as next from acknowledged_rows')
const first = rows[0]?.next ?? 1
for (let n = first; n < first + Number(most); n++) {
  const client = await database.pool.connect()
  await client.query('begin')
  await client.query('insert into acknowledged_rows values ($1, $2)', [n, 'x'.repeat(200)])
  await client.query('commit')
  client.release()
  process.stdout.write(`ack ${n}\n`)
}
await database.close()
process.exit(0)
