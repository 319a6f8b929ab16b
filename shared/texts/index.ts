import { checksTexts } from './checks.en'
import { drawingTexts } from './drawing.en'
import { quickCheckTexts } from './quick-check.en'
import { shellTexts } from './shell.en'

/** Every text that a person reads, one file per area. vue-i18n, SVG files and PDFs all load this. */
export const texts = {
  en: {
    shell: shellTexts,
    checks: checksTexts,
    drawing: drawingTexts,
    quickCheck: quickCheckTexts,
  },
} as const

export type Locale = keyof typeof texts
