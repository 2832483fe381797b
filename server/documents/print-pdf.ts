import { createRequire } from 'node:module'
import { dirname, join } from 'node:path'

const require = createRequire(import.meta.url)

interface Pdfmake {
  setFonts(fonts: Record<string, Record<string, string>>): void
  setUrlAccessPolicy(policy: (url: string) => boolean): void
  setLocalAccessPolicy(policy: (path: string) => boolean): void
  createPdf(definition: object): { getBuffer(): Promise<Buffer> }
}

/** Folder of the TrueType files of Source Sans 3 (SIL Open Font License). */
const fontFolder = dirname(dirname(require.resolve('@expo-google-fonts/source-sans-3/400Regular/SourceSans3_400Regular.ttf')))
const face = (name: string) => join(fontFolder, name, `SourceSans3_${name}.ttf`)
export const fontFiles = {
  normal: face('400Regular'),
  bold: face('600SemiBold'),
  italics: face('400Regular_Italic'),
  bolditalics: face('600SemiBold_Italic'),
}
export const fontName = 'SourceSans3'

/** A part of a pdfmake document definition; the package brings no types. */
export type Content = string | ContentNode | Content[]
export interface ContentNode {
  [key: string]: unknown
}

let printer: Pdfmake | undefined

/** pdfmake with Source Sans 3, shut off from the network and from all files but its fonts. */
function openPrinter(): Pdfmake {
  const pdfmake = require('pdfmake') as Pdfmake
  pdfmake.setFonts({ [fontName]: fontFiles })
  pdfmake.setUrlAccessPolicy(() => false)
  pdfmake.setLocalAccessPolicy((path) => path.startsWith(fontFolder))
  return pdfmake
}

/** Prints a pdfmake document definition. The same definition gives the same bytes when its `info` has a fixed `creationDate`. */
export async function printPdf(definition: object): Promise<Uint8Array<ArrayBuffer>> {
  printer ??= openPrinter()
  const buffer = await printer.createPdf({ defaultStyle: { font: fontName, fontSize: 10 }, ...definition }).getBuffer()
  return new Uint8Array(buffer)
}
