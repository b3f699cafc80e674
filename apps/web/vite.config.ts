import tailwindcss from "@tailwindcss/vite";
import react from "@vitejs/plugin-react";
import { defineConfig } from "vite";

/** The server that development talks to. */
const API = process.env["BEADROLL_API"] ?? "http://127.0.0.1:8080";

/** The framework, in one file of its own that stays in the browser's cache from release to release. */
const FRAMEWORK =
  /node_modules[\\/](react|react-dom|scheduler|react-router|@tanstack[\\/][a-z-]*query[a-z-]*)[\\/]/;

export default defineConfig({
  plugins: [react(), tailwindcss()],
  server: {
    host: "127.0.0.1",
    proxy: { "^/api/": API },
  },
  preview: { host: "127.0.0.1" },
  build: {
    outDir: "dist",
    // Nothing is written into the pages as data: URIs, so that the content policy can stay at 'self'.
    assetsInlineLimit: 0,
    // The 3D library is large; only the viewer loads it, and only when asked for.
    chunkSizeWarningLimit: 640,
    rolldownOptions: {
      output: {
        codeSplitting: {
          groups: [
            { name: "framework", test: FRAMEWORK },
            // With the policy's setting in the same file, no schema in any other file is made before it is set.
            { name: "schemas", test: /node_modules[\\/]zod[\\/]|[\\/]app[\\/]content-policy\.ts$/ },
          ],
        },
      },
    },
  },
});
