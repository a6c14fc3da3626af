import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { type BareUnit, type LengthStyle, mmFromUm, parseLength, printedLength, printLength, um } from "@/lib/layout";

const IN64: LengthStyle = { unit: "inch", denominator: 64 };
const IN32: LengthStyle = { unit: "inch", denominator: 32 };
const MM: LengthStyle = { unit: "mm" };

function read(input: string, bareUnit: BareUnit = "mm"): number {
  const parsed = parseLength(input, bareUnit);
  if (!parsed.ok) throw new Error(`${parsed.reason}: ${parsed.input}`);
  return parsed.value;
}

describe("parseLength", () => {
  test.each([
    ["12.7", 12_700],
    ["12,7", 12_700],
    ["12.7 mm", 12_700],
    ["12.7MM", 12_700],
    [".5mm", 500],
    ["2.4 m", 2_400_000],
    ["24cm", 240_000],
    ["1/2", 12_700],
    ['23 5/16"', 592_138],
    ["23-5/16", 592_138],
    ["23 5⁄16″", 592_138],
    ["23 5/16 inches", 592_138],
    ["½", 12_700],
    ["2½ in", 63_500],
    ['3.125"', 79_375],
    ["7' 6 1/2\"", 2_298_700],
    ["7′ 6 1⁄2″", 2_298_700],
    ["7'-6 1/2\"", 2_298_700],
    ["7ft 6in", 2_286_000],
    ["7 feet", 2_133_600],
    ["7.5'", 2_286_000],
    ["7' 1/2", 2_146_300],
    ["-3", -3_000],
    ["− 3 mm", -3_000],
    ["+3", 3_000],
    ["  3 ", 3_000],
    ["0", 0],
    ["-0", 0],
  ])("reads %s in a shop that counts in millimetres", (input, value) => {
    expect(read(input)).toBe(value);
  });

  test("a bare number takes the shop's unit, a named one keeps its own", () => {
    expect(read("3", "inch")).toBe(76_200);
    expect(read("3 mm", "inch")).toBe(3_000);
  });

  test.each([
    ["", "empty"],
    ["   ", "empty"],
    ["twelve", "not-a-length"],
    ["12..7", "not-a-length"],
    ["12 7", "not-a-length"],
    ["1 7/4", "not-a-length"],
    ["1/2/3", "not-a-length"],
    ["1/2 mm", "not-a-length"],
    ["--3", "not-a-length"],
    ["3 -", "not-a-length"],
    ["NaN", "not-a-length"],
    ["1e3", "not-a-length"],
    ["Infinity", "not-a-length"],
    ["1,2,3", "not-a-length"],
    ["1/0", "zero-denominator"],
    ["7' 1/0", "zero-denominator"],
    ["1,200", "ambiguous-comma"],
    ["1,200.5", "ambiguous-comma"],
    ["1000001 m", "out-of-range"],
    ["9".repeat(400), "out-of-range"],
  ])("refuses %j: %s, and names the input", (input, reason) => {
    expect(parseLength(input, "mm")).toEqual({ ok: false, reason, input });
  });

  test("never throws and never returns a fraction of a micrometre", () => {
    const pieces = fc.constantFrom("1", "23", "/", " ", "-", ".", ",", "'", '"', "⁄", "″", "mm", "in", "ft", "½", "x");
    fc.assert(
      fc.property(fc.array(pieces, { maxLength: 8 }), fc.constantFrom<BareUnit>("mm", "inch"), (parts, unit) => {
        const parsed = parseLength(parts.join(""), unit);
        expect(parsed.ok ? Number.isSafeInteger(parsed.value) : parsed.input === parts.join("")).toBe(true);
      }),
    );
  });
});

describe("printLength", () => {
  test.each([
    [12_700, MM, "12.7 mm"],
    [0, MM, "0.0 mm"],
    [49, MM, "0.0 mm"],
    [50, MM, "0.1 mm"],
    [-50, MM, "−0.1 mm"],
    [-49, MM, "0.0 mm"],
    [592_138, IN32, "23 5⁄16″"],
    [12_700, IN64, "1⁄2″"],
    [25_400, IN64, "1″"],
    [0, IN32, "0″"],
    [397, IN64, "1⁄64″"],
    [397, IN32, "1⁄32″"],
    [25_300, IN32, "1″"],
    [-592_138, IN32, "−23 5⁄16″"],
  ] as const)("%i µm in %j prints %s", (value, style, text) => {
    expect(printLength(um(value), style)).toBe(text);
  });

  test("says on which side of the printed figure the true length lies", () => {
    expect(printedLength(um(12_730), MM)).toEqual({ figure: "12.7", text: "12.7 mm", stands: 12_700, rounding: "+" });
    expect(printedLength(um(12_690), MM).rounding).toBe("−");
    expect(printedLength(um(12_700), MM).rounding).toBe("");
    expect(printedLength(um(600), IN32)).toEqual({ figure: "1⁄32", text: "1⁄32″", stands: 794, rounding: "−" });
  });

  const styles = fc.constantFrom(MM, IN32, IN64);
  const lengths = fc.integer({ min: -10_000_000, max: 10_000_000 }).map(um);

  test("reading what was printed gives the value that the print stands for, with its unit or under a heading that names it", () => {
    fc.assert(
      fc.property(lengths, styles, (value, style) => {
        const printed = printedLength(value, style);
        expect(read(printed.text)).toBe(printed.stands);
        expect(read(printed.figure, style.unit)).toBe(printed.stands);
        expect(printedLength(printed.stands, style)).toEqual({ ...printed, rounding: "" });
      }),
    );
  });

  test("the print is within half a division of the true length, and the sign of the rounding is right", () => {
    fc.assert(
      fc.property(lengths, styles, (value, style) => {
        const { stands, rounding } = printedLength(value, style);
        const division = style.unit === "mm" ? 100 : 25_400 / style.denominator;
        // 0.5 µm: the value that a print stands for is itself a whole micrometre.
        expect(Math.abs(value - stands)).toBeLessThanOrEqual(division / 2 + 0.5);
        expect(Math.sign(value - stands)).toBe(rounding === "+" ? 1 : rounding === "−" ? -1 : 0);
      }),
    );
  });

  test("fractions are reduced and smaller than one", () => {
    fc.assert(
      fc.property(lengths, fc.constantFrom(IN32, IN64), (value, style) => {
        const fraction = /(\d+)⁄(\d+)/.exec(printLength(value, style));
        if (fraction === null) return;
        const [top, bottom] = [Number(fraction[1]), Number(fraction[2])];
        expect(top % 2).toBe(1);
        expect(top).toBeLessThan(bottom);
        expect([2, 4, 8, 16, 32, 64]).toContain(bottom);
      }),
    );
  });

  test("mm and inches agree: the two prints of one length differ by no more than their roundings", () => {
    fc.assert(
      fc.property(lengths, (value) => {
        const difference = printedLength(value, MM).stands - printedLength(value, IN64).stands;
        expect(Math.abs(mmFromUm(um(difference)))).toBeLessThan(0.05 + 25.4 / 128 + 0.001);
      }),
    );
  });
});
