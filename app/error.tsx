"use client";
import { WrongTurn } from "@/components/shell/wrong-turn";
import { Button } from "@/components/ui/button";

export default function PageError({ error, reset }: { error: Error & { digest?: string }; reset: () => void }) {
  return (
    <WrongTurn
      title="Something went wrong on our side"
      action={
        <Button kind="primary" onClick={reset}>
          Try again
        </Button>
      }
    >
      Nothing you had saved is lost.{error.digest && ` If it happens again, tell us this number: ${error.digest}.`}
    </WrongTurn>
  );
}
