import { memo, useMemo } from 'react'
import { type Shape, ink } from '../../shared/drawing/shapes.ts'

/** One shape of a figure as SVG of the page. */
function Drawn({ shape }: { shape: Shape }) {
  if (shape.kind === 'path') {
    const { d, fill = 'none', stroke, strokeWidth, dash, opacity } = shape
    return <path d={d} fill={fill} stroke={stroke} strokeWidth={strokeWidth} strokeDasharray={dash} opacity={opacity} />
  }
  const { x, y, text, size, fill, anchor, weight, rotate } = shape
  return (
    <text
      x={x}
      y={y}
      fontSize={size}
      fill={fill}
      textAnchor={anchor}
      fontWeight={weight}
      transform={rotate === undefined ? undefined : `rotate(${rotate} ${x} ${y})`}
    >
      {text}
    </text>
  )
}

/** The shapes of one course; drawn anew only when it or its light changes. */
const Group = memo(function Group({ shapes, lit }: { shapes: readonly Shape[]; lit: boolean }) {
  return shapes.map((shape, index) => <Drawn key={index} shape={lit ? litShape(shape) : shape} />)
})

/** Leaders and words of the lit course stand out in the accent. */
function litShape(shape: Shape): Shape {
  if (shape.kind === 'text') return { ...shape, weight: 600, fill: ink.resin }
  return shape.role === 'leader' ? { ...shape, stroke: ink.resin, strokeWidth: 1.6 } : shape
}

/** Shapes in drawing order, as runs of one course. */
function runsOf(shapes: readonly Shape[]): Shape[][] {
  const runs: Shape[][] = []
  for (const shape of shapes) {
    const last = runs.at(-1)
    if (last && last[0]?.course === shape.course) last.push(shape)
    else runs.push([shape])
  }
  return runs
}

/** All shapes of a figure; the course pointed at is lit. */
export function Drawing({ shapes, lit }: { shapes: readonly Shape[]; lit?: string | null | undefined }) {
  const runs = useMemo(() => runsOf(shapes), [shapes])
  return (
    <g aria-hidden="true">
      {runs.map((run, index) => (
        <Group key={index} shapes={run} lit={lit !== null && lit !== undefined && run[0]?.course === lit} />
      ))}
    </g>
  )
}
