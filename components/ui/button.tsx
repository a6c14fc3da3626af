import type { ButtonHTMLAttributes } from "react";

export type ButtonKind = "primary" | "plain" | "danger" | "quiet";

const looks: Record<ButtonKind, string> = {
  primary: "bg-chalk text-white border-chalk hover:bg-[#163f75]",
  plain: "bg-sheet text-graphite border-line hover:bg-chalk-wash",
  danger: "bg-sheet text-crayon border-crayon hover:bg-crayon-wash",
  quiet: "bg-transparent text-chalk border-transparent hover:bg-chalk-wash",
};

/** The look of a button, also for links that stand beside buttons. */
export function buttonClass(kind: ButtonKind = "plain", size: "normal" | "small" = "normal"): string {
  const box = size === "small" ? "min-h-8 px-2.5 text-sm" : "min-h-11 px-4 text-base md:min-h-10";
  return `inline-flex items-center justify-center gap-2 rounded-md border font-semibold whitespace-nowrap disabled:opacity-50 ${box} ${looks[kind]}`;
}

type Props = ButtonHTMLAttributes<HTMLButtonElement> & { kind?: ButtonKind; size?: "normal" | "small" };

export function Button({ kind = "plain", size = "normal", type = "button", className = "", ...rest }: Props) {
  return <button type={type} className={`${buttonClass(kind, size)} ${className}`} {...rest} />;
}
