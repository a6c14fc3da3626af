import { WrongTurn } from "@/components/shell/wrong-turn";

export default function Forbidden() {
  return (
    <WrongTurn title="Not for your role">The owner of the shop decides who may do this. Ask them to change your role.</WrongTurn>
  );
}
