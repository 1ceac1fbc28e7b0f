import { Argument, type Command } from "commander";
import { deliver } from "../deliver.ts";
import type { Io } from "../io.ts";

const examples = `
Examples:
  toehold completion bash >> ~/.bashrc
  toehold completion fish > ~/.config/fish/completions/toehold.fish
  toehold completion zsh -o ~/.zfunc/_toehold        (a folder on $fpath)`;

export function addCompletion(program: Command, io: Io): void {
  program
    .command("completion")
    .addArgument(new Argument("<shell>", "shell to write for").choices(["bash", "zsh", "fish"]))
    .description("A script that completes commands, options and their words in a shell.")
    .option("-o, --output <file>", "write it to a file instead")
    .option("--quiet", "print no more than is asked for")
    .addHelpText("after", examples)
    .action(async (shell: "bash" | "zsh" | "fish", options: { readonly output?: string; readonly quiet?: boolean }) => {
      const { commandWords, completionScript } = await import("../completion.ts");
      await deliver(completionScript(shell, commandWords(program)), options, [], io);
    });
}
