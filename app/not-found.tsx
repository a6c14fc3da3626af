import type { Metadata } from "next";
import { WrongTurn } from "@/components/shell/wrong-turn";

export const metadata: Metadata = { title: "There is nothing here" };

export default function NotFound() {
  return (
    <WrongTurn title="There is nothing here">
      The address is wrong, the thing was removed, or it belongs to another shop.
    </WrongTurn>
  );
}
