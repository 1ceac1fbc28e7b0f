import { mkdir, writeFile } from "node:fs/promises";
import { basename, join } from "node:path";
import { type Command, Option } from "commander";
import { reason } from "../files.ts";
import { type Io, UsageError } from "../io.ts";
import { type StarterAnswers, starterStudy } from "../starter-study.ts";
import { addSettings, numberBetween, type Setting, withText } from "../study-input.ts";

interface Options extends Partial<StarterAnswers> {
  readonly output: string;
  readonly json?: boolean;
  readonly quiet?: boolean;
  readonly set?: readonly Setting[];
}

const examples = `
Examples:
  toehold new my-wall
  toehold new my-wall --wall gravity --height 3 --water 1
  toehold new my-wall --units us --height 13 --quiet`;

export function addNew(program: Command, io: Io): void {
  addSettings(program.command("new"))
    .argument("<folder>", "folder to make; study.yaml is written into it")
    .description("A commented study to start from, which runs as it is. What no flag says is asked on a terminal.")
    .option("--title <text>", "title of the study")
    .addOption(new Option("--units <name>", "units of the study").choices(["metric", "us"]))
    .addOption(new Option("--wall <kind>", "kind of wall").choices(["cantilever", "gravity"]))
    .option(
      "--height <m>",
      "height above the base slab, or of a gravity wall; ft with --units us",
      numberBetween(0.5, 60),
    )
    .option("--water <m>", "highest credible water level above the underside; 0 for dry ground", numberBetween(0, 60))
    .option("-o, --output <file>", "name of the study in the folder", "study.yaml")
    .option("--json", "print where the study was written as JSON, and nothing else, on standard output")
    .option("--quiet", "print nothing, ask nothing")
    .addHelpText("after", examples)
    .action(async (folder: string, options: Options) => {
      if (basename(options.output) !== options.output)
        throw new UsageError("-o is a name in the folder, without a path");
      const target = join(folder, options.output);
      const text = await withSettings(starterStudy(await answersOf(options, io)), options.set ?? [], target);
      await writeNew(folder, target, text);
      if (options.json) io.out(`${JSON.stringify({ kind: "new", file: target }, null, 2)}\n`);
      else if (!options.quiet)
        io.out(`Written to ${target}. Next:\n  toehold check ${target}\n  toehold assess ${target}\n`);
    });
}

/** @throws UsageError where the file is there already: it is left as it is */
async function writeNew(folder: string, target: string, text: string): Promise<void> {
  try {
    await mkdir(folder, { recursive: true });
    await writeFile(target, text, { flag: "wx" });
  } catch (error) {
    if ((error as { code?: string }).code === "EEXIST")
      throw new UsageError(`${target} is there already and was left as it is; choose another folder`);
    throw new UsageError(`cannot write ${target}: ${reason(error)}`);
  }
}

/** The study with its settings, comments kept, once it has been read without complaint. */
async function withSettings(text: string, set: readonly Setting[], file: string): Promise<string> {
  const { readStudy } = await import("../../study/read-study.ts");
  withText(text, () => readStudy(text, { file, set }));
  if (set.length === 0) return text;
  const { parse, parseDocument } = await import("yaml");
  const document = parseDocument(text);
  for (const [path, value] of set) document.setIn(path.split("."), document.createNode(parse(value), { flow: true }));
  return document.toString({ lineWidth: 0 });
}

/** What the flags leave open is asked on a terminal, and taken by default elsewhere. */
async function answersOf(options: Options, io: Io): Promise<StarterAnswers> {
  const ask = options.quiet || options.json ? undefined : io.ask;
  const word = <W extends string>(question: string, words: readonly [W, ...W[]]): Promise<W> =>
    asked(ask, `${question}, ${words.join(" or ")} [${words[0]}]: `, words[0], (text) =>
      words.find((one) => one === text),
    );
  const number = (question: string, usual: number, [low, high]: readonly [number, number]): Promise<number> =>
    asked(ask, `${question} [${usual}]: `, usual, (text) => {
      const value = Number(text);
      return value >= low && value <= high ? value : undefined;
    });
  const title =
    options.title ?? (await asked(ask, "Title of the study [A wall of mine]: ", "A wall of mine", (text) => text));
  const units = options.units ?? (await word<"metric" | "us">("Units", ["metric", "us"]));
  const wall = options.wall ?? (await word<"cantilever" | "gravity">("Kind of wall", ["cantilever", "gravity"]));
  const unit = units === "us" ? "ft" : "m";
  const part = wall === "gravity" ? "Height of the wall" : "Height of the stem above the base slab";
  const height = options.height ?? (await number(`${part}, ${unit}`, units === "us" ? 13 : 4, [0.5, 60]));
  const half = Number((height / 2).toFixed(1));
  const water =
    options.water ??
    (await number(`Highest credible water level behind, ${unit} above the underside, 0 for dry ground`, half, [0, 60]));
  return { title, units, wall, height, water };
}

/** Asks until the answer reads; an empty one, or nobody to ask, takes the usual. */
async function asked<T>(ask: Io["ask"], question: string, usual: T, read: (text: string) => T | undefined): Promise<T> {
  if (ask === undefined) return usual;
  for (;;) {
    const text = (await ask(question)).trim();
    const value = text === "" ? usual : read(text);
    if (value !== undefined) return value;
  }
}
