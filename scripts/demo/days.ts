/** Days of the demo's story, counted from the moment it is made. */
const dayMs = 86_400_000;

export const daysFrom = (now: Date, days: number): Date => new Date(now.getTime() + days * dayMs);

/** The date in UTC, as forms send it: 2026-05-14. */
export const dateFrom = (now: Date, days: number): string => daysFrom(now, days).toISOString().slice(0, 10);
