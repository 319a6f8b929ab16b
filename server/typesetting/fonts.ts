import { readFileSync } from 'node:fs'
import { createRequire } from 'node:module'

/** Faces of IBM Plex Sans that the templates use. */
const FACES = ['400Regular', '400Regular_Italic', '500Medium', '600SemiBold', '700Bold'] as const

const require = createRequire(import.meta.url)

/** The faces as TTF, from the package that carries them. */
export function readFonts(): Buffer[] {
  return FACES.map((face) =>
    readFileSync(
      require.resolve(`@expo-google-fonts/ibm-plex-sans/${face}/IBMPlexSans_${face}.ttf`),
    ),
  )
}
