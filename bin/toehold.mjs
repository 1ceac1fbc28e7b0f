#!/usr/bin/env node
// The launcher: nothing but starting the command line.
const major = Number(process.versions.node.split(".")[0]);
if (major < 20) {
  process.stderr.write(`toehold needs Node.js 20 or newer; this is ${process.versions.node}.\n`);
  process.exit(2);
}
let main;
try {
  // One file of all that a command needs: reading three hundred modules would take longer than a check.
  ({ main } = await import("../dist/bundle/main.js"));
} catch (error) {
  if (error?.code !== "ERR_MODULE_NOT_FOUND" || !String(error.message).includes("bundle/main.js")) throw error;
  process.stderr.write("toehold is not built yet: run `npm ci` (or `npm run build`) in its folder first.\n");
  process.exit(3);
}
await main();
