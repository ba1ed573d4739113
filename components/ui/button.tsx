import Link from "next/link";
import type { ComponentProps } from "react";

type Look = "primary" | "outline" | "quiet" | "danger";

const BASE =
  "inline-flex min-h-11 items-center justify-center gap-2 rounded-field px-4 py-2 text-15 font-semibold no-underline disabled:opacity-55";

const LOOKS: Readonly<Record<Look, string>> = {
  primary: "bg-spruce text-on-spruce border border-spruce hover:opacity-90",
  outline: "bg-transparent text-spruce border border-spruce hover:bg-spruce-wash",
  quiet: "bg-transparent text-spruce border border-transparent px-2 hover:bg-spruce-wash",
  danger: "bg-transparent text-rowan border border-rowan hover:bg-rowan-wash",
};

export function buttonClass(look: Look = "outline", extra = ""): string {
  return `${BASE} ${LOOKS[look]} ${extra}`;
}

export function Button({ look = "outline", className = "", ...rest }: ComponentProps<"button"> & { look?: Look }) {
  return <button type="button" {...rest} className={buttonClass(look, className)} />;
}

export function LinkButton({
  look = "outline",
  className = "",
  ...rest
}: ComponentProps<typeof Link> & { look?: Look }) {
  return <Link {...rest} className={buttonClass(look, className)} />;
}
