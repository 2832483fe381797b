import type { Shape } from '../../shared/drawing/shapes.ts'

/** One shape of a figure as SVG of the page. */
function Drawn({ shape }: { shape: Shape }) {
  if (shape.kind === 'path') {
    const { d, fill = 'none', stroke, strokeWidth, dash, opacity } = shape
    return <path d={d} fill={fill} stroke={stroke} strokeWidth={strokeWidth} strokeDasharray={dash} opacity={opacity} />
  }
  const { x, y, text, size, fill, anchor, weight, rotate } = shape
  return (
    <text x={x} y={y} fontSize={size} fill={fill} textAnchor={anchor} fontWeight={weight} transform={rotate === undefined ? undefined : `rotate(${rotate} ${x} ${y})`}>
      {text}
    </text>
  )
}

/** All shapes of a figure; those of the lit course stand out by weight, the leader in the accent. */
export function Drawing({ shapes, lit }: { shapes: readonly Shape[]; lit?: string | null | undefined }) {
  return (
    <g aria-hidden="true">
      {shapes.map((shape, index) => {
        const shines = lit !== null && lit !== undefined && shape.course === lit
        const leader = shines && shape.kind === 'path' && shape.fill === undefined && shape.strokeWidth === 0.7
        return <Drawn key={index} shape={leader ? { ...shape, stroke: '#a8571a', strokeWidth: 1.6 } : shines && shape.kind === 'text' ? { ...shape, weight: 600, fill: '#a8571a' } : shape} />
      })}
    </g>
  )
}
