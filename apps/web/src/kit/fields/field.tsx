import { type ReactElement, type ReactNode, useId } from "react";

/** What every field of a form can say. */
export interface FieldProps {
  label: string;
  /** The name under which it is sent and kept. */
  name: string;
  /** The limit in force, under the field: "3 to 40 mm, from the procedure". */
  limit?: string | undefined;
  /** What is wrong, in plain words; stands beside the field. */
  error?: string | undefined;
  /** May be left empty; said beside the label, as most fields may not. */
  optional?: boolean | undefined;
  disabled?: boolean | undefined;
  /** 48 px, for the tablet. */
  large?: boolean | undefined;
}

/** What ties a control to its label, limit and error. */
export interface ControlProps {
  readonly id: string;
  readonly name: string;
  readonly required: boolean;
  readonly disabled: boolean | undefined;
  readonly "aria-describedby": string | undefined;
  readonly "aria-invalid": true | undefined;
  readonly className: string;
}

/** Label above, control, limit under it, error beside it. Other fields are made of this one. */
export function Field(props: FieldProps & { children: (control: ControlProps) => ReactNode }): ReactElement {
  const id = useId();
  const { error, limit } = props;
  const described = [limit && `${id}-limit`, error && `${id}-error`].filter(Boolean).join(" ");
  return (
    <div className="grid gap-x-4 sm:grid-cols-[minmax(0,22rem)_minmax(0,1fr)]">
      <label htmlFor={id} className="mb-1 font-medium sm:col-span-2">
        {props.label}
        {props.optional === true ? (
          <span className="ml-2 font-normal text-ash">may be left empty</span>
        ) : null}
      </label>
      <div className="min-w-0">
        {props.children({
          id,
          name: props.name,
          required: props.optional !== true,
          disabled: props.disabled,
          "aria-describedby": described === "" ? undefined : described,
          "aria-invalid": error === undefined ? undefined : true,
          className: controlClass(props),
        })}
        {limit === undefined ? null : (
          <p id={`${id}-limit`} className="mt-1 text-sm text-ash">
            {limit}
          </p>
        )}
      </div>
      {error === undefined ? null : (
        <FieldError id={`${id}-error`} text={error} large={props.large === true} />
      )}
    </div>
  );
}

/** The look of a control: edge at 3:1, sheet as ground, the error's edge thick as well as red. */
export function controlClass(look: Pick<FieldProps, "large" | "error">): string {
  const size = look.large === true ? "min-h-12 px-4 text-lg" : "min-h-9 px-2.5 text-base";
  const edge = look.error === undefined ? "border-edge" : "border-stop shadow-[inset_0_0_0_1px_var(--stop)]";
  return `w-full rounded-sm border bg-sheet text-ink placeholder:text-ash disabled:bg-hush disabled:text-ash ${size} ${edge}`;
}

function FieldError(props: { id: string; text: string; large: boolean }): ReactElement {
  return (
    <p
      id={props.id}
      className={`flex gap-2 font-medium text-stop max-sm:mt-1 ${props.large ? "sm:pt-3" : "sm:pt-1.5"}`}
    >
      <svg aria-hidden="true" viewBox="0 0 12 12" className="mt-[5px] size-3 shrink-0">
        <path d="M6 .4 11.6 6 6 11.6.4 6z" fill="currentColor" />
      </svg>
      {props.text}
    </p>
  );
}
