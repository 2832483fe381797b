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

/** Text state of ISO 32000-1, 9.3. */
const freshText = {
  font: undefined as GlyphRunFont | undefined, size: 0, direction: 1, charSpacing: 0, wordSpacing: 0, scale: 1, leading: 0, rise: 0,
}
type TextState = typeof freshText & { ctm: Matrix }

/**
 * Words of a page with their boxes, line by line in the order in which the page draws them.
 * Glyph positions follow ISO 32000-1, 9.4.4: advance = (width × size + character spacing + word spacing) × scale.
 */
export function placeWords({ operators, fontOf, toShown, size }: Input): PlacedText[][] {
  const writer = new LineWriter(size)
  let state: TextState = { ...freshText, ctm: toShown }
  const stack: TextState[] = []
  let matrix = identity
  let [x, y, lineX, lineY] = [0, 0, 0, 0]
  const move = (dx: number, dy: number) => {
    x = lineX += dx
    y = lineY += dy
  }
  const restore = () => {
    state = stack.pop() ?? state
  }
  operators.fnArray.forEach((operator, index) => {
    const args = (operators.argsArray[index] ?? []) as unknown[]
    const [first = 0, second = 0] = args as number[]
    switch (operator) {
      case OPS.save:
        stack.push({ ...state })
        break
      case OPS.restore:
      case OPS.paintFormXObjectEnd:
        restore()
        break
      case OPS.paintFormXObjectBegin:
        stack.push({ ...state })
        if (args[0]) state.ctm = times(state.ctm, args[0] as Matrix)
        break
      case OPS.transform:
        state.ctm = times(state.ctm, args as number[])
        break
      case OPS.beginText:
        matrix = identity
        x = y = lineX = lineY = 0
        break
      case OPS.setTextMatrix:
        matrix = (args.length === 1 ? Array.from(args[0] as ArrayLike<number>) : args) as Matrix
        x = y = lineX = lineY = 0
        break
      case OPS.moveText:
        move(first, second)
        break
      case OPS.setLeadingMoveText:
        state.leading = second
        move(first, second)
        break
      case OPS.setLeading:
        state.leading = -first
        break
      case OPS.nextLine:
        move(0, state.leading)
        break
      case OPS.setFont:
        state.font = fontOf(args[0] as string)
        state.size = Math.abs(second)
        state.direction = second < 0 ? -1 : 1
        break
      case OPS.setCharSpacing:
        state.charSpacing = first
        break
      case OPS.setWordSpacing:
        state.wordSpacing = first
        break
      case OPS.setHScale:
        state.scale = first / 100
        break
      case OPS.setTextRise:
        state.rise = first
        break
      case OPS.showText: {
        const [dx, dy] = showGlyphs({ glyphs: args[0] as (Glyph | number)[], state, matrix: times(state.ctm, matrix), x, y, writer })
        x += dx
        y += dy
        break
      }
    }
  })
  return writer.lines()
}

interface Run {
  glyphs: (Glyph | number)[]
  state: TextState
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
      rect: vertical ? [x - width / 2, y - pen - advance, x + width / 2, y - pen] : [left, base + descent, left + width * scale, base + ascent],
    })
    pen += advance
  }
  return vertical ? [0, -pen] : [pen * scale, 0]
}

/** A font's own measure as far as it can be believed. */
function within(value: number | undefined, [least, most]: [number, number], otherwise: number): number {
  return value === undefined || !Number.isFinite(value) || value === 0 ? otherwise : Math.min(most, Math.max(least, value))
}
