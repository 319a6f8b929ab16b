/** Category of check. BS 5975-1:2024, table 2. */
export const CHECK_CATEGORIES = [0, 1, 2, 3] as const
