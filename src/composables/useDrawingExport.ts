import { storeToRefs } from 'pinia'
import { usePreferences } from '@/stores/preferences'
import { useCrossSection, type DrawnSection } from './useCrossSection'
import { sectionFileName, useSceneExport, type SceneFormat } from './useSceneExport'
import { useWords } from './useWords'

/** Size for which a saved drawing is composed [CSS px]. */
const FILE_VIEW = { width: 1200, height: 640 }

/** Saves the drawing of the case as a file, in the colours of the page. */
export function useDrawingExport(drawn: () => DrawnSection) {
  const { say } = useWords()
  const { isDark } = storeToRefs(usePreferences())
  const { compose } = useCrossSection(drawn)
  const { state, save } = useSceneExport()

  function exportAs(format: SceneFormat): Promise<void> {
    return save({
      scene: compose(FILE_VIEW),
      format,
      theme: isDark.value ? 'dark' : 'light',
      resolve: say,
      name: sectionFileName(drawn().section.water.depth),
    })
  }

  return { state, exportAs }
}
