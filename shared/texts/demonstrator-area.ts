import { classTexts } from './class.en'
import { demonstratorTexts } from './demonstrator.en'

/** Texts of the demonstrator and of its class; they are loaded with it. */
export const demonstratorAreaTexts = {
  en: { demonstrator: demonstratorTexts, classroom: classTexts },
} as const
