import type { ReactNode } from "react";

const looks = {
  stop: "border-crayon bg-crayon-wash",
  care: "border-tape bg-tape-wash",
  sound: "border-moss bg-moss-wash",
  plain: "border-line bg-sheet",
};

/** A sentence that must be seen. `stop` refusals are announced at once. */
export function Notice({ kind = "plain", children }: { kind?: keyof typeof looks; children: ReactNode }) {
  return (
    <div role={kind === "stop" ? "alert" : "status"} className={`rounded-sm border-l-4 px-3 py-2 text-sm ${looks[kind]}`}>
      {children}
    </div>
  );
}
