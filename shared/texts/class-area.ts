import { classTexts } from './class.en'

/** Texts of the page for phones; they are loaded with it. */
export const classAreaTexts = { en: { classroom: classTexts } } as const
