import bcrypt from "bcryptjs";

/** Rounds of bcrypt: about a quarter of a second on a small server. */
const COST = 11;

/** Compared against when the name is unknown, so that both refusals take the same time. */
const NO_SUCH_USER = "$2b$11$wweL9ZHjaSdBbODwcLl5JOYW7rJeWjL57zl4rivIA4Six4.dq4Cd.";

/** Hash of a password. bcrypt reads 72 bytes; schemas keep passwords shorter where it matters. */
export function hashPassword(password: string, cost = COST): Promise<string> {
  return bcrypt.hash(password, cost);
}

/** Whether a password is the one that was hashed; null stands for a user that does not exist. */
export function isPassword(password: string, hash: string | null): Promise<boolean> {
  return bcrypt.compare(password, hash ?? NO_SUCH_USER);
}
