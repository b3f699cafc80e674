import { PATHS } from "../../app/paths.ts";

/**
 * Where to go after signing in: the address asked for, if it is one of this application; else the floor. An address
 * that leads elsewhere (`//host`, `https:`) is never followed.
 */
export function wayBack(to: string | null): string {
  if (to === null || !to.startsWith("/") || /^\/[/\\]/.test(to)) return PATHS.floor.path;
  return to.startsWith(PATHS.signIn.path) ? PATHS.floor.path : to;
}
