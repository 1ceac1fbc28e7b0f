import type { Command } from "commander";
import { type Io, UsageError } from "../io.ts";

const shells = ["bash", "zsh", "fish"] as const;

interface Words {
  readonly name: string;
  readonly description: string;
  readonly options: readonly { readonly long: string; readonly description: string }[];
}

export function addCompletion(program: Command, io: Io): void {
  program
    .command("completion")
    .argument("<shell>", shells.join(", "))
    .description("A completion script for a shell.")
    .addHelpText(
      "after",
      "\nExamples:\n  toehold completion bash >> ~/.bashrc\n  toehold completion zsh > ~/.zfunc/_toehold\n  toehold completion fish > ~/.config/fish/completions/toehold.fish",
    )
    .action((shell: string) => {
      const commands = wordsOf(program);
      if (shell === "bash") io.out(bash(commands));
      else if (shell === "zsh") io.out(zsh(commands));
      else if (shell === "fish") io.out(fish(commands));
      else throw new UsageError(`no completion for ${shell}; there is one for ${shells.join(", ")}`);
    });
}

function wordsOf(program: Command): readonly Words[] {
  return program.commands.map((command) => ({
    name: command.name(),
    description: command.description(),
    options: command.options.flatMap((option) =>
      option.long === undefined || option.long === null ? [] : [{ long: option.long, description: option.description }],
    ),
  }));
}

function bash(commands: readonly Words[]): string {
  const cases = commands.map(
    ({ name, options }) => `    ${name}) words="${options.map((option) => option.long).join(" ")}" ;;`,
  );
  return `# toehold completion for bash
_toehold() {
  local cur="\${COMP_WORDS[COMP_CWORD]}" words=""
  if [ "$COMP_CWORD" -eq 1 ]; then
    COMPREPLY=($(compgen -W "${commands.map((command) => command.name).join(" ")}" -- "$cur"))
    return
  fi
  case "\${COMP_WORDS[1]}" in
${cases.join("\n")}
  esac
  case "$cur" in
    -*) COMPREPLY=($(compgen -W "$words" -- "$cur")) ;;
    *) COMPREPLY=($(compgen -f -- "$cur")) ;;
  esac
}
complete -o filenames -F _toehold toehold
`;
}

const quoted = (text: string): string => `'${text.replaceAll("'", "'\\''")}'`;

function zsh(commands: readonly Words[]): string {
  const list = commands.map(
    ({ name, description }) => `    ${quoted(`${name}:${description.replaceAll(":", "\\:")}`)}`,
  );
  const cases = commands.map(({ name, options }) => {
    const specs = options.map((option) =>
      quoted(`${option.long}[${option.description.replaceAll("[", "(").replaceAll("]", ")").replaceAll(":", " ")}]`),
    );
    return `    ${name}) _arguments ${[...specs, quoted("*:file:_files")].join(" ")} ;;`;
  });
  return `#compdef toehold
_toehold() {
  local -a commands
  commands=(
${list.join("\n")}
  )
  if (( CURRENT == 2 )); then
    _describe command commands
    return
  fi
  shift words
  (( CURRENT-- ))
  case "$words[1]" in
${cases.join("\n")}
  esac
}
compdef _toehold toehold
`;
}

function fish(commands: readonly Words[]): string {
  const names = commands.map((command) => command.name).join(" ");
  const first = commands.map(
    ({ name, description }) =>
      `complete -c toehold -n "not __fish_seen_subcommand_from ${names}" -f -a ${name} -d ${quoted(description)}`,
  );
  const rest = commands.flatMap(({ name, options }) =>
    options.map(
      (option) =>
        `complete -c toehold -n "__fish_seen_subcommand_from ${name}" -l ${option.long.slice(2)} -d ${quoted(option.description)}`,
    ),
  );
  return `# toehold completion for fish\n${[...first, ...rest].join("\n")}\n`;
}
