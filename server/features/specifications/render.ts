import type { SpecDocument } from '../../../shared/domain/specification/document.ts'

/** The two files of a document. Their makers are heavy and are loaded when first asked for, not when the server starts. */
export const render = {
  docx: async (document: SpecDocument): Promise<Buffer> => (await import('./docx.ts')).toDocx(document),
  pdf: async (document: SpecDocument): Promise<Buffer> => (await import('./pdf.ts')).toPdf(document),
}
