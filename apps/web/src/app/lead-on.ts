import { redirect, replace } from "react-router";

/**
 * For loaders of pages that are only doors: leads on to another page so that the way back skips the door.
 * On the way to the door by a link, the browser does not stand there yet, and a redirect is enough; opened by its
 * address, or come back to, the door is where the browser stands, and is replaced.
 * @param here where the browser stands now, as path and search
 */
export function leadOn(
  request: Request,
  to: string,
  here: string = location.pathname + location.search,
): Response {
  const { pathname, search } = new URL(request.url);
  return pathname + search === here ? replace(to) : redirect(to);
}
