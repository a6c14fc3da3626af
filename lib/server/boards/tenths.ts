/** Moisture is stored in tenths of a percent: what a meter shows. */
export const tenthsOf = (percent: number): number => Math.round(percent * 10);
