import Link, { type LinkProps } from "next/link";
import type { ButtonHTMLAttributes, ReactNode } from "react";

type Look = "primary" | "plain" | "quiet";
type Size = "bar" | "form";

const LOOKS: Record<Look, string> = {
  primary: "border-ink bg-ink text-onink enabled:hover:bg-ink2",
  plain: "border-ink bg-vellum text-ink enabled:hover:bg-paper",
  quiet: "border-transparent text-ink underline decoration-1 underline-offset-4 enabled:hover:decoration-2",
};
const SIZES: Record<Size, string> = { bar: "h-bar-control px-3 text-body", form: "h-control px-4 text-text" };
// What is off is dashed and says why beside it; it is not merely paler.
const BASE = "inline-flex items-center justify-center gap-2 whitespace-nowrap border font-strong transition-colors duration-quick disabled:border-dashed disabled:border-rule disabled:bg-transparent disabled:text-ink3 disabled:no-underline";

export const buttonClass = (look: Look = "plain", size: Size = "form") => `${BASE} ${LOOKS[look]} ${SIZES[size]}`;

interface ButtonProps extends ButtonHTMLAttributes<HTMLButtonElement> { look?: Look; size?: Size; busy?: boolean }

/** A button. Primary actions are ink; while `busy` it cannot be pressed again. */
export function Button({ look = "plain", size = "form", busy = false, disabled, type = "button", className = "", children, ...rest }: ButtonProps) {
  return (
    <button type={type} disabled={disabled || busy} aria-busy={busy || undefined} className={`${buttonClass(look, size)} ${className}`} {...rest}>
      {children}
    </button>
  );
}

interface LinkButtonProps extends LinkProps { look?: Look; size?: Size; className?: string; children: ReactNode }

/** A link that looks like a button, for going somewhere. */
export function LinkButton({ look = "plain", size = "form", className = "", children, ...rest }: LinkButtonProps) {
  const hover = look === "primary" ? "hover:bg-ink2" : look === "plain" ? "hover:bg-paper" : "hover:decoration-2";
  return <Link className={`${buttonClass(look, size)} ${hover} ${className}`} {...rest}>{children}</Link>;
}
