/** The date of today on the shop's wall, as dates are sent: 2026-03-02. */
export const todayIn = (timeZone: string): string =>
  new Intl.DateTimeFormat("en-CA", { timeZone, dateStyle: "short" }).format(new Date());
