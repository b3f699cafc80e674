import { describe, expect, it } from "vitest";
import { ConfigError, readConfig } from "./config.ts";

describe("the configuration", () => {
  it("serves without any setting", () => {
    expect(readConfig({})).toMatchObject({
      port: 8080,
      host: "127.0.0.1",
      public_url: "http://localhost:8080",
      secret: null,
    });
  });

  it("takes its settings from the environment, blank ones as absent", () => {
    expect(
      readConfig({
        BEADROLL_PORT: "9001",
        BEADROLL_PUBLIC_URL: "https://weld.example/",
        BEADROLL_SECRET: "",
      }),
    ).toMatchObject({
      port: 9001,
      public_url: "https://weld.example",
      secret: null,
    });
  });

  it("is refused in one sentence that names every wrong setting", () => {
    const read = () => readConfig({ BEADROLL_PORT: "high", BEADROLL_SECRET: "short" });
    expect(read).toThrow(ConfigError);
    expect(read).toThrow(/BEADROLL_PORT.*BEADROLL_SECRET/);
  });
});
