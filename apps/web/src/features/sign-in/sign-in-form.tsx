import { ApiProblem } from "@beadroll/client/api-problem";
import { type FormEvent, type ReactElement, useEffect, useRef, useState } from "react";
import { Button } from "../../kit/actions/button.tsx";
import { PasswordField } from "../../kit/fields/password-field.tsx";
import { TextField } from "../../kit/fields/text-field.tsx";
import { FaultPanel } from "../../kit/states/fault-panel.tsx";
import { type ProblemWords, problemFrom } from "../../kit/states/problem-words.ts";

interface SignInFormProps {
  onSignIn: (fields: { login: string; password: string }) => Promise<void>;
}

/** What a refusal means to somebody at the door; null where only the server's own words serve. */
function refusalWords(error: unknown): string | null {
  if (!(error instanceof ApiProblem)) return null;
  if (error.code === "sign-in-failed") return "Name or password is not right. Check both and try again.";
  if (error.code !== "rate-limited") return null;
  const wait = error.retry_after_s;
  const minutes = wait === null ? null : Math.ceil(wait / 60);
  return minutes === null
    ? "Too many tries. Wait a while, then try again."
    : `Too many tries. This account can sign in again in ${minutes === 1 ? "a minute" : `${minutes} minutes`}.`;
}

/** Name and password. A password is never kept as a draft. */
export function SignInForm(props: SignInFormProps): ReactElement {
  const form = useRef<HTMLFormElement>(null);
  const [login, setLogin] = useState("");
  const [password, setPassword] = useState("");
  const [isBusy, setBusy] = useState(false);
  const [refused, setRefused] = useState<string | null>(null);
  const [problem, setProblem] = useState<ProblemWords | null>(null);
  // The first field takes the focus, so that a keyboard or badge reader can begin at once.
  useEffect(() => form.current?.querySelector("input")?.focus(), []);
  const submit = async (event: FormEvent) => {
    event.preventDefault();
    setBusy(true);
    setRefused(null);
    setProblem(null);
    try {
      await props.onSignIn({ login: login.trim(), password });
    } catch (error) {
      const words = refusalWords(error);
      setRefused(words);
      if (words === null) setProblem(problemFrom(error));
      setBusy(false);
      form.current?.querySelector<HTMLInputElement>("input[name=password]")?.select();
    }
  };
  return (
    <form ref={form} className="grid gap-5" onSubmit={(event) => void submit(event)}>
      <TextField label="Name" name="login" value={login} onChange={setLogin} autoComplete="username" />
      <PasswordField
        label="Password"
        name="password"
        value={password}
        onChange={setPassword}
        error={refused ?? undefined}
      />
      {problem === null ? null : <FaultPanel problem={problem} />}
      <Button
        type="submit"
        kind="primary"
        large
        busy={isBusy}
        disabled={login.trim() === "" || password === ""}
      >
        Sign in
      </Button>
    </form>
  );
}
