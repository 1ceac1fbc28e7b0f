import type { Command } from "commander";
import { deliver } from "../deliver.ts";
import { type Io, UsageError } from "../io.ts";

export function addSchema(program: Command, io: Io): void {
  program
    .command("schema")
    .description("JSON Schema of the study file, for editors that complete and check as one types.")
    .option("-o, --output <file>", "write it to a file instead")
    .option("--reference", "a page for people instead, in Markdown: every key with unit, default and example")
    .option("--json", "it is JSON in any case")
    .option("--quiet", "print no more than is asked for")
    .addHelpText(
      "after",
      "\nExamples:\n  toehold schema -o toehold.schema.json\n  toehold schema --reference -o study-keys.md",
    )
    .action(async (options: SchemaOptions) => {
      if (options.reference === true && options.json === true)
        throw new UsageError("--reference is a page in Markdown, and --json asks for the schema: give one of the two");
      const text = options.reference === true ? await reference() : await schema();
      await deliver(text, options, [], io);
    });
}

interface SchemaOptions {
  readonly output?: string;
  readonly quiet?: boolean;
  readonly json?: boolean;
  readonly reference?: boolean;
}

async function schema(): Promise<string> {
  const { studyJsonSchema } = await import("../../study/json-schema.ts");
  return JSON.stringify(studyJsonSchema(), null, 2);
}

async function reference(): Promise<string> {
  const { studyReference } = await import("../../study/reference.ts");
  return studyReference();
}
