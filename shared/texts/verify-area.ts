import { sheetTexts } from './sheet.en'
import { verifyTexts } from './verify.en'

/** Texts of the page that verifies sheets; they are loaded with it. */
export const verifyAreaTexts = { en: { sheet: sheetTexts, verify: verifyTexts } } as const
