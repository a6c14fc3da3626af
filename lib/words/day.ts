/** How a calendar day is written: the same in every list and heading. */

const format = new Intl.DateTimeFormat("en-GB", { timeZone: "UTC", day: "numeric", month: "short", year: "numeric" });

/** `2027-03-14` as `14 Mar 2027`. A day has no time zone, so none moves it. Throws on anything that is no day. */
export function dayText(isoDay: string): string {
  if (!/^\d{4}-\d{2}-\d{2}$/.test(isoDay)) throw new RangeError(`not a day: ${isoDay}`);
  return format.format(new Date(`${isoDay}T00:00:00Z`));
}
