import type { Command } from "commander";
import { deliver } from "../deliver.ts";
import type { Io } from "../io.ts";

export function addSchema(program: Command, io: Io): void {
  program
    .command("schema")
    .description("JSON Schema of the study file, for editors that complete and check as one types.")
    .option("-o, --output <file>", "write it to a file instead")
    .option("--json", "it is JSON in any case")
    .option("--quiet", "print no more than is asked for")
    .addHelpText("after", "\nExample:\n  toehold schema -o toehold.schema.json")
    .action(async (options: { readonly output?: string; readonly quiet?: boolean; readonly json?: boolean }) => {
      const { studyJsonSchema } = await import("../../study/json-schema.ts");
      await deliver(JSON.stringify(studyJsonSchema(), null, 2), options, [], io);
    });
}
