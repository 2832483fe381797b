const cMaps = import.meta.glob<string>('/node_modules/pdfjs-dist/cmaps/*.bcmap', { query: '?url', import: 'default', eager: true })
const fonts = import.meta.glob<string>('/node_modules/pdfjs-dist/standard_fonts/*.{pfb,ttf}', {
  query: '?url',
  import: 'default',
  eager: true,
})
const decoders = import.meta.glob<string>('/node_modules/pdfjs-dist/wasm/*.wasm', { query: '?url', import: 'default', eager: true })
const profiles = import.meta.glob<string>('/node_modules/pdfjs-dist/iccs/*.icc', { query: '?url', import: 'default', eager: true })

/** Addresses in our own build of the character maps, substitute fonts and decoders that a PDF may call for, by file name. */
export const ownFiles: Record<string, string> = Object.fromEntries(
  Object.entries({ ...cMaps, ...fonts, ...decoders, ...profiles }).map(([path, url]) => [path.slice(path.lastIndexOf('/') + 1), url]),
)
