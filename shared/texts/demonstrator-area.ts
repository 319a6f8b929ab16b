import { demonstratorTexts } from './demonstrator.en'

/** Texts of the demonstrator; they are loaded with it. */
export const demonstratorAreaTexts = { en: { demonstrator: demonstratorTexts } } as const
