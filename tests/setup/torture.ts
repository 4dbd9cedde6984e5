const isTorture = process.env.TORTURE === "1";

/** The size of a proof: a part of it in every run, the whole in `npm run torture`. */
export const sized = ({ always, whole }: { always: number; whole: number }): number => (isTorture ? whole : always);
