import { addDays } from "./calendar-date.ts";

/** So many days on which a laboratory works, Monday to Friday; holidays are the desk's to see to. */
export function addWorkingDays(date: string, days: number): string {
  let moved = date;
  for (let left = days; left > 0; ) {
    moved = addDays(moved, 1);
    if (!isWeekend(moved)) left--;
  }
  return moved;
}

/** The Sunday that ends a date's week. */
export function endOfWeek(date: string): string {
  const weekday = weekdayOf(date);
  return addDays(date, weekday === 0 ? 0 : 7 - weekday);
}

/** "Thu 3 Dec 2026", or without its year where a list is about now. */
export function formatWeekdayDate(date: string, { withYear = true }: { withYear?: boolean } = {}): string {
  const [year, month, day] = date.split("-").map(Number) as [number, number, number];
  return `${weekdays[weekdayOf(date)]} ${day} ${months[month - 1]}${withYear ? ` ${year}` : ""}`;
}

// Own tables: the locale data of server and browser differ ("Sep", "Sept"), and a page must say the same on both.
const weekdays = ["Sun", "Mon", "Tue", "Wed", "Thu", "Fri", "Sat"];
const months = ["Jan", "Feb", "Mar", "Apr", "May", "Jun", "Jul", "Aug", "Sep", "Oct", "Nov", "Dec"];

function isWeekend(date: string): boolean {
  return [0, 6].includes(weekdayOf(date));
}

function weekdayOf(date: string): number {
  return new Date(`${date}T00:00:00Z`).getUTCDay();
}
