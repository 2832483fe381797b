import { type SQL, sql } from 'drizzle-orm'
import type { Transaction } from '../../db/open.ts'

/** Codes, substances and CAS numbers that live values of some subject hold, in one text. */
const wordsOf = (subject: SQL) => sql`(
  select string_agg(word, ' ' order by word) from property_values v, lateral (
    select jsonb_array_elements_text(v.value->'codes') as word
    union all select concat_ws(' ', v.value->>'name', v.value->>'cas') where v.property = 'ingredient'
  ) words where v.ended_at is null and ${subject})`

/** Text of mixes: their own words, and the names and words of their parts, so that a mix is found by what is in it. */
const mixText = sql`lower(concat_ws(' ', mixes.name, mixes.maker, mixes.chemistry,
  (select string_agg(p.name, ' ' order by mp.part) from mix_parts mp join products p on p.id = mp.product_id where mp.mix_id = mixes.id),
  ${wordsOf(sql`(v.mix_id = mixes.id or v.product_id in (select mp.product_id from mix_parts mp where mp.mix_id = mixes.id))`)}))`

/** Brings the text that a product is searched by up to date, and that of the mixes it is part of. */
export async function keepProductSearchText(tx: Transaction, productId: string): Promise<void> {
  await tx.execute(
    sql`update products set search_text = lower(concat_ws(' ', name, maker, kind, chemistry, ${wordsOf(sql`v.product_id = products.id`)})) where id = ${productId}`,
  )
  await tx.execute(
    sql`update mixes set search_text = ${mixText} where id in (select mix_id from mix_parts where product_id = ${productId})`,
  )
}

/** Brings the text that a mix is searched by up to date. */
export async function keepMixSearchText(tx: Transaction, mixId: string): Promise<void> {
  await tx.execute(sql`update mixes set search_text = ${mixText} where id = ${mixId}`)
}
