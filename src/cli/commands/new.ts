import { mkdir, stat, writeFile } from "node:fs/promises";
import { join } from "node:path";
import type { Command } from "commander";
import { type Io, UsageError } from "../io.ts";
import { starterStudy } from "../starter-study.ts";
import { numberBetween } from "../study-input.ts";

interface Options {
  readonly title?: string;
  readonly height?: number;
  readonly units?: string;
  readonly quiet?: boolean;
}

export function addNew(program: Command, io: Io): void {
  program
    .command("new")
    .argument("<folder>", "folder to make; study.yaml is written into it")
    .description("A commented study to start from, which runs as it is.")
    .option("--title <text>", "title of the study")
    .option("--height <m>", "retained height above the base slab, in m (ft with --units us)", numberBetween(0.5, 60))
    .option("--units <metric|us>", "units of the study", "metric")
    .option("--quiet", "print nothing")
    .addHelpText("after", "\nExample:\n  toehold new my-wall --height 4 && toehold assess my-wall/study.yaml")
    .action(async (folder: string, options: Options) => {
      if (options.units !== "metric" && options.units !== "us")
        throw new UsageError(`--units is metric or us, not ${options.units}`);
      const target = join(folder, "study.yaml");
      if (await exists(target))
        throw new UsageError(`${target} is there already and was left as it is; choose another folder`);
      const answers = await ask(options, io);
      await mkdir(folder, { recursive: true });
      await writeFile(target, starterStudy(answers), { flag: "wx" });
      if (!options.quiet)
        io.out(`Written to ${target}. Next:\n  toehold check ${target}\n  toehold assess ${target}\n`);
    });
}

async function exists(file: string): Promise<boolean> {
  return stat(file).then(
    () => true,
    () => false,
  );
}

/** What the flags leave open is asked on a terminal, and taken by default elsewhere. */
async function ask(options: Options, io: Io): Promise<{ title: string; height: number; units: "metric" | "us" }> {
  const units = options.units === "us" ? "us" : "metric";
  const usual = {
    title: options.title ?? "A wall of mine",
    height: options.height ?? (units === "us" ? 13 : 4),
    units,
  } as const;
  if (!io.outIsTerminal || process.stdin.isTTY !== true) return usual;
  const { createInterface } = await import("node:readline/promises");
  const lines = createInterface({ input: process.stdin, output: process.stdout });
  try {
    const title =
      options.title ?? ((await lines.question(`Title of the study [${usual.title}]: `)).trim() || usual.title);
    let height = options.height;
    while (height === undefined) {
      const text = (
        await lines.question(
          `Height of the stem above the base slab, ${units === "us" ? "ft" : "m"} [${usual.height}]: `,
        )
      ).trim();
      const value = text === "" ? usual.height : Number(text);
      if (value >= 0.5 && value <= 60) height = value;
      else io.out("A number from 0.5 to 60, please.\n");
    }
    return { title, height, units };
  } finally {
    lines.close();
  }
}
