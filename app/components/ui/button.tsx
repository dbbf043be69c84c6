import type { ButtonHTMLAttributes } from "react";
import { Link, type LinkProps } from "react-router";

type Variant = "primary" | "plain" | "quiet" | "stop";

const press =
  "inline-flex min-h-11 items-center justify-center gap-2 cursor-pointer font-medium " +
  "disabled:cursor-not-allowed disabled:opacity-55 print:hidden";
const box = `${press} rounded border px-4`;

const looks: Record<Variant, string> = {
  primary: `${box} border-layout bg-layout text-on-layout enabled:hover:bg-layout-deep [a&]:hover:bg-layout-deep`,
  plain: `${box} border-line-strong bg-paper text-ink enabled:hover:border-ink [a&]:hover:border-ink`,
  stop: `${box} border-stop bg-paper text-stop enabled:hover:bg-stop-wash [a&]:hover:bg-stop-wash`,
  quiet: `${press} px-2 text-layout underline underline-offset-2 hover:decoration-2`,
};

/** A button; `primary` for the one thing to do next, `quiet` where it stands in a row, `stop` for what cannot be undone. */
export function Button({
  variant = "plain",
  type = "button",
  ...rest
}: ButtonHTMLAttributes<HTMLButtonElement> & { variant?: Variant }) {
  return <button type={type} className={looks[variant]} {...rest} />;
}

/** A link that looks like a button: it goes somewhere and changes nothing. */
export function ButtonLink({ variant = "plain", ...rest }: LinkProps & { variant?: Variant }) {
  return <Link className={looks[variant]} {...rest} />;
}
