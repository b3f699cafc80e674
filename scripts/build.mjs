// `npm run build`: installs what is missing and builds api, cli and web.
import { build, install } from "./tools.mjs";

await install();
await build();
