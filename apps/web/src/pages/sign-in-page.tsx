import type { ReactElement } from "react";
import { Navigate, useSearchParams } from "react-router";
import { PATHS } from "../app/paths.ts";
import { signIn, useAccount } from "../app/session.ts";
import { SignInForm } from "../features/sign-in/sign-in-form.tsx";
import { wayBack } from "../features/sign-in/way-back.ts";
import { PageHead } from "../kit/page/page-head.tsx";
import { Sheet } from "../kit/page/sheet.tsx";

/** Signs in and leads to where one wanted to be. */
export default function SignInPage(): ReactElement {
  const account = useAccount();
  const [params] = useSearchParams();
  const to = wayBack(params.get("to"));
  // Signing in changes who is signed in, and that alone leads on.
  if (account !== null) return <Navigate to={to} replace />;
  return (
    <div className="mx-auto max-w-[24.375rem]">
      <PageHead
        title="Sign in"
        facts={
          to === PATHS.floor.path ? "Every seam, on the record." : "Then on to the page that you asked for."
        }
      />
      <Sheet>
        <SignInForm onSignIn={({ login, password }) => signIn(login, password)} />
      </Sheet>
      <p className="mt-5 text-sm text-ash">
        Beadroll records and advises. It is no safety function: guards, interlocks, local codes and the
        judgement of the responsible coordinator and inspector stand above it.
      </p>
    </div>
  );
}
