import { createRequire } from 'node:module'
import { dirname, join } from 'node:path'

const folder = dirname(createRequire(import.meta.url).resolve('@expo-google-fonts/source-sans-3/package.json'))
const file = (style: string) => join(folder, style, `SourceSans3_${style}.ttf`)

/** Source Sans 3 as TrueType files, by their paths: for documents made on the server. */
export const fontFiles = {
  normal: file('400Regular'),
  bold: file('600SemiBold'),
  italics: file('400Regular_Italic'),
  bolditalics: file('600SemiBold_Italic'),
}
export const fontFolder = folder
