import { storeToRefs } from 'pinia'
import type { PictureOf } from '@/quick-check/drawing-caption'
import { usePreferences } from '@/stores/preferences'
import { useCrossSection, type DrawnSection } from './useCrossSection'
import { sectionFileName, useSceneExport, type SceneFormat } from './useSceneExport'
import { useWords } from './useWords'

/** Size for which a saved drawing is composed [CSS px]. */
const FILE_VIEW = { width: 1200, height: 640 }

/** Saves the drawing of the case as a file, in the colours of the page, with what it says and rests on under it. */
export function useDrawingExport(drawn: () => DrawnSection, picture: () => PictureOf) {
  const { say, units } = useWords()
  const { isDark } = storeToRefs(usePreferences())
  const { compose } = useCrossSection(drawn)
  const { state, save } = useSceneExport()

  async function exportAs(format: SceneFormat): Promise<void> {
    // Taken together at once, so that caption and drawing never tell of two cases.
    const [scene, of] = [compose(FILE_VIEW), picture()]
    const name = sectionFileName(drawn().section.water.depth)
    const { drawingCaption } = await import('@/quick-check/drawing-caption')
    return save({
      scene,
      caption: drawingCaption(of, units.value, new Date()),
      format,
      theme: isDark.value ? 'dark' : 'light',
      resolve: say,
      name,
    })
  }

  return { state, exportAs }
}
