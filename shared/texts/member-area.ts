import { accountTexts } from './account.en'
import { adminTexts } from './admin.en'
import { statesTexts } from './states.en'

/** Texts of everything behind the sign-in; they are loaded when the area is entered. */
export const areaTexts = {
  en: {
    account: accountTexts,
    admin: adminTexts,
    states: statesTexts,
  },
} as const
