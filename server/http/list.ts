import { AppError } from '../../shared/api/errors.ts'

/** Where a page of a list begins; cursors are opaque to callers. */
export function offsetOf(cursor: string | undefined): number {
  if (cursor === undefined) return 0
  const text = Buffer.from(cursor, 'base64url').toString('latin1')
  if (!/^\d{1,9}$/.test(text)) throw new AppError('malformed', { fields: { cursor: 'This cursor is not one of ours.' } })
  return Number(text)
}

const cursorOf = (offset: number) => Buffer.from(String(offset), 'latin1').toString('base64url')

/** A page of a list with the cursors to the pages beside it. */
export function pageOf<T>(items: T[], place: { offset: number; limit: number; total: number }) {
  const { offset, limit, total } = place
  return {
    items,
    total,
    nextCursor: offset + items.length < total ? cursorOf(offset + limit) : null,
    previousCursor: offset > 0 ? cursorOf(Math.max(0, offset - limit)) : null,
  }
}
