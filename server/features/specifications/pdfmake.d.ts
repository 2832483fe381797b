/** The part of pdfmake 0.3 on the server that is used here; the package brings no types. */
declare module 'pdfmake' {
  export type Content = string | ContentNode | Content[]
  export interface ContentNode {
    [key: string]: unknown
  }
  interface FontFiles {
    normal: string
    bold: string
    italics: string
    bolditalics: string
  }
  interface PdfMake {
    setFonts(fonts: Record<string, FontFiles>): void
    setUrlAccessPolicy(allow: (url: string) => boolean): void
    setLocalAccessPolicy(allow: (path: string) => boolean): void
    createPdf(definition: Record<string, unknown>): { getBuffer(): Promise<Buffer> }
  }
  const pdfmake: PdfMake
  export default pdfmake
}
