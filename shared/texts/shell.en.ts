/** Texts of the frame: name, menu, banner, cautions, problems. */
export const shellTexts = {
  name: 'Toehold',
} as const
