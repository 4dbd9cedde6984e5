/** Alone, without a second factor (quality S1); counted in characters, not bytes. */
export const shortestPassword = 15;
export const longestPassword = 256;
