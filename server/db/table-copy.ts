import pg from 'pg'

const { escapeIdentifier } = pg

/** Some rows of one table, each value in the text form that PostgreSQL itself writes and reads back exactly. */
export interface TablePart {
  table: string
  columns: string[]
  rows: (string | null)[][]
}

/** Where a counter of numbers stands. */
export interface Counter {
  table: string
  column: string
  last: string
  isUsed: boolean
}

const rowsPerPart = 200
/** Who is signed in is not carried over: sessions hold for one secret only. */
const leftOut = ['session']

/** All tables, those that others refer to first. */
export async function tablesInOrder(client: pg.ClientBase): Promise<string[]> {
  const { rows: tables } = await client.query<{ name: string }>(
    "select tablename as name from pg_tables where schemaname = 'public' order by tablename",
  )
  const { rows: references } = await client.query<{ from: string; to: string }>(
    `select distinct a.relname as "from", b.relname as "to" from pg_constraint c join pg_class a on a.oid = c.conrelid join pg_class b on b.oid = c.confrelid
     where c.contype = 'f' and c.connamespace = 'public'::regnamespace and a.oid <> b.oid`,
  )
  const waiting = new Set(tables.map(({ name }) => name).filter((name) => !leftOut.includes(name)))
  const ordered: string[] = []
  while (waiting.size > 0) {
    const free = [...waiting].filter((name) => !references.some(({ from, to }) => from === name && waiting.has(to)))
    if (free.length === 0) throw new Error(`Tables refer to each other in a ring: ${[...waiting].join(', ')}.`)
    for (const name of free) {
      ordered.push(name)
      waiting.delete(name)
    }
  }
  return ordered
}

async function columnsOf(client: pg.ClientBase, table: string): Promise<{ name: string; type: string }[]> {
  const { rows } = await client.query<{ name: string; type: string }>(
    `select attname as name, format_type(atttypid, atttypmod) as type from pg_attribute
     where attrelid = $1::regclass and attnum > 0 and not attisdropped and attgenerated = '' order by attnum`,
    [`public.${escapeIdentifier(table)}`],
  )
  return rows
}

/** The rows of a table, some at a time. Called inside a transaction. */
export async function* readTable(client: pg.ClientBase, table: string): AsyncGenerator<TablePart> {
  const columns = (await columnsOf(client, table)).map(({ name }) => name)
  const values = columns.map((name) => `${escapeIdentifier(name)}::text`).join(', ')
  await client.query(`declare parts no scroll cursor for select array[${values}]::text[] as row from public.${escapeIdentifier(table)}`)
  for (;;) {
    const { rows } = await client.query<{ row: (string | null)[] }>(`fetch ${rowsPerPart} from parts`)
    if (rows.length > 0) yield { table, columns, rows: rows.map(({ row }) => row) }
    if (rows.length < rowsPerPart) break
  }
  await client.query('close parts')
}

/** Writes rows into their table. Called inside a transaction. */
export async function writePart(client: pg.ClientBase, { table, columns, rows }: TablePart): Promise<void> {
  const types = new Map((await columnsOf(client, table)).map(({ name, type }) => [name, type]))
  const values = columns.map((name, index) => {
    const type = types.get(name)
    if (type === undefined) throw new Error(`Table ${table} has no column ${name}.`)
    return `(part ->> ${index})::${type}`
  })
  await client.query(
    `insert into public.${escapeIdentifier(table)} (${columns.map(escapeIdentifier).join(', ')}) overriding system value
     select ${values.join(', ')} from json_array_elements($1::json) part`,
    [JSON.stringify(rows)],
  )
}

/** The counters behind numbered columns. */
export async function readCounters(client: pg.ClientBase): Promise<Counter[]> {
  const { rows: places } = await client.query<{ table: string; column: string; sequence: string }>(
    `select t.relname as "table", a.attname as "column", s.oid::regclass::text as sequence
     from pg_class s join pg_depend d on d.objid = s.oid and d.deptype in ('a', 'i') and d.classid = 'pg_class'::regclass
     join pg_class t on t.oid = d.refobjid join pg_attribute a on a.attrelid = t.oid and a.attnum = d.refobjsubid
     where s.relkind = 'S' and s.relnamespace = 'public'::regnamespace order by 1, 2`,
  )
  const counters: Counter[] = []
  for (const { table, column, sequence } of places) {
    const { rows } = await client.query<{ last: string; isUsed: boolean }>(
      `select last_value::text as last, is_called as "isUsed" from ${sequence}`,
    )
    if (rows[0]) counters.push({ table, column, ...rows[0] })
  }
  return counters
}

export async function setCounter(client: pg.ClientBase, { table, column, last, isUsed }: Counter): Promise<void> {
  await client.query('select setval(pg_get_serial_sequence($1, $2), $3::bigint, $4)', [
    `public.${escapeIdentifier(table)}`,
    column,
    last,
    isUsed,
  ])
}

/** Hashes of things that are kept in rows themselves and not in the store. */
const notInStore = ['tree_sha256']

/** Hashes of all files that rows speak of. */
export async function filesSpokenOf(client: pg.ClientBase): Promise<string[]> {
  const { rows: places } = await client.query<{ table: string; column: string }>(
    `select table_name as "table", column_name as "column" from information_schema.columns
     where table_schema = 'public' and column_name like '%sha256' and column_name <> all ($1) order by 1, 2`,
    [notInStore],
  )
  const hashes = new Set<string>()
  for (const { table, column } of places) {
    const name = escapeIdentifier(column)
    const { rows } = await client.query<{ hash: string }>(
      `select distinct ${name} as hash from public.${escapeIdentifier(table)} where ${name} is not null`,
    )
    for (const { hash } of rows) hashes.add(hash)
  }
  return [...hashes].sort()
}
