import type { ButtonHTMLAttributes, ReactElement, Ref } from "react";
import { Link, type LinkProps } from "react-router";

/** primary: the one thing this page is for. danger: what cannot be taken back. quiet: inside a sheet, as a link. */
export type ButtonKind = "primary" | "secondary" | "danger" | "quiet";

interface ButtonLook {
  kind?: ButtonKind;
  /** 48 px and larger type: the tablet by the cell, in gloves. */
  large?: boolean;
}

const KIND_CLASS: Record<ButtonKind, string> = {
  primary: "border-act bg-act text-on-act hover:opacity-90",
  secondary: "border-edge bg-sheet text-ink hover:bg-hush",
  danger: "border-stop-fill bg-stop-fill text-on-stop-fill hover:opacity-90",
  quiet: "border-transparent bg-transparent text-link underline-offset-2 hover:underline",
};

function lookClass({ kind = "secondary", large = false }: ButtonLook): string {
  const size = large ? "min-h-12 px-6 text-lg" : "min-h-9 px-4 text-base";
  return `inline-flex items-center justify-center gap-2 rounded-sm border font-semibold no-underline select-none disabled:opacity-55 ${size} ${KIND_CLASS[kind]}`;
}

export type ButtonProps = ButtonLook &
  Omit<ButtonHTMLAttributes<HTMLButtonElement>, "className"> & {
    /** Says that the work has begun; the button waits and cannot be pressed twice. */
    busy?: boolean;
    ref?: Ref<HTMLButtonElement>;
  };

/** A button; its text says what it does. */
export function Button({
  kind,
  large,
  busy = false,
  type = "button",
  disabled,
  children,
  ...rest
}: ButtonProps): ReactElement {
  return (
    <button
      {...rest}
      type={type}
      disabled={disabled === true || busy}
      aria-busy={busy || undefined}
      className={lookClass({ ...(kind && { kind }), ...(large && { large }) })}
    >
      {busy ? <Working /> : null}
      {children}
    </button>
  );
}

/** A link that looks like a button: it goes somewhere, it does nothing. */
export function ButtonLink({
  kind,
  large,
  children,
  ...rest
}: ButtonLook & Omit<LinkProps, "className">): ReactElement {
  return (
    <Link {...rest} className={lookClass({ ...(kind && { kind }), ...(large && { large }) })}>
      {children}
    </Link>
  );
}

function Working(): ReactElement {
  return (
    <span
      aria-hidden="true"
      className="size-3.5 animate-spin rounded-full border-2 border-current border-t-transparent"
    />
  );
}

/** Buttons in a row, the main one first; they wrap where it is narrow. */
export function ButtonRow(props: { children: React.ReactNode }): ReactElement {
  return <div className="screen-only flex flex-wrap items-center gap-3">{props.children}</div>;
}
