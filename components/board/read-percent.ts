/** A moisture reading as typed: null when left empty, undefined when it is no percentage. */
export function readPercent(text: string): number | null | undefined {
  const plain = text.trim().replace(",", ".").replace(/\s*%$/, "");
  if (plain === "") return null;
  const value = /^\d{1,3}(\.\d+)?$/.test(plain) ? Number(plain) : Number.NaN;
  return value >= 0 && value <= 100 ? value : undefined;
}
