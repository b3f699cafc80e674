import { afterEach, beforeEach, describe, expect, it } from "vitest";
import { startTestServer, TEST_PASSWORD, type TestServer } from "../testing/test-server.ts";
import { createUser } from "../users/users.service.ts";

let server: TestServer;
let clock: Date;

beforeEach(async () => {
  clock = new Date("2026-11-30T08:00:00.000Z");
  server = await startTestServer(() => clock);
  await createUser(
    server.context,
    { login: "i.varga", name: "Ilka Varga", roles: ["operator"], password: TEST_PASSWORD },
    4,
  );
});
afterEach(() => server.close());

const signIn = (password = TEST_PASSWORD, login = "i.varga") =>
  server.http.post("/api/v1/session").send({ login, password });
const cookieOf = (answer: { headers: Record<string, unknown> }): string =>
  String([answer.headers["set-cookie"]].flat()[0]).split(";")[0] ?? "";
const refresh = (cookie: string) => server.http.post("/api/v1/session/refresh").set("Cookie", cookie);
const pass = (seconds: number) => {
  clock = new Date(clock.getTime() + seconds * 1000);
};

describe("signing in", () => {
  it("gives a token that names the person, and a cookie that scripts cannot read", async () => {
    const answer = await signIn();
    expect(answer.status).toBe(201);
    expect(answer.body.account).toMatchObject({ name: "Ilka Varga", roles: ["operator"] });
    expect(String(answer.headers["set-cookie"])).toMatch(/HttpOnly; SameSite=Strict/);
    const me = await server.http.get("/api/v1/me").set("Authorization", `Bearer ${answer.body.access_token}`);
    expect(me.body.account.login).toBe("i.varga");
  });

  it("refuses a wrong password and an unknown name in the same words", async () => {
    const wrong = await signIn("not the password");
    const unknown = await signIn(TEST_PASSWORD, "nobody.here");
    expect([wrong.status, unknown.status]).toEqual([401, 401]);
    expect(wrong.body.detail).toBe(unknown.body.detail);
  });

  it("makes the account wait after five failures, then lets it in again", async () => {
    for (let i = 0; i < 5; i += 1) await signIn("not the password");
    const waits = await signIn();
    expect(waits.status).toBe(429);
    expect(Number(waits.headers["retry-after"])).toBeGreaterThan(0);
    pass(61);
    expect((await signIn()).status).toBe(201);
  });

  it("ends with the access token after ten minutes", async () => {
    const { body } = await signIn();
    pass(601);
    expect(
      (await server.http.get("/api/v1/me").set("Authorization", `Bearer ${body.access_token}`)).status,
    ).toBe(401);
  });
});

describe("a refresh token", () => {
  it("gives a new session and a new cookie each time", async () => {
    const first = cookieOf(await signIn());
    const second = await refresh(first);
    expect(second.status).toBe(200);
    expect(cookieOf(second)).not.toBe(first);
    expect((await refresh(cookieOf(second))).status).toBe(200);
  });

  it("used a second time later ends every session that came from it", async () => {
    const first = cookieOf(await signIn());
    const second = cookieOf(await refresh(first));
    pass(30);
    expect((await refresh(first)).status).toBe(401);
    expect((await refresh(second)).status).toBe(401);
  });

  it("serves two tabs that wake at the same moment", async () => {
    const cookie = cookieOf(await signIn());
    const answers = await Promise.all([refresh(cookie), refresh(cookie)]);
    expect(answers.map((answer) => answer.status)).toEqual([200, 200]);
  });

  it("gives nothing after signing out", async () => {
    const cookie = cookieOf(await signIn());
    await server.http.delete("/api/v1/session").set("Cookie", cookie).expect(204);
    expect((await refresh(cookie)).status).toBe(401);
  });

  it("gives nothing when it is too old, and nothing to pages of another origin", async () => {
    const cookie = cookieOf(await signIn());
    expect((await refresh(cookie).set("Origin", "http://elsewhere.example")).status).toBe(403);
    pass(15 * 86_400);
    expect((await refresh(cookie)).status).toBe(401);
  });
});
