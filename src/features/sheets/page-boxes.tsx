import { type CSSProperties, useEffect, useRef } from 'react'
import type { Box } from '../../../shared/domain/fact.ts'

/** Place of a box of points on a page shown at `scale`. */
export function placed([left, top, right, bottom]: Box, scale: number): CSSProperties {
  // Room between the words and the line around them; less where all is small.
  const air = scale < 1 ? 1 : 2
  return {
    left: left * scale - air,
    top: top * scale - air,
    width: (right - left) * scale + 2 * air,
    height: (bottom - top) * scale + 2 * air,
  }
}

interface PageBoxesProps {
  scale: number
  /** The place a value is cited from: drawn in resin and scrolled to. */
  cited: Box | undefined
  /** Places of the phrase looked for on this page. */
  hits: { boxes: Box[]; current: boolean }[]
}

/** Boxes over a page. They let pointers through, so that the text beneath can be selected. */
export function PageBoxes({ scale, cited, hits }: PageBoxesProps) {
  return (
    <div className="pointer-events-none absolute inset-0 mix-blend-multiply">
      {hits.flatMap(({ boxes, current }, hit) =>
        boxes.map((box, line) => (
          <ShownBox
            key={`${hit}-${line}`}
            box={box}
            scale={scale}
            reach={current && line === 0}
            className={current ? 'border-2 border-ink bg-resin-wash' : 'bg-resin-wash'}
          />
        )),
      )}
      {cited && <ShownBox box={cited} scale={scale} reach label="The cited place" className="border-2 border-resin bg-resin-wash/60" />}
    </div>
  )
}

interface ShownBoxProps {
  box: Box
  scale: number
  /** Scroll to it when it appears. */
  reach: boolean
  label?: string
  className: string
}

function ShownBox({ box, scale, reach, label, className }: ShownBoxProps) {
  const element = useRef<HTMLDivElement>(null)
  const where = box.join()
  useEffect(() => {
    if (reach) element.current?.scrollIntoView({ block: 'center', inline: 'nearest' })
  }, [reach, where])
  return (
    <div
      ref={element}
      role={label ? 'img' : undefined}
      aria-label={label}
      data-box={where}
      className={`absolute ${className}`}
      style={placed(box, scale)}
    />
  )
}
