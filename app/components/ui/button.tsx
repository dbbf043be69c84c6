import type { ButtonHTMLAttributes } from "react";
import { Link, type LinkProps } from "react-router";

type Variant = "primary" | "plain" | "quiet" | "stop";

const shape = "inline-flex min-h-11 items-center rounded px-4 text-[15px] font-semibold cursor-pointer";

const looks: Record<Variant, string> = {
  primary: `${shape} bg-layout text-on-layout border border-layout`,
  plain: `${shape} bg-paper text-ink border border-line-strong`,
  quiet: "inline-flex min-h-11 items-center px-2 text-layout underline underline-offset-2 cursor-pointer",
  stop: `${shape} bg-paper text-stop border border-stop`,
};

/** A button; `primary` for the one thing to do next, `quiet` where it stands in a row. */
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
