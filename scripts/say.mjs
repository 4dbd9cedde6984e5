/** What the person at the terminal reads, and nothing but. */
export function say(line) {
  console.log(line);
}

/** A planned end: the sentence is all that is shown. */
export class Stop extends Error {
  name = "Stop";
}

export function seconds(startedAt) {
  return `${((performance.now() - startedAt) / 1000).toFixed(1)} s`;
}
