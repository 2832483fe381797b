import type { ReactNode } from 'react'
import { type PictogramCode, pictograms } from '../../shared/reference/ghs.ts'

/** Symbols drawn after the standard's description, black on white, inside the red diamond. Box 100 × 100, the diamond's half is 46. */
const symbols: Record<PictogramCode, ReactNode> = {
  GHS01: (
    <>
      <circle cx="46" cy="57" r="12" />
      <path d="M52 44l5-7 4 3-5 7z" />
      <path d="M62 36l3-9 2 8 8-4-5 7 9 2-9 3 5 7-8-4-2 8-3-9z" />
      <path d="M30 46l-9-3M33 66l-8 5M46 75v8M60 68l7 6" stroke="#000" strokeWidth="3" fill="none" />
    </>
  ),
  GHS02: (
    <path d="M51 19c3 12 15 17 15 33 0 6-2 9-5 12 1-6-1-10-5-14 0 6-2 9-5 11-3-4-4-9-2-15-8 6-10 13-8 20-5-3-7-8-7-14 0-13 14-18 17-33zM32 72h36v5H32z" />
  ),
  GHS03: (
    <>
      <circle cx="50" cy="61" r="13" fill="none" stroke="#000" strokeWidth="5" />
      <path d="M51 18c2 8 12 12 12 22 0 3-1 5-2 7-2-3-5-5-8-5-2-4-2-5-1-9-5 3-6 6-7 10-3 1-5 3-6 5-1-2-2-5-2-8 0-9 12-12 14-22zM30 77h40v5H30z" />
    </>
  ),
  GHS04: <path d="M24 58l40-17c6-2 11 0 13 4s-1 9-6 11L31 73c-4 1-8 0-9-5s-2-8 2-10zM17 62l4-2 5 11-4 2z" />,
  GHS05: (
    <>
      <path d="M27 26l20 8-2 4-20-8zM73 26l-20 8 2 4 20-8z" />
      <path d="M44 41l-3 8M40 53l-2 6M57 41l3 8M61 53l2 6" stroke="#000" strokeWidth="3.4" />
      <path d="M20 70h12l3-4 6 1 3 5h6v7H20zM54 72c4-5 6-9 12-9 7 0 14 3 16 6l-1 3-9-3 6 6-2 2-8-4 4 6H54z" />
    </>
  ),
  GHS06: (
    <>
      <path
        d="M50 22c-13 0-20 8-20 17 0 6 2 9 5 12v7h6v4h18v-4h6v-7c3-3 5-6 5-12 0-9-7-17-20-17zm-8 22a5 5 0 1 1 0-10 5 5 0 0 1 0 10zm16 0a5 5 0 1 1 0-10 5 5 0 0 1 0 10zm-8 9l-3-5h6z"
        fillRule="evenodd"
      />
      <path d="M27 64l46 16M73 64L27 80" stroke="#000" strokeWidth="5.5" strokeLinecap="round" />
    </>
  ),
  GHS07: (
    <>
      <path d="M44 24h12l-3 34h-6z" />
      <circle cx="50" cy="70" r="6.2" />
    </>
  ),
  GHS08: (
    <>
      <circle cx="50" cy="26" r="8" />
      <path d="M32 42c3-5 9-7 18-7s15 2 18 7l5 34H27z" />
      <path d="M50 40l3 9 8-5-4 8 9 3-9 3 4 8-8-4-3 9-3-9-8 4 4-8-9-3 9-3-4-8 8 5z" fill="#fff" />
    </>
  ),
  GHS09: (
    <>
      <path d="M18 74c10-6 20-5 28 0 8 4 18 4 34-3l-3 6c-12 5-22 6-31 2-8-4-16-4-26 0z" />
      <path d="M33 68V48l-9-8 2-2 7 5V32l-5-7 3-2 4 6 4-8 3 2-4 9v9l7-6 2 3-9 8v22z" />
      <path d="M50 60c4-6 11-9 18-6l7-5-1 8 4 6-8-2c-6 5-14 5-20-1zm15-2a1.6 1.6 0 1 0 0 3.2A1.6 1.6 0 0 0 65 58z" fillRule="evenodd" />
    </>
  ),
}

/** Drawn so much smaller, so that a wide symbol keeps clear of the diamond. */
const scales: Partial<Record<PictogramCode, number>> = {
  GHS01: 0.9,
  GHS02: 0.88,
  GHS03: 0.8,
  GHS04: 0.84,
  GHS05: 0.76,
  GHS06: 0.84,
  GHS08: 0.84,
  GHS09: 0.78,
}

/** A GHS pictogram with its name. */
export function Pictogram({ code, size = 52 }: { code: string; size?: number }) {
  if (!(code in pictograms)) return <span>{code}</span>
  const known = code as PictogramCode
  const { shows, means } = pictograms[known]
  return (
    <svg viewBox="0 0 100 100" width={size} height={size} role="img" aria-label={`${code}, ${shows}: ${means}`} className="shrink-0">
      <title>{`${shows}: ${means}`}</title>
      <path d="M50 4L96 50 50 96 4 50z" fill="#fff" stroke="#d5001c" strokeWidth="6" strokeLinejoin="miter" />
      <g transform={`translate(50 50) scale(${scales[known] ?? 1}) translate(-50 -50)`}>{symbols[known]}</g>
    </svg>
  )
}
