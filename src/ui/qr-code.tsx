import QRCode from 'qrcode'
import { useMemo } from 'react'

interface QrCodeProps {
  /** The address in the code. */
  text: string
  label: string
}

/** A QR code as one path, with the quiet zone of four modules that scanners ask for (ISO/IEC 18004). */
export function QrCode({ text, label }: QrCodeProps) {
  const { size, path } = useMemo(() => {
    const { modules } = QRCode.create(text, { errorCorrectionLevel: 'Q' })
    let drawn = ''
    for (let row = 0; row < modules.size; row++) {
      for (let column = 0; column < modules.size; column++) if (modules.get(row, column)) drawn += `M${column + 4} ${row + 4}h1v1h-1z`
    }
    return { size: modules.size + 8, path: drawn }
  }, [text])
  return (
    <svg
      viewBox={`0 0 ${size} ${size}`}
      role="img"
      aria-label={`${label}: ${text}`}
      className="w-full max-w-48 border border-rule bg-white"
      shapeRendering="crispEdges"
    >
      <path d={path} fill="#000" />
    </svg>
  )
}
