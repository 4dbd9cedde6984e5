const minuteMs = 60_000;
const hourMs = 60 * minuteMs;

export type Door = "signIn" | "signInAddress" | "password" | "reset" | "resetAddress" | "signUp" | "link" | "invitation" | "verify" | "pay" | "api";

/** How often each door opens to one key: an account, a person, a laboratory, or an address in the network. */
export const doors: Readonly<Record<Door, Readonly<{ most: number; windowMs: number; sentence: string }>>> = {
  signIn: { most: 10, windowMs: 15 * minuteMs, sentence: "There were too many tries to sign in to this account." },
  signInAddress: { most: 100, windowMs: 15 * minuteMs, sentence: "There were too many tries to sign in from where you are." },
  password: { most: 10, windowMs: 15 * minuteMs, sentence: "The current password was tried too often." },
  reset: { most: 3, windowMs: hourMs, sentence: "A letter for this address was asked for three times within an hour. Look into its mailbox, also among unwanted mail." },
  resetAddress: { most: 30, windowMs: hourMs, sentence: "Too many letters were asked for from where you are." },
  signUp: { most: 10, windowMs: hourMs, sentence: "Too many accounts were opened from where you are." },
  link: { most: 60, windowMs: 15 * minuteMs, sentence: "Too many links were opened from where you are." },
  invitation: { most: 60, windowMs: hourMs, sentence: "The laboratory has sent too many invitations within an hour." },
  verify: { most: 60, windowMs: minuteMs, sentence: "The register was asked too often from where you are." },
  pay: { most: 60, windowMs: 15 * minuteMs, sentence: "The payment page was asked too often from where you are." },
  api: { most: 120, windowMs: minuteMs, sentence: "The interface was called too often from where you are." },
};
