/** Money in minor units (cents, pence, øre) and as people write it. */

const formatOf = (currency: string) => new Intl.NumberFormat("en-GB", { style: "currency", currency });
const digitsOf = (currency: string): number => formatOf(currency).resolvedOptions().maximumFractionDigits ?? 2;

/** With the currency's sign: "€84.50". */
export const moneyText = (minor: number, currency: string): string => formatOf(currency).format(minor / 10 ** digitsOf(currency));

/** Bare, for a field: "84.50". */
export const minorText = (minor: number, currency: string): string =>
  (minor / 10 ** digitsOf(currency)).toFixed(digitsOf(currency));

/** What was typed as an amount; undefined for what is none or has more decimals than the currency. */
export function minorFromText(text: string, currency: string): number | undefined {
  const match = /^(\d{1,8})(?:[.,](\d+))?$/.exec(text.trim());
  const [, whole, decimals = ""] = match ?? [];
  if (whole === undefined || decimals.length > digitsOf(currency)) return undefined;
  return Number(whole + decimals.padEnd(digitsOf(currency), "0"));
}
