/**
 * The grid of the search: places of a group's corner lie half a millimetre apart, and so do the grey values they are judged by.
 * Cell c of an axis reaches from c·500 µm to (c + 1)·500 µm of the stock frame.
 */
export const GRID_UM = 500;

/** The first cell that lies wholly at or after a coordinate, µm. */
export function firstCell(at: number): number {
  return Math.ceil(at / GRID_UM) + 0;
}

/** One past the last cell that lies wholly before a coordinate, µm. */
export function endCell(at: number): number {
  return Math.floor(at / GRID_UM);
}

/** How many grid places there are for something this long in that much room: 0, 500, 1000, … µm as long as it fits. */
export function placesIn(room: number): number {
  return room < 0 ? 0 : Math.floor(room / GRID_UM) + 1;
}
