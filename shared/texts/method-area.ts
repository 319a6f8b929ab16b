import { methodTexts } from './method.en'

/** Texts of the Method page; they are loaded with it. */
export const methodAreaTexts = { en: { method: methodTexts } } as const
