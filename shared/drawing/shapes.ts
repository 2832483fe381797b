/** What a figure is made of: plain geometry in pixels, so that a browser, a PDF and a document draw the same. */
interface PathShape {
  kind: 'path'
  d: string
  fill?: string
  stroke?: string
  strokeWidth?: number
  dash?: string
  opacity?: number
  /** The course it belongs to. */
  course?: string
  /** A line that leads from a course to its row. */
  role?: 'leader'
}

interface TextShape {
  kind: 'text'
  x: number
  y: number
  text: string
  size: number
  fill: string
  anchor?: 'start' | 'middle' | 'end'
  weight?: 400 | 600
  /** Degrees about its own place. */
  rotate?: number
  course?: string
}
export type Shape = PathShape | TextShape

/** Colours of the drawing: the tokens of the product's look, in hex, for renderers without a style sheet. */
export const ink = {
  ink: '#1c2326',
  pencil: '#5c676a',
  rule: '#d9d4c6',
  card: '#fffefb',
  resin: '#a8571a',
  wash: '#f6e7d6',
  stop: '#a3241d',
  slab: '#c8cac4',
  unknown: '#e9e5da',
} as const

const round = (value: number) => Math.round(value * 10) / 10

export type Point = readonly [x: number, y: number]

/** A line through points; closed when it is an outline. */
export function pathOf(points: readonly Point[], closed = false): string {
  return points.map(([x, y], index) => `${index === 0 ? 'M' : 'L'}${round(x)} ${round(y)}`).join('') + (closed ? 'Z' : '')
}

const escapes: Record<string, string> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;', "'": '&#39;' }
const escaped = (text: string) => text.replace(/[&<>"']/g, (sign) => escapes[sign] ?? sign)

function shapeSvg(shape: Shape): string {
  if (shape.kind === 'path') {
    const { d, fill = 'none', stroke, strokeWidth = 1, dash, opacity } = shape
    const line = stroke ? ` stroke="${stroke}" stroke-width="${strokeWidth}"${dash ? ` stroke-dasharray="${dash}"` : ''}` : ''
    return `<path d="${d}" fill="${fill}"${line}${opacity === undefined ? '' : ` opacity="${opacity}"`}/>`
  }
  const { x, y, text, size, fill, anchor = 'start', weight = 400, rotate } = shape
  const turn = rotate === undefined ? '' : ` transform="rotate(${rotate} ${round(x)} ${round(y)})"`
  return `<text x="${round(x)}" y="${round(y)}" font-size="${size}" fill="${fill}" text-anchor="${anchor}" font-weight="${weight}"${turn}>${escaped(text)}</text>`
}

/** A figure as a string of SVG that stands by itself: for documents, where no browser draws. */
export function svgOf(
  model: { width: number; height: number; shapes: readonly Shape[]; alternative: string },
  { fontFamily = 'Source Sans 3' } = {},
): string {
  const { width, height } = model
  return (
    `<svg xmlns="http://www.w3.org/2000/svg" width="${width}" height="${height}" viewBox="0 0 ${width} ${height}" role="img" font-family="${escaped(fontFamily)}">` +
    `<title>${escaped(model.alternative)}</title>${model.shapes.map(shapeSvg).join('')}</svg>`
  )
}

/** Width of a line of Source Sans 3 in pixels, near enough to place and break text where nothing can measure it. */
export function textWidth(text: string, size: number): number {
  return (
    Array.from(text).reduce(
      (sum, sign) => sum + (/[ilj.,:;'|!()[\]]/.test(sign) ? 0.27 : /[mwMW@%—]/.test(sign) ? 0.78 : /[A-Z×²³µ]/.test(sign) ? 0.57 : 0.495),
      0,
    ) * size
  )
}

/** Breaks words into lines no wider than `width`. */
export function wrap(text: string, { width, size }: { width: number; size: number }): string[] {
  const lines: string[] = []
  for (const word of text.split(' ')) {
    const last = lines.at(-1)
    const longer = last === undefined ? word : `${last} ${word}`
    if (last !== undefined && textWidth(longer, size) <= width) lines[lines.length - 1] = longer
    else lines.push(word)
  }
  return lines
}

/** Moves places apart to at least `gap` with the least shift, keeping their order and the bounds. */
export function spread(wanted: readonly number[], { gap, from, to }: { gap: number; from: number; to: number }): number[] {
  const groups: { sum: number; count: number }[] = []
  const start = (group: { sum: number; count: number }) => {
    const span = (group.count - 1) * gap
    return Math.min(Math.max(group.sum / group.count - span / 2, from), Math.max(from, to - span))
  }
  for (const place of wanted) {
    groups.push({ sum: place, count: 1 })
    for (
      let last = groups.at(-1), before = groups.at(-2);
      last && before && start(before) + before.count * gap > start(last);
      last = groups.at(-1), before = groups.at(-2)
    ) {
      groups.splice(-2, 2, { sum: before.sum + last.sum, count: before.count + last.count })
    }
  }
  return groups.flatMap((group) => Array.from({ length: group.count }, (_, index) => start(group) + index * gap))
}
