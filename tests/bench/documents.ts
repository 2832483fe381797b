import { readFile } from 'node:fs/promises'
import { join } from 'node:path'
import { Document, Packer, Paragraph } from 'docx'
import { getDocument } from 'pdfjs-dist/legacy/build/pdf.mjs'
import { printPdf } from '../../server/documents/print-pdf.ts'
import { readPages } from '../../server/features/sheets/page-reader.ts'
import { toDocx } from '../../server/features/specifications/docx.ts'
import { toPdf } from '../../server/features/specifications/pdf.ts'
import { specDocumentSchema } from '../../shared/domain/specification/document.ts'
import { beside, time } from './measure.ts'

const sheets = join(import.meta.dirname, '../../fixtures/demo-sheets')

/** Reading a sheet's words with their places, beside pdfjs-dist's own text of the same file. */
export async function reading() {
  const bytes = await readFile(join(sheets, 'ostrel-110-clear-part-b-safety.pdf'))
  const bare = async () => {
    const task = getDocument({ data: new Uint8Array(bytes), verbosity: 0, isEvalSupported: false })
    const document = await task.promise
    for (let number = 1; number <= document.numPages; number++) await (await document.getPage(number)).getTextContent()
    await task.destroy()
  }
  return beside(await time(20, () => readPages(new Uint8Array(bytes))), await time(20, bare))
}

/** Printing the demo's specification, beside the bare library printing the same words as paragraphs. */
export async function exporting(tree: unknown) {
  const document = specDocumentSchema.parse(tree)
  const words =
    JSON.stringify(document)
      .match(/"text":"[^"]*"/g)
      ?.map((text) => text.slice(8, -1)) ?? []
  const barePdf = () => printPdf({ content: words.map((text) => ({ text })) })
  const bareDocx = () => Packer.toBuffer(new Document({ sections: [{ children: words.map((text) => new Paragraph(text)) }] }))
  return {
    pdf: beside(await time(5, () => toPdf(document)), await time(5, barePdf)),
    docx: beside(await time(5, () => toDocx(document)), await time(5, bareDocx)),
  }
}
