import { useMemo, useRef, useState } from "react";
import type { z } from "zod";
import type { ProblemWords } from "../states/problem-words.ts";
import { useLengthUnits } from "../units/units-context.tsx";
import { dropDraft, readDraft, writeDraft } from "./draft-store.ts";
import { type FieldBindings, fieldBindings } from "./field-bindings.ts";
import { type FieldErrors, judgeValues, problemFields } from "./form-check.ts";
import type { FormValues } from "./form-values.ts";
import { schemaRules } from "./schema-rules.ts";

export interface FormOptions<S extends z.ZodType> {
  /** The rules: the resource's own schema. */
  schema: S;
  /** What stands in the fields at first, by path. */
  start?: FormValues;
  /** Keeps what is typed in this browser under this name until it is sent. */
  draft?: string;
  /** Sends it. What it throws is shown: faults with a pointer at their field, the rest above the button. */
  onSubmit: (value: z.output<S>) => Promise<unknown>;
}

export interface FormState extends FieldBindings {
  readonly values: FormValues;
  submit(): Promise<void>;
  readonly isBusy: boolean;
  /** Wrong fields; shown once sending was tried. */
  readonly errors: FieldErrors;
  /** What was refused, without the faults that stand at a field. */
  readonly problem: ProblemWords | null;
  /** When the draft that was brought back had been kept. */
  readonly restored_at: string | null;
  /** Throws the draft away and begins anew. */
  startAnew(): void;
}

interface Refusal {
  readonly errors: FieldErrors;
  readonly problem: ProblemWords | null;
}

/** The state of a form: its values, its rules from a schema, its draft, and what is wrong. */
export function useForm<S extends z.ZodType>(options: FormOptions<S>): FormState {
  const { schema } = options;
  const rules = useMemo(() => schemaRules(schema), [schema]);
  const units = useLengthUnits();
  const draft = useDraft(options.draft);
  const [values, setValues] = useState<FormValues>({ ...options.start, ...draft.kept });
  const [isTried, setTried] = useState(false);
  const [isBusy, setBusy] = useState(false);
  const [refusal, setRefusal] = useState<Refusal>({ errors: {}, problem: null });
  const judged = judgeValues({ schema, rules, start: options.start ?? {}, units }, values);
  const errors = isTried ? { ...refusal.errors, ...judged.errors } : {};
  const change = (path: string, value: unknown) => {
    const next = { ...values, [path]: value };
    setValues(next);
    setRefusal({ ...refusal, errors: { ...refusal.errors, [path]: undefined } });
    draft.keep(next);
  };
  const submit = async () => {
    setTried(true);
    setRefusal({ errors: {}, problem: null });
    if (!judged.ok || isBusy) return;
    setBusy(true);
    try {
      await options.onSubmit(judged.value);
      draft.drop();
      setTried(false);
    } catch (error) {
      setRefusal(problemFields(error, Object.keys(values)));
    } finally {
      setBusy(false);
    }
  };
  const startAnew = () => {
    draft.drop();
    setValues({ ...options.start });
    setTried(false);
  };
  return {
    ...fieldBindings({ rules, values, errors, units, change, keepSecret: draft.keepSecret }),
    values,
    submit,
    isBusy,
    errors,
    problem: refusal.problem,
    restored_at: draft.restored_at,
    startAnew,
  };
}

interface DraftState {
  readonly kept: FormValues | undefined;
  readonly restored_at: string | null;
  keep(values: FormValues): void;
  keepSecret(path: string): void;
  drop(): void;
}

/** The draft under a name; without a name nothing is kept. */
function useDraft(name: string | undefined): DraftState {
  const [kept] = useState(() => (name === undefined ? null : readDraft(localStorage, name)));
  const [restored_at, setRestored] = useState(kept?.saved_at ?? null);
  const secrets = useRef(new Set<string>());
  return {
    kept: kept?.values,
    restored_at,
    keep(values) {
      if (name === undefined) return;
      const open = Object.entries(values).filter(([path]) => !secrets.current.has(path));
      writeDraft(localStorage, name, {
        saved_at: new Date().toISOString(),
        values: Object.fromEntries(open),
      });
    },
    keepSecret: (path) => secrets.current.add(path),
    drop() {
      setRestored(null);
      if (name !== undefined) dropDraft(localStorage, name);
    },
  };
}
