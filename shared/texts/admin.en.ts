/** Texts of the administration. */
export const adminTexts = {
  title: 'Administration',
} as const
