import { OPS } from 'pdfjs-dist/legacy/build/pdf.mjs'
import type { PlacedText } from '../../db/schema/sheets.ts'
import { LineWriter, type Matrix, times } from './line-writer.ts'

/** What is needed of a font to place its glyphs. */
export interface GlyphRunFont {
  fontMatrix?: Matrix
  ascent?: number
  descent?: number
  vertical?: boolean
  isType3Font?: boolean
}
interface Glyph {
  unicode: string
  width: number
  isSpace: boolean
  vmetric?: number[] | null
}
interface Input {
  operators: { fnArray: number[]; argsArray: unknown[] }
  fontOf: (name: string) => GlyphRunFont | undefined
  /** From the page's own space (origin bottom left) to points from the top-left corner as shown. */
  toShown: Matrix
  size: { width: number; height: number }
}

const identity: Matrix = [1, 0, 0, 1, 0, 0]
const fontIdentity: Matrix = [0.001, 0, 0, 0.001, 0, 0]

/** Of the em, where a font does not say. */
const usualAscent = 0.8
const usualDescent = -0.2

/** Graphics and text state of ISO 32000-1, 8.4 and 9.3: what `q` keeps and `Q` brings back. */
interface State {
  ctm: Matrix
  font: GlyphRunFont | undefined
  size: number
  direction: 1 | -1
  charSpacing: number
  wordSpacing: number
  scale: number
  leading: number
  rise: number
}

/** Follows a page's operators as a viewer does and writes down where glyphs fall. */
class Pen {
  readonly writer: LineWriter
  readonly #fontOf: Input['fontOf']
  readonly #stack: State[] = []
  #state: State
  #matrix: Matrix = identity
  #at = { x: 0, y: 0, lineX: 0, lineY: 0 }

  constructor({ fontOf, toShown, size }: Input) {
    this.writer = new LineWriter(size)
    this.#fontOf = fontOf
    this.#state = { ctm: toShown, font: undefined, size: 0, direction: 1, charSpacing: 0, wordSpacing: 0, scale: 1, leading: 0, rise: 0 }
  }

  save(): void {
    this.#stack.push({ ...this.#state })
  }
  restore(): void {
    this.#state = this.#stack.pop() ?? this.#state
  }
  transform(matrix: Matrix): void {
    this.#state.ctm = times(this.#state.ctm, matrix)
  }
  set(change: Partial<State>): void {
    Object.assign(this.#state, change)
  }
  setFont(name: string, size: number): void {
    this.set({ font: this.#fontOf(name), size: Math.abs(size), direction: size < 0 ? -1 : 1 })
  }
  setMatrix(matrix: Matrix): void {
    this.#matrix = matrix
    this.#at = { x: 0, y: 0, lineX: 0, lineY: 0 }
  }
  move(dx: number, dy: number): void {
    const { lineX, lineY } = this.#at
    this.#at = { x: lineX + dx, y: lineY + dy, lineX: lineX + dx, lineY: lineY + dy }
  }
  nextLine(): void {
    this.move(0, this.#state.leading)
  }
  show(glyphs: (Glyph | number)[]): void {
    const [dx, dy] = showGlyphs({
      glyphs,
      state: this.#state,
      matrix: times(this.#state.ctm, this.#matrix),
      ...this.#at,
      writer: this.writer,
    })
    this.#at = { ...this.#at, x: this.#at.x + dx, y: this.#at.y + dy }
  }
}

const numbers = (args: unknown[]) => args as number[]
const number = (args: unknown[], index = 0) => numbers(args)[index] ?? 0

const operations: Record<number, (pen: Pen, args: unknown[]) => void> = {
  [OPS.save]: (pen) => pen.save(),
  [OPS.restore]: (pen) => pen.restore(),
  [OPS.transform]: (pen, args) => pen.transform(numbers(args)),
  [OPS.paintFormXObjectBegin]: (pen, [matrix]) => {
    pen.save()
    if (matrix) pen.transform(matrix as Matrix)
  },
  [OPS.paintFormXObjectEnd]: (pen) => pen.restore(),
  [OPS.beginText]: (pen) => pen.setMatrix(identity),
  [OPS.setTextMatrix]: (pen, args) => pen.setMatrix(args.length === 1 ? Array.from(args[0] as ArrayLike<number>) : numbers(args)),
  [OPS.moveText]: (pen, args) => pen.move(number(args), number(args, 1)),
  [OPS.setLeadingMoveText]: (pen, args) => {
    pen.set({ leading: number(args, 1) })
    pen.move(number(args), number(args, 1))
  },
  [OPS.setLeading]: (pen, args) => pen.set({ leading: -number(args) }),
  [OPS.nextLine]: (pen) => pen.nextLine(),
  [OPS.setFont]: (pen, args) => pen.setFont(args[0] as string, number(args, 1)),
  [OPS.setCharSpacing]: (pen, args) => pen.set({ charSpacing: number(args) }),
  [OPS.setWordSpacing]: (pen, args) => pen.set({ wordSpacing: number(args) }),
  [OPS.setHScale]: (pen, args) => pen.set({ scale: number(args) / 100 }),
  [OPS.setTextRise]: (pen, args) => pen.set({ rise: number(args) }),
  [OPS.showText]: (pen, args) => pen.show(args[0] as (Glyph | number)[]),
}

/**
 * Words of a page with their boxes, line by line in the order in which the page draws them.
 * Glyph positions follow ISO 32000-1, 9.4.4: advance = (width × size + character spacing + word spacing) × scale.
 */
export function placeWords(input: Input): PlacedText[][] {
  const pen = new Pen(input)
  const { fnArray, argsArray } = input.operators
  fnArray.forEach((operator, index) => operations[operator]?.(pen, (argsArray[index] ?? []) as unknown[]))
  return pen.writer.lines()
}

interface Run {
  glyphs: (Glyph | number)[]
  state: State
  matrix: Matrix
  x: number
  y: number
  writer: LineWriter
}

/** Places the glyphs of one operator and tells how far it moved the pen, in text space. */
function showGlyphs({ glyphs, state, matrix, x, y, writer }: Run): [number, number] {
  const { font, size, direction } = state
  const fontMatrix = font?.fontMatrix ?? fontIdentity
  const perUnit = size * (fontMatrix[0] ?? 0.001)
  const scale = state.scale * direction
  const ascent = size * direction * (font?.isType3Font ? usualAscent : within(font?.ascent, [0.5, 1.2], usualAscent))
  const descent = size * direction * (font?.isType3Font ? usualDescent : within(font?.descent, [-0.5, 0], usualDescent))
  const vertical = font?.vertical === true
  let pen = 0
  for (const glyph of glyphs) {
    if (typeof glyph === 'number') {
      pen += ((vertical ? 1 : -1) * glyph * size) / 1000
      continue
    }
    const spacing = ((glyph.isSpace ? state.wordSpacing : 0) + state.charSpacing) * direction
    const width = glyph.width * perUnit
    const advance = (vertical ? Math.abs(glyph.vmetric?.[0] ?? 1000) * perUnit : width) + spacing
    const left = x + pen * scale
    const base = y + state.rise
    writer.glyph(glyph.unicode, {
      matrix,
      em: size,
      from: vertical ? [x, y - pen] : [left, base],
      to: vertical ? [x, y - pen - advance] : [left + advance * scale, base],
      rect: vertical
        ? [x - width / 2, y - pen - advance, x + width / 2, y - pen]
        : [left, base + descent, left + width * scale, base + ascent],
    })
    pen += advance
  }
  return vertical ? [0, -pen] : [pen * scale, 0]
}

/** A font's own measure as far as it can be believed. */
function within(value: number | undefined, [least, most]: [number, number], otherwise: number): number {
  return value === undefined || !Number.isFinite(value) || value === 0 ? otherwise : Math.min(most, Math.max(least, value))
}
