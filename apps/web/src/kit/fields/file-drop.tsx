import type { ReactElement } from "react";
import { Field, type FieldProps } from "./field.tsx";
import { fileSize } from "./file-size.ts";

export interface FileDropProps extends FieldProps {
  files: readonly File[];
  onChange: (files: readonly File[]) => void;
  /** Kinds of file, as the input takes them: ".csv,.ply". */
  accept?: string;
  multiple?: boolean;
  /** Opens the camera on a tablet. */
  camera?: boolean;
}

/** Files dropped here or chosen; each is named with its size before anything is sent. */
export function FileDrop(props: FileDropProps): ReactElement {
  const size = props.large === true ? "file:min-h-12" : "file:min-h-9";
  return (
    <Field {...props}>
      {({ className: _, ...control }) => (
        <>
          <input
            {...control}
            type="file"
            accept={props.accept}
            multiple={props.multiple}
            capture={props.camera === true ? "environment" : undefined}
            onChange={(event) => props.onChange([...(event.target.files ?? [])])}
            className={`w-full rounded-sm border border-dashed bg-sheet px-3 pt-3 pb-4 text-sm text-ash file:mr-3 file:rounded-sm file:border file:border-solid file:border-edge file:bg-sheet file:px-3 file:font-sans file:font-semibold file:text-ink hover:bg-hush ${size} ${props.error === undefined ? "border-edge" : "border-stop"}`}
          />
          {props.files.length === 0 ? (
            <p className="mt-1 text-sm text-ash">Choose it, or drop it onto this field.</p>
          ) : (
            <ul className="mt-1">
              {props.files.map((file) => (
                <li key={`${file.name} ${file.size}`} className="flex justify-between gap-4">
                  <span className="min-w-0 truncate">{file.name}</span>
                  <span className="figures shrink-0 leading-[1.375rem] text-ash">{fileSize(file.size)}</span>
                </li>
              ))}
            </ul>
          )}
        </>
      )}
    </Field>
  );
}
