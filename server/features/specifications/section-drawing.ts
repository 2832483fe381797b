import { GlobalFonts, createCanvas, loadImage } from '@napi-rs/canvas'
import { sectionOf, sectionSvg, standaloneHeight } from '../../../shared/drawing/section.ts'
import type { SpecDocument } from '../../../shared/domain/specification/document.ts'
import { fontFiles } from '../../documents/print-pdf.ts'

const width = 680

/** The section drawing of a document as it stands by itself: SVG text, its size and what it shows in words. */
export function drawSection({ section }: SpecDocument, fontFamily: string) {
  const height = standaloneHeight(section.layers.length)
  const model = sectionOf(section.layers, { width, height, unit: section.unit, standalone: true })
  return { svg: sectionSvg(model, { fontFamily }), width: model.width, height: model.height, alternative: model.alternative }
}

const family = 'Source Sans 3'

/** The same as a picture, at three points a pixel: for word processors that draw no SVG. */
export async function paintSection(document: SpecDocument) {
  if (!GlobalFonts.has(family)) {
    GlobalFonts.registerFromPath(fontFiles.normal, family)
    GlobalFonts.registerFromPath(fontFiles.bold, family)
  }
  const drawing = drawSection(document, family)
  const scale = 3
  const canvas = createCanvas(drawing.width * scale, drawing.height * scale)
  const context = canvas.getContext('2d')
  context.fillStyle = '#ffffff'
  context.fillRect(0, 0, canvas.width, canvas.height)
  // The picture is drawn at the size that the SVG names.
  const large = drawing.svg.replace(
    `width="${drawing.width}" height="${drawing.height}"`,
    `width="${canvas.width}" height="${canvas.height}"`,
  )
  const image = await loadImage(Buffer.from(large))
  context.drawImage(image, 0, 0, canvas.width, canvas.height)
  return { ...drawing, png: await canvas.encode('png') }
}
