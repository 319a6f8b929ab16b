/** Texts of signing in and of what a person looks after for themselves. */
export const accountTexts = {
  title: 'My account',
} as const
