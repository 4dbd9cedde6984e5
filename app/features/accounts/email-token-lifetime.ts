const minuteMs = 60_000;

export const confirmHours = 24;
export const resetMinutes = 60;
export const invitationDays = 14;
export const confirmMs = confirmHours * 60 * minuteMs;
export const resetMs = resetMinutes * minuteMs;
export const invitationMs = invitationDays * 24 * 60 * minuteMs;
