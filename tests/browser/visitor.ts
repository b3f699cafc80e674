import type { Browser, BrowserContext, Page } from "playwright-core";

/** Accounts of the demo shop, by role. */
export const ACCOUNTS = {
  quality: { login: "s.kowal", password: "demo-quality-lead" },
  inspector: { login: "m.solheim", password: "demo-inspector-one" },
  coordinator: { login: "h.oyelaran", password: "demo-coordinator" },
  auditor: { login: "p.lindqvist", password: "demo-auditor-reads" },
  administrator: { login: "t.brandal", password: "demo-administrator" },
  operator: { login: "i.varga", password: "demo-operator-one" },
} as const;
export type Role = keyof typeof ACCOUNTS;

/** A person with a browser of their own. */
export interface Visitor {
  readonly page: Page;
  /** What the browser complained of since it opened. */
  readonly complaints: string[];
  close(): Promise<void>;
}

/** Opens a browser at an address. */
export async function visit(
  browser: Browser,
  address: string,
  options: { readonly colorScheme?: "light" | "dark"; readonly width?: number } = {},
): Promise<Visitor> {
  const context: BrowserContext = await browser.newContext({
    viewport: { width: options.width ?? 1280, height: 800 },
    colorScheme: options.colorScheme ?? "light",
    reducedMotion: "reduce",
  });
  const page = await context.newPage();
  const complaints: string[] = [];
  // The first visit asks for a session that is not there; the browser logs that answer by itself.
  page.on("console", (message) => {
    if (message.type() === "error" && !/status of 401/.test(message.text())) complaints.push(message.text());
  });
  page.on("pageerror", (error) => complaints.push(error.message));
  await page.goto(address);
  return { page, complaints, close: () => context.close() };
}

/** Fills the sign-in page, which must be open, and waits until it has led on. */
export async function passSignIn(page: Page, role: Role): Promise<void> {
  const { login, password } = ACCOUNTS[role];
  await page.getByLabel("Name").fill(login);
  await page.getByLabel("Password", { exact: true }).fill(password);
  await page.getByRole("button", { name: "Sign in" }).click();
  await page.waitForURL((url) => url.pathname !== "/sign-in");
}

async function bearer(url: string, role: Role): Promise<{ Authorization: string }> {
  const session = await fetch(`${url}/api/v1/session`, {
    method: "POST",
    headers: { "Content-Type": "application/json" },
    body: JSON.stringify(ACCOUNTS[role]),
  });
  const { access_token }: { access_token: string } = await session.json();
  return { Authorization: `Bearer ${access_token}` };
}

async function ask(url: string, role: Role, path: string): Promise<Response> {
  const answer = await fetch(`${url}/api/v1${path}`, { headers: await bearer(url, role) });
  if (!answer.ok) throw new Error(`${path}: ${answer.status} ${await answer.text()}`);
  return answer;
}

/** Asks the API as a person does; for finding what a test needs, not for testing. */
export async function askApi<T>(url: string, role: Role, path: string): Promise<T> {
  return (await ask(url, role, path)).json();
}

/** A stored file's bytes. */
export async function askFile(url: string, role: Role, digest: string): Promise<Buffer> {
  return Buffer.from(await (await ask(url, role, `/files/${digest}`)).arrayBuffer());
}
