/**
 * The moisture that wood takes on in air that stays as it is: equilibrium moisture content by temperature and relative humidity.
 *
 * Source: Wood Handbook (FPL-GTR-190, 2010) ch. 4, Eq. 4-5, "values … may be applied to wood of any species"; constants of the °C
 * form as printed with Simpson 1998 (FPL-RN-0268). Checked in `tests/reference` against the cells of Table 4-2, from which it
 * differs by the rounding of the table.
 */

/** Air as a hygrometer tells it. Meant for 0 to 50 °C and 5 to 95 %; the table it is checked by has −1 to 32 °C and 20 to 85 %. */
export interface Air {
  readonly celsius: number;
  /** Relative humidity, percent. */
  readonly humidity: number;
}

/** Percent of dry weight, not rounded. */
export function equilibriumMoisture({ celsius: t, humidity }: Air): number {
  const w = 349 + 1.29 * t + 0.0135 * t ** 2;
  const k = 0.805 + 0.000736 * t - 0.00000273 * t ** 2;
  const k1 = 6.27 - 0.00938 * t - 0.000303 * t ** 2;
  const k2 = 1.91 + 0.0407 * t - 0.000293 * t ** 2;
  const kh = k * (humidity / 100);
  const first = kh / (1 - kh);
  const second = (k1 * kh + 2 * k1 * k2 * kh ** 2) / (1 + k1 * kh + k1 * k2 * kh ** 2);
  return (1800 / w) * (first + second);
}
