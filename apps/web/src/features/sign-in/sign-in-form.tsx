import { type FormEvent, type ReactElement, useEffect, useRef, useState } from "react";
import { Button } from "../../kit/actions/button.tsx";
import { PasswordField } from "../../kit/fields/password-field.tsx";
import { TextField } from "../../kit/fields/text-field.tsx";
import { FaultPanel } from "../../kit/states/fault-panel.tsx";
import { type ProblemWords, problemFrom } from "../../kit/states/problem-words.ts";
import { RefusalNote } from "./refusal-note.tsx";
import { refusalOf, type SignInRefusal } from "./refusal-words.ts";

interface SignInFormProps {
  onSignIn: (fields: { login: string; password: string }) => Promise<void>;
}

/** What came of the last try. The number makes each refusal a new one, so that it is read out again. */
interface Outcome {
  readonly tries: number;
  readonly refusal: SignInRefusal | null;
  readonly problem: ProblemWords | null;
}

/** Name and password. A password is never kept as a draft. */
export function SignInForm(props: SignInFormProps): ReactElement {
  const form = useRef<HTMLFormElement>(null);
  const [login, setLogin] = useState("");
  const [password, setPassword] = useState("");
  const [isBusy, setBusy] = useState(false);
  const [outcome, setOutcome] = useState<Outcome>({ tries: 0, refusal: null, problem: null });
  // The first field takes the focus, so that a keyboard or badge reader can begin at once.
  useEffect(() => form.current?.querySelector("input")?.focus(), []);
  const submit = async (event: FormEvent) => {
    event.preventDefault();
    setBusy(true);
    const tries = outcome.tries + 1;
    setOutcome({ tries, refusal: null, problem: null });
    try {
      await props.onSignIn({ login: login.trim(), password });
    } catch (error) {
      const refusal = refusalOf(error);
      setOutcome({ tries, refusal, problem: refusal === null ? problemFrom(error) : null });
      setBusy(false);
      const typed = form.current?.querySelector<HTMLInputElement>("input[name=password]");
      typed?.focus();
      typed?.select();
    }
  };
  return (
    <form ref={form} className="grid gap-5" onSubmit={(event) => void submit(event)}>
      {/* A field keeps room for its error at the right; here errors stand under both, and the room is taken back. */}
      <div className="grid gap-5 sm:-mr-4">
        <TextField
          label="Name"
          name="login"
          value={login}
          onChange={setLogin}
          autoComplete="username"
          large
        />
        <PasswordField label="Password" name="password" value={password} onChange={setPassword} large />
      </div>
      {outcome.refusal === null ? null : <RefusalNote key={outcome.tries} refusal={outcome.refusal} />}
      {outcome.problem === null ? null : <FaultPanel problem={outcome.problem} />}
      <Button type="submit" kind="primary" large busy={isBusy}>
        Sign in
      </Button>
    </form>
  );
}
