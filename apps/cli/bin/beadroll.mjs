#!/usr/bin/env node
// The launcher exists before the first build, so that the package manager can link it at install.
await import("../dist/beadroll.mjs");
