import { Me, Session, SignIn } from "../schemas/session.ts";
import { contract } from "./contract.ts";

const group = "Sign-in";

export const signIn = contract({
  method: "post",
  path: "/session",
  operationId: "signIn",
  summary: "Sign in with name and password",
  description:
    "Answers with a short access token and sets a rotating refresh token in an httpOnly cookie. Five failures in a row make the account wait.",
  group,
  access: "open",
  body: { kind: "json", schema: SignIn },
  answer: { status: 201, description: "Signed in", schema: Session },
  problems: ["request-invalid", "sign-in-failed", "rate-limited"],
});

export const refreshSession = contract({
  method: "post",
  path: "/session/refresh",
  operationId: "refreshSession",
  summary: "Exchange the refresh cookie for a new access token",
  description:
    "The cookie rotates with each use. A refresh token used twice ends every session that came from it.",
  group,
  access: "open",
  answer: { status: 200, description: "Still signed in", schema: Session },
  problems: ["not-signed-in", "not-allowed"],
});

export const signOut = contract({
  method: "delete",
  path: "/session",
  operationId: "signOut",
  summary: "Sign out here",
  group,
  access: "open",
  answer: { status: 204, description: "Signed out" },
  problems: ["not-allowed"],
});

export const getMe = contract({
  method: "get",
  path: "/me",
  operationId: "getMe",
  summary: "Who asks, and what they may do",
  group,
  access: "signed-in",
  answer: { status: 200, description: "The caller", schema: Me },
  problems: [],
});
