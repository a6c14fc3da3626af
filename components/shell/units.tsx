"use client";
import { createContext, type ReactNode, useContext, useMemo } from "react";
import { type LengthStyle, type ParsedLength, parseLength, printLength, type Um } from "@/lib/layout";

interface UnitsGiven {
  units: "mm" | "inch";
  inchFraction: 32 | 64;
  timeZone: string;
  currency: string;
}

export interface Units extends UnitsGiven {
  style: LengthStyle;
  /** With its unit: `12.7 mm`, `23 5⁄16″`. */
  print: (length: Um) => string;
  /** What people type; a bare number is in the shop's unit. */
  parse: (text: string) => ParsedLength;
}

const UnitsContext = createContext<Units | null>(null);

/** Hands the shop's units to every screen below. */
export function UnitsProvider({ children, units, inchFraction, timeZone, currency }: UnitsGiven & { children: ReactNode }) {
  const value = useMemo<Units>(() => {
    const style: LengthStyle = units === "mm" ? { unit: "mm" } : { unit: "inch", denominator: inchFraction };
    return {
      units,
      inchFraction,
      timeZone,
      currency,
      style,
      print: (length) => printLength(length, style),
      parse: (text) => parseLength(text, units),
    };
  }, [units, inchFraction, timeZone, currency]);
  return <UnitsContext.Provider value={value}>{children}</UnitsContext.Provider>;
}

export function useUnits(): Units {
  const units = useContext(UnitsContext);
  if (!units) throw new Error("useUnits needs a UnitsProvider above");
  return units;
}
