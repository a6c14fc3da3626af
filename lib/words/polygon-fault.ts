/** What is wrong with a drawn outline or area, and where. */
import { type LengthStyle, type PolygonFault, printLength, type StockPoint } from "@/lib/layout";

/** `what` begins the sentence: "The outline", "Area 3". */
export function polygonFaultWords(what: string, fault: PolygonFault, style: LengthStyle): string {
  const place = placeWords(fault.at, style);
  switch (fault.fault) {
    case "doubled":
      return `${what} has two corners on the same place, ${place}. Remove one of them.`;
    case "crosses":
      return `${what} crosses itself ${place}. Move or remove a corner near there.`;
    case "outside":
      return `${what} leaves the board by ${printLength(fault.by, style)} ${place}. Move that corner back onto the board.`;
  }
}

const placeWords = ({ x, y }: StockPoint, style: LengthStyle) =>
  `at ${printLength(x, style)} along and ${printLength(y, style)} across`;
