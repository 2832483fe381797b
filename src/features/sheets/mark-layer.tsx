import { type KeyboardEvent, type PointerEvent, useEffect, useRef, useState } from 'react'
import type { Box } from '../../../shared/domain/fact.ts'
import type { PlacedWord } from '../../../shared/domain/sheet-text.ts'
import { type PageSize, between, closeAround, nudged, tenths } from './marking.ts'
import { placed } from './page-boxes.tsx'

interface MarkLayerProps {
  scale: number
  size: PageSize
  words: readonly PlacedWord[]
  box: Box | undefined
  onBox: (box: Box) => void
}

type Point = { x: number; y: number }
/** Points; with Alt a tenth. */
const stride = 5
const arrows: Record<string, Point> = {
  ArrowLeft: { x: -1, y: 0 },
  ArrowRight: { x: 1, y: 0 },
  ArrowUp: { x: 0, y: -1 },
  ArrowDown: { x: 0, y: 1 },
}

/**
 * Takes a box on the page: drawn with a pointer (sideways first on a touch screen, so that up and down still scroll), by a tap on a word,
 * or placed, moved (arrows) and sized (Shift and arrows) by keyboard. What was drawn closes around the words that it holds.
 */
export function MarkLayer({ scale, size, words, box, onBox }: MarkLayerProps) {
  const [drawing, setDrawing] = useState<{ from: Point; to: Point }>()
  const layer = useRef<HTMLDivElement>(null)
  const pointOf = (event: PointerEvent): Point => {
    const { left = 0, top = 0 } = layer.current?.getBoundingClientRect() ?? {}
    return { x: (event.clientX - left) / scale, y: (event.clientY - top) / scale }
  }
  const start = (event: PointerEvent) => {
    if (event.button !== 0) return
    event.currentTarget.setPointerCapture(event.pointerId)
    setDrawing({ from: pointOf(event), to: pointOf(event) })
  }
  const end = (event: PointerEvent) => {
    if (!drawing) return
    const drawn = between(drawing.from, pointOf(event), size)
    setDrawing(undefined)
    const tapped = drawn[2] - drawn[0] < 3 && drawn[3] - drawn[1] < 3
    if (!tapped) onBox(closeAround(words, drawn))
    else {
      const word = wordAt(words, drawing.from)
      if (word) onBox([word[1], word[2], word[3], word[4]])
    }
  }
  const shown = drawing ? between(drawing.from, drawing.to, size) : box
  return (
    <>
      <div
        ref={layer}
        className="absolute inset-0 cursor-crosshair touch-pan-y"
        data-mark-layer
        onPointerDown={start}
        onPointerMove={(event) => drawing && setDrawing({ ...drawing, to: pointOf(event) })}
        onPointerUp={end}
        onPointerCancel={() => setDrawing(undefined)}
      />
      {shown && <MarkedBox box={shown} scale={scale} size={size} onBox={onBox} />}
    </>
  )
}

function wordAt(words: readonly PlacedWord[], { x, y }: Point): PlacedWord | undefined {
  return words.find(([, left, top, right, bottom]) => x >= left && x <= right && y >= top && y <= bottom)
}

interface MarkedBoxProps {
  box: Box
  scale: number
  size: PageSize
  onBox: (box: Box) => void
}

function MarkedBox({ box, scale, size, onBox }: MarkedBoxProps) {
  const element = useRef<HTMLDivElement>(null)
  const where = box.map(tenths).join(', ')
  useEffect(() => {
    element.current?.scrollIntoView({ block: 'nearest', inline: 'nearest' })
  }, [where])
  const onKey = (event: KeyboardEvent) => {
    const arrow = arrows[event.key]
    if (!arrow) return
    event.preventDefault()
    event.stopPropagation()
    const by = event.altKey ? stride / 10 : stride
    onBox(nudged(box, { x: arrow.x * by, y: arrow.y * by }, { size, sizing: event.shiftKey }))
  }
  return (
    // eslint-disable-next-line jsx-a11y/no-noninteractive-element-interactions -- a two-dimensional control has no native element; the label says its keys
    <div
      ref={element}
      id="marked-box"
      role="application"
      aria-roledescription="marked place"
      aria-label={`Marked place at ${where} points. Arrow keys move it, with Shift they size it, with Alt in fine steps.`}
      // eslint-disable-next-line jsx-a11y/no-noninteractive-tabindex -- as above
      tabIndex={0}
      onKeyDown={onKey}
      data-box={box.join()}
      className="pointer-events-none absolute border-2 border-resin bg-resin-wash/60 mix-blend-multiply"
      style={placed(box, scale)}
    />
  )
}
