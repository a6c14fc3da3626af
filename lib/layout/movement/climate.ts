/** The place where the furniture will live, and between which moistures that keeps its wood over the year. */
import { type Air, equilibriumMoisture } from "./equilibrium-moisture";

/** Told as air at its driest and dampest, or as the moisture of wood that has stood there, percent of dry weight. */
export type Climate =
  | { readonly kind: "air"; readonly driest: Air; readonly dampest: Air }
  | { readonly kind: "moisture"; readonly driest: number; readonly dampest: number };

/** Moisture of the wood at its driest and dampest, percent. */
export interface YearlyMoisture {
  readonly driest: number;
  readonly dampest: number;
}

/**
 * Heated rooms: 30 to 60 % relative humidity at 21 °C, which keeps wood between 6.2 and 11.0 %. Sources: ASHRAE 62 as two facility
 * services quote it (30 to 60 %); the Wood Handbook's averages for wood indoors run from 6 % (dry southwest of the USA) to 11 %
 * (damp warm coasts), as quoted from its Fig. 13-1. A little wider than AWI 200 for architectural woodwork (30 to 55 %).
 */
export const defaultClimate: Climate = {
  kind: "air",
  driest: { celsius: 21, humidity: 30 },
  dampest: { celsius: 21, humidity: 60 },
};

/** Wood lags behind the air and seldom goes all the way, so gaps worked out from this are on the careful side. */
export function yearlyMoisture(climate: Climate): YearlyMoisture {
  if (climate.kind === "moisture") return { driest: climate.driest, dampest: climate.dampest };
  return { driest: equilibriumMoisture(climate.driest), dampest: equilibriumMoisture(climate.dampest) };
}
