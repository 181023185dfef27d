import Link from "next/link";
import type { ComponentProps } from "react";
import { buttonStyle, type ButtonSize, type ButtonVariant } from "./buttonStyle";

interface LinkButtonProps extends ComponentProps<typeof Link> {
  variant?: ButtonVariant;
  size?: ButtonSize;
}

/** A link that looks like a button: it goes somewhere and does nothing else. */
export function LinkButton({ variant = "plain", size = "normal", className, ...rest }: LinkButtonProps) {
  return <Link {...rest} className={buttonStyle(variant, size, className)} />;
}
