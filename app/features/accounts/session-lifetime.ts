/** Seven days in all; half a day without a request ends it sooner (quality S3, adapted to a bench that is left for lunch). */
export const sessionAbsoluteMs = 7 * 24 * 60 * 60 * 1000;
export const sessionIdleMs = 12 * 60 * 60 * 1000;
/** A row is touched at most this often, so that reading a page does not write. */
export const sessionTouchMs = 5 * 60 * 1000;
