import type { ComponentPropsWithRef } from "react";
import { Mark } from "../mark/Mark";
import { buttonStyle, type ButtonSize, type ButtonVariant } from "./buttonStyle";

interface ButtonProps extends ComponentPropsWithRef<"button"> {
  variant?: ButtonVariant;
  size?: ButtonSize;
  /** The action is under way: shown, announced, and a second press does nothing. */
  pending?: boolean;
}

/** A button. `type` is "button" unless given, so that it never submits a form by accident. */
export function Button({ variant = "plain", size = "normal", pending = false, className, type, onClick, children, ...rest }: ButtonProps) {
  return (
    <button
      {...rest}
      // Stays focusable while pending, so that the keyboard's place is not lost; a submit turns into nothing meanwhile.
      type={pending ? "button" : (type ?? "button")}
      onClick={pending ? undefined : onClick}
      aria-disabled={pending || undefined}
      aria-busy={pending || undefined}
      className={buttonStyle(variant, size, className)}
    >
      {pending && <Mark state="reading" size={16} />}
      {children}
    </button>
  );
}
