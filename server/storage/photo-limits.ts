/** Largest file that is taken. */
export const mostBytes = 60 * 1024 * 1024
/** Largest picture that is taken. */
export const mostPixels = 100_000_000
