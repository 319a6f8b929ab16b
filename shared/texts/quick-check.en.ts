/** Texts of the Quick check. */
export const quickCheckTexts = {
  title: 'Quick check',
} as const
