/**
 * npm run bench: speed as ratios measured in one run, on the built package, each number the median of several fresh
 * processes taken in turn. Writes a table between the bench marks of README.md.
 *
 *   node tests/bench/bench.mjs [--rounds 5] [--quick | --long] [--no-write]
 */
import { execFileSync, spawnSync } from "node:child_process";
import { existsSync, mkdirSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { cpus } from "node:os";
import { join } from "node:path";
import { fileURLToPath } from "node:url";

const here = fileURLToPath(new URL("./", import.meta.url));
const root = fileURLToPath(new URL("../../", import.meta.url));
const argument = (name, otherwise) => {
  const place = process.argv.indexOf(name);
  return place < 0 ? otherwise : process.argv[place + 1];
};
const rounds = Number(argument("--rounds", "5"));
const long = process.argv.includes("--long");
const quick = process.argv.includes("--quick");
const launcher = join(root, "bin/toehold.mjs");
if (!existsSync(join(root, "dist/index.js"))) throw new Error("run `npm run build` first");

const median = (values) => [...values].sort((a, b) => a - b)[Math.floor(values.length / 2)];
const spreadOf = (values) => `${figure(Math.min(...values))}–${figure(Math.max(...values))}`;
const figure = (value) => (value >= 100 ? value.toFixed(0) : value.toPrecision(3));
const say = (text) => process.stderr.write(`${text}\n`);

/** Runs one part of part.mjs in a process of its own. */
const part = (...args) =>
  JSON.parse(
    execFileSync(process.execPath, ["--expose-gc", join(here, "part.mjs"), ...args.map(String)], {
      encoding: "utf8",
      maxBuffer: 1 << 26,
    }),
  );

const build = join(root, ".bench");
mkdirSync(build, { recursive: true });
const scratch = mkdtempSync(join(build, "run-"));

const compile = (source, ...flags) => {
  const target = join(scratch, source.replace(/\.c$/, ""));
  const made = spawnSync("cc", ["-O3", "-march=native", ...flags, "-o", target, join(here, source), "-lm"]);
  return made.status === 0 ? target : undefined;
};
const plain = compile("yardstick.c");
const vector = compile("yardstick-vector.c", "-ffast-math");
const numpy = spawnSync("python3", ["-c", "import numpy"]).status === 0;
const correlation = part("correlation").text;
const yardstick = (command, ...args) =>
  JSON.parse(
    execFileSync(command, args.map(String), {
      input: correlation,
      encoding: "utf8",
      env: { ...process.env, OMP_NUM_THREADS: "1", OPENBLAS_NUM_THREADS: "1" },
    }),
  );

const contenders = [
  ["toehold, one thread", () => part("loop", 150 * 16_384)],
  plain && ["plain C (libm)", () => yardstick(plain, 3e6)],
  vector && ["vectorised C with tables", () => yardstick(vector, 8e6)],
  numpy && ["numpy", () => yardstick("python3", join(here, "yardstick.py"), 1e6)],
].filter(Boolean);

/** Every failure count against the first's: at five standard errors of their difference, a false alarm in a million. */
function agree(name, own, other) {
  for (let k = 0; k < 4; k++) {
    const [p, q] = [own.failures[k] / own.samples, other.failures[k] / other.samples];
    const together = (own.failures[k] + other.failures[k]) / (own.samples + other.samples);
    const error = Math.sqrt(Math.max(together * (1 - together), 1e-7) * (1 / own.samples + 1 / other.samples));
    if (!(Math.abs(p - q) <= 5 * error))
      throw new Error(`${name} assesses another wall: ${p} against ${q} in count ${k}`);
  }
}

const lines = [];
const table = (head, rows) =>
  lines.push(
    "",
    `| ${head.join(" | ")} |`,
    `|${head.map(() => "---").join("|")}|`,
    ...rows.map((row) => `| ${row.join(" | ")} |`),
  );

say("whole loop against the yardsticks");
const speeds = new Map(contenders.map(([name]) => [name, []]));
for (let round = 0; round < rounds; round++) {
  let own;
  for (const [name, run] of contenders) {
    const result = run();
    own ??= result;
    agree(name, own, result);
    speeds.get(name).push(result.samples / result.seconds / 1e6);
  }
}
const own = speeds.get(contenders[0][0]);
table(
  [
    "Whole loop: draw, correlate, marginals, mechanics, count",
    "million samples a second (least–most)",
    "toehold against it (least–most)",
  ],
  [...speeds].map(([name, values]) => {
    const ratios = own.map((value, round) => value / values[round]);
    return [
      name,
      `${figure(median(values))} (${spreadOf(values)})`,
      values === own ? "" : `**${figure(median(ratios))}** (${spreadOf(ratios)})`,
    ];
  }),
);
for (const [there, name] of [
  [plain, "plain C: no C compiler `cc` here"],
  [numpy, "numpy: not here"],
])
  if (!there) lines.push("", `Left out: ${name}.`);

say("parts");
const parts = Array.from({ length: rounds }, () => part("parts"));
table(
  ["Part of the loop", "ns a sample", "processor time over wall time"],
  Object.keys(parts[0]).map((name) => [
    name,
    figure(median(parts.map((p) => p[name].ns))),
    figure(median(parts.map((p) => p[name].busy))),
  ]),
);

say("cold start");
const time = (args) => {
  const start = performance.now();
  const ran = spawnSync(process.execPath, args, { stdio: "ignore" });
  if (ran.status !== 0) throw new Error(`${args.join(" ")} ended with ${ran.status}`);
  return (performance.now() - start) / 1e3;
};
const bench = join(here, "bench.yaml");
const commands = [
  ["`node -e 0`", ["-e", "0"]],
  ["`toehold check`", [launcher, "check", bench]],
  [
    "`toehold assess`, 1e6 samples",
    [launcher, "assess", bench, "--samples", "1e6", "--precision", "0", "--workers", "1"],
  ],
  ["`toehold assess`, stopped at its precision", [launcher, "assess", bench]],
  ["`toehold report`", [launcher, "report", bench, "-o", join(scratch, "report.html")]],
];
const times = commands.map(() => []);
for (let round = 0; round < rounds; round++) for (const [k, [, args]] of commands.entries()) times[k].push(time(args));
table(
  ["Command, from cold", "seconds", "times `node -e 0`"],
  commands.map(([name], k) => [
    name,
    figure(median(times[k])),
    k === 0 ? "" : figure(median(times[k].map((t, round) => t / times[0][round]))),
  ]),
);

say("workers");
const pairs = Array.from({ length: rounds }, () => [part("workers", 1, 4e6), part("workers", 2, 4e6)]);
table(
  ["Threads", "million samples a second", "against one", "processor time over wall time"],
  [0, 1].map((k) => [
    k + 1,
    figure(median(pairs.map((pair) => pair[k].samples / pair[k].seconds / 1e6))),
    figure(median(pairs.map((pair) => pair[0].seconds / pair[k].seconds))),
    figure(median(pairs.map((pair) => pair[k].busy))),
  ]),
);

say("growth and memory");
const growth = (of, values) => values.map((value) => [of, value, part("growth", of, value)]);
table(
  ["Growth with", "", "ns a sample"],
  [...growth("unknowns", [2, 5, 10]), ...growth("layers", [1, 2, 4, 8])].map(([of, value, { ns }]) => [
    of,
    value,
    figure(ns),
  ]),
);
const sizes = [1e5, 1e6, 1e7, ...(quick ? [] : [1e8]), ...(long ? [1e9] : [])];
table(
  ["Samples", "seconds", "peak memory, MB", "heap after, MB"],
  sizes.map((samples) => {
    const { seconds, peak, heap } = part("memory", samples);
    return [samples.toExponential(0).replace("+", ""), figure(seconds), figure(peak), figure(heap)];
  }),
);
const flat = part("flat", 1e7);
lines.push(
  "",
  `Heap before and after 1e7 evaluations of the kernel: ${flat.before} and ${flat.after} bytes (${figure((flat.after - flat.before) / flat.evaluations)} bytes each).`,
);

rmSync(scratch, { recursive: true });
const heading = `Measured on ${cpus().length} × ${cpus()[0].model.trim()}, node ${process.versions.node}; medians of ${rounds} fresh processes. Speeds and parts are in processor time (one thread), the rest by the clock. Ratios were taken in one run; times depend on the machine and on what else it does.`;
const text = [heading, ...lines].join("\n");
console.log(text);
const readme = join(root, "README.md");
const [open, close] = ["<!-- bench -->", "<!-- /bench -->"];
const page = readFileSync(readme, "utf8");
if (!process.argv.includes("--no-write") && page.includes(open) && page.includes(close))
  writeFileSync(
    readme,
    `${page.slice(0, page.indexOf(open) + open.length)}\n${text}\n${page.slice(page.indexOf(close))}`,
  );
