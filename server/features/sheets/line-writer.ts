import type { PlacedText } from '../../db/schema/sheets.ts'

/** `[a, b, c, d, e, f]` of ISO 32000-1, 8.3.3. */
export type Matrix = readonly number[]
type Point = readonly [number, number]

export function times(a: Matrix, b: Matrix): Matrix {
  const [a0 = 1, a1 = 0, a2 = 0, a3 = 1, a4 = 0, a5 = 0] = a
  const [b0 = 1, b1 = 0, b2 = 0, b3 = 1, b4 = 0, b5 = 0] = b
  return [a0 * b0 + a2 * b1, a1 * b0 + a3 * b1, a0 * b2 + a2 * b3, a1 * b2 + a3 * b3, a0 * b4 + a2 * b5 + a4, a1 * b4 + a3 * b5 + a5]
}

function shown([a = 1, b = 0, c = 0, d = 1, e = 0, f = 0]: Matrix, [x, y]: Point): [number, number] {
  return [a * x + c * y + e, b * x + d * y + f]
}

interface PlacedGlyph {
  /** From text space to points from the page's top-left corner as shown. */
  matrix: Matrix
  /** Font size in text space. */
  em: number
  /** Where the pen stood and where it went, in text space. */
  from: Point
  to: Point
  /** Left, bottom, right, top in text space. */
  rect: readonly [number, number, number, number]
}

/** Gaps and steps in ems. Spaces are seldom below 0.2 em, kerning seldom above 0.1; a superscript rises about 0.4. */
const wordGap = 0.15
const lineStep = 0.6
const stepBack = 0.5

/** Joins glyphs to words and words to lines, in the order in which they are drawn. */
export class LineWriter {
  readonly #size: { width: number; height: number }
  readonly #lines: PlacedText[][] = []
  #line: PlacedText[] = []
  #word: PlacedText | undefined
  #pen: [number, number] | undefined
  #em = 0

  constructor(size: { width: number; height: number }) {
    this.#size = size
  }

  glyph(unicode: string, { matrix, em, from, to, rect }: PlacedGlyph): void {
    const start = shown(matrix, from)
    const end = shown(matrix, to)
    const shownEm = em * Math.hypot(matrix[2] ?? 0, matrix[3] ?? 0)
    this.#breakBefore({ start, end, em: shownEm })
    this.#pen = end
    this.#em = shownEm
    const text = cleaned(unicode)
    if (text === '' || /^\s+$/.test(text)) {
      if (unicode !== '' && text !== '') this.#endWord()
      return
    }
    const corners = [shown(matrix, [rect[0], rect[1]]), shown(matrix, [rect[2], rect[3]])] as const
    const others = [shown(matrix, [rect[0], rect[3]]), shown(matrix, [rect[2], rect[1]])] as const
    const xs = [...corners, ...others].map(([x]) => x)
    const ys = [...corners, ...others].map(([, y]) => y)
    this.#add([text, Math.min(...xs), Math.min(...ys), Math.max(...xs), Math.max(...ys)])
  }

  lines(): PlacedText[][] {
    this.#endLine()
    return this.#lines
  }

  /** Measures the step from where the pen was, along and across the new glyph's own direction. */
  #breakBefore({ start, end, em }: { start: Point; end: Point; em: number }): void {
    if (!this.#pen) return
    const larger = Math.max(em, this.#em) || 1
    const step: Point = [start[0] - this.#pen[0], start[1] - this.#pen[1]]
    const length = Math.hypot(end[0] - start[0], end[1] - start[1])
    const along: Point = length > 0 ? [(end[0] - start[0]) / length, (end[1] - start[1]) / length] : [1, 0]
    const forward = step[0] * along[0] + step[1] * along[1]
    const across = Math.abs(step[0] * along[1] - step[1] * along[0])
    if (across > lineStep * larger || forward < -stepBack * larger) this.#endLine()
    else if (forward > wordGap * larger) this.#endWord()
  }

  #add(glyph: PlacedText): void {
    const word = this.#word
    if (!word) {
      this.#word = glyph
      return
    }
    word[0] += glyph[0]
    word[1] = Math.min(word[1], glyph[1])
    word[2] = Math.min(word[2], glyph[2])
    word[3] = Math.max(word[3], glyph[3])
    word[4] = Math.max(word[4], glyph[4])
  }

  #endWord(): void {
    const word = this.#word
    this.#word = undefined
    if (!word || !this.#isOnPage(word)) return
    const placed: PlacedText = [word[0], round(word[1]), round(word[2]), round(word[3]), round(word[4])]
    if (!this.#isRepeat(placed)) this.#line.push(placed)
  }

  #endLine(): void {
    this.#endWord()
    if (this.#line.length > 0) this.#lines.push(this.#line)
    this.#line = []
  }

  #isOnPage([, left, top, right, bottom]: PlacedText): boolean {
    return right > 0 && bottom > 0 && left < this.#size.width && top < this.#size.height
  }

  /** Bold is sometimes made by drawing the same words again a hair beside. */
  #isRepeat([text, left, top]: PlacedText): boolean {
    const before = [...(this.#lines.at(-1) ?? []), ...this.#line]
    return before.some((other) => other[0] === text && Math.abs(other[1] - left) < 1 && Math.abs(other[2] - top) < 1)
  }
}

const round = (points: number) => Math.round(points * 10) / 10

/** Ligatures spelt out; characters that no text may hold dropped. */
function cleaned(unicode: string): string {
  return unicode
    .replace(/[\uFB00-\uFB06]/g, (ligature) => ligature.normalize('NFKC'))
    .replace(/[\p{Cc}\p{Cs}\p{Cf}]/gu, (character) => (/[\t\n\r]/.test(character) ? ' ' : ''))
}
