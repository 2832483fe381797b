interface Page {
  lines?: string[]
  /** Degrees clockwise. */
  rotate?: 0 | 90 | 180 | 270
}

/** A small PDF written by hand after ISO 32000-1, 7.5: Letter pages, Helvetica 12, one line every 20 points from (72, 720). */
export function makePdf(pages: Page[], options: { catalog?: string; objects?: string[] } = {}): Buffer {
  const objects: string[] = []
  const first = 3 + (options.objects?.length ?? 0)
  const kids = pages.map((_, index) => `${first + 1 + index * 2} 0 R`)
  objects.push(`<< /Type /Catalog /Pages 2 0 R ${options.catalog ?? ''} >>`)
  objects.push(`<< /Type /Pages /Count ${pages.length} /Kids [${kids.join(' ')}] >>`)
  objects.push(...(options.objects ?? []))
  objects.push('<< /Type /Font /Subtype /Type1 /BaseFont /Helvetica /Encoding /WinAnsiEncoding >>')
  pages.forEach(({ lines = [], rotate = 0 }, index) => {
    const content = lines.map((line, at) => `BT /F1 12 Tf 72 ${720 - at * 20} Td (${line.replace(/[\\()]/g, '\\$&')}) Tj ET`).join('\n')
    objects.push(
      `<< /Type /Page /Parent 2 0 R /MediaBox [0 0 612 792] /Rotate ${rotate} /Resources << /Font << /F1 ${first} 0 R >> >> /Contents ${first + 2 + index * 2} 0 R >>`,
    )
    objects.push(`<< /Length ${Buffer.byteLength(content, 'latin1')} >>\nstream\n${content}\nendstream`)
  })
  return withCrossReferences(objects)
}

function withCrossReferences(objects: string[]): Buffer {
  let text = '%PDF-1.7\n%\xe2\xe3\xcf\xd3\n'
  const offsets = objects.map((object, index) => {
    const offset = text.length
    text += `${index + 1} 0 obj\n${object}\nendobj\n`
    return offset
  })
  const rows = offsets.map((offset) => `${String(offset).padStart(10, '0')} 00000 n \n`).join('')
  text += `xref\n0 ${objects.length + 1}\n0000000000 65535 f \n${rows}trailer\n<< /Size ${objects.length + 1} /Root 1 0 R >>\nstartxref\n${text.length}\n%%EOF\n`
  return Buffer.from(text, 'latin1')
}
