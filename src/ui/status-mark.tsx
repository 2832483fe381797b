type Status = 'met' | 'caution' | 'stop' | 'unknown'
const marks: Record<Status, { shape: string; color: string; word: string }> = {
  stop: { shape: '■', color: 'text-stop', word: 'Stop' },
  caution: { shape: '▲', color: 'text-caution', word: 'Caution' },
  met: { shape: '●', color: 'text-met', word: 'Met' },
  unknown: { shape: '◌', color: 'text-unknown', word: 'Unknown' },
}

/** Shape, colour and word of what a check says: never the colour alone. */
export function StatusMark({ status, wordless = false }: { status: Status; wordless?: boolean }) {
  const { shape, color, word } = marks[status]
  return (
    <span className={`font-semibold whitespace-nowrap ${color}`}>
      <span aria-hidden="true">{shape}</span>
      <span className={wordless ? 'sr-only' : ''}> {word}</span>
    </span>
  )
}
