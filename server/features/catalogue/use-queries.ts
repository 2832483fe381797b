import { sql } from 'drizzle-orm'
import type { MixRecord } from '../../../shared/api/catalogue.ts'
import type { Database } from '../../db/open.ts'

type Use = MixRecord['usedIn'][number]

/** Where a product or a mix is used: mixes it is part of, build-up versions that lay it, jobs done by those and their specifications. */
export async function readUses(db: Database, { productId, mixId }: { productId?: string; mixId?: string }): Promise<Use[]> {
  const mixesOf = productId
    ? sql`select m.id, m.name from mixes m join mix_parts p on p.mix_id = m.id where p.product_id = ${productId}`
    : sql`select id, name from mixes where id = ${mixId}`
  const bySand = productId
    ? sql`or c.course->'filler'->>'productId' = ${productId} or c.course->'broadcast'->>'productId' = ${productId}`
    : sql``
  const { rows } = await db.execute<{ kind: Use['kind']; id: string; name: string; version: number | null }>(sql`
    with used_mixes as (${mixesOf}),
    versions as (
      select distinct v.id, v.number, b.id as build_up_id, b.name
      from courses c join build_up_versions v on v.id = c.version_id join build_ups b on b.id = v.build_up_id
      where c.mix_id in (select id from used_mixes) ${bySand}
    )
    select 'mix' as kind, id, name, null::int as version from used_mixes where ${productId !== undefined}
    union all select 'build-up', build_up_id, name, number from versions
    union all select 'job', j.id, j.name, null from jobs j where j.build_up_version_id in (select id from versions)
    union all select 'specification', s.id, s.title || ', ' || j.name, null from specifications s join jobs j on j.id = s.job_id
      where j.build_up_version_id in (select id from versions)
    order by 1, 3, 4`)
  return rows
}
