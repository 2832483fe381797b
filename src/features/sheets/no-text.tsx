/** Said wherever a PDF of pictures alone is met. */
export function NoText() {
  return (
    <span className="text-caution">
      <span aria-hidden="true">▲</span> Its pages are pictures without text: it can be looked at, but nothing can be read or searched in it.
    </span>
  )
}
