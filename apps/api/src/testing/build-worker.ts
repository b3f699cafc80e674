import { buildApi } from "../../build.mjs";

/** Builds the bundles once before the API's tests: the measuring worker runs as built, as it does in production. */
export default async function setup(): Promise<void> {
  await buildApi();
}
