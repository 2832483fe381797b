import { Notice } from '../../ui/page.tsx'

/** Says which sheets beneath a document have been replaced. */
export function SupersededNotice({ titles }: { titles: readonly string[] }) {
  if (titles.length === 0) return null
  return (
    <div className="no-print mb-4">
      <Notice tone="caution">
        Rests on a superseded sheet: {titles.join(', ')}. A newer revision is loaded. What is written here holds for the revision named in
        the schedule of products and sheets.
      </Notice>
    </div>
  )
}
