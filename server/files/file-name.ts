const longest = 180

/** A file's name as it may be kept and shown: no folders, no control or direction-changing characters, not too long, with its ending. */
export function cleanFileName(name: string, ending: string): string {
  const last = name.split(/[/\\]/).at(-1) ?? ''
  const clean = last
    .normalize('NFC')
    .replace(/[\p{Cc}\p{Cf}\p{Cs}\p{Co}\p{Zl}\p{Zp}]/gu, '')
    .replace(/[<>:"|?*]/g, '_')
    .replace(/\s+/g, ' ')
    .trim()
  const stem = clean.toLowerCase().endsWith(ending) ? clean.slice(0, -ending.length) : clean
  const kept = Array.from(stem.replace(/^[\s.]+|[\s.]+$/g, ''))
    .slice(0, longest)
    .join('')
    .trim()
  return `${kept || 'sheet'}${ending}`
}
