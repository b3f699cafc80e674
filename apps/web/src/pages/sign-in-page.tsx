import type { ReactElement } from "react";
import { Navigate, useNavigate, useSearchParams } from "react-router";
import { PATHS } from "../app/paths.ts";
import { signIn, useAccount } from "../app/session.ts";
import { SignInForm } from "../features/sign-in/sign-in-form.tsx";
import { wayBack } from "../features/sign-in/way-back.ts";
import { PageHead } from "../kit/page/page-head.tsx";
import { Sheet } from "../kit/page/sheet.tsx";

/** Signs in and leads to where one wanted to be. */
export default function SignInPage(): ReactElement {
  const account = useAccount();
  const navigate = useNavigate();
  const [params] = useSearchParams();
  const to = wayBack(params.get("to"));
  if (account !== null) return <Navigate to={to} replace />;
  return (
    <div className="mx-auto max-w-md">
      <PageHead
        title="Sign in"
        facts={
          to === PATHS.floor.path ? "Every seam, on the record." : "You are led on to the page you asked for."
        }
      />
      <Sheet>
        <SignInForm
          onSignIn={async (fields) => {
            await signIn(fields.login, fields.password);
            await navigate(to, { replace: true });
          }}
        />
      </Sheet>
      <p className="mt-5 text-sm text-ash">
        Beadroll records and advises. It is no safety function: guards, interlocks, local codes and the
        responsible coordinator's and inspector's judgement stand above it.
      </p>
    </div>
  );
}
