import regular from '@fontsource/ibm-plex-sans/files/ibm-plex-sans-latin-400-normal.woff2?inline'
import semibold from '@fontsource/ibm-plex-sans/files/ibm-plex-sans-latin-600-normal.woff2?inline'

function face(weight: number, source: string): string {
  return `@font-face{font-family:'IBM Plex Sans';font-weight:${weight};src:url(${source}) format('woff2')}`
}

/** The font of the drawings, whole inside the file, so that it looks the same everywhere. */
export const sceneFontFaces = face(400, regular) + face(600, semibold)
