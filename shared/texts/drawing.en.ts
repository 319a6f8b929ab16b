/** Texts inside drawings. */
export const drawingTexts = {
  wetSide: 'Wet side',
  drySide: 'Dry side',
} as const
