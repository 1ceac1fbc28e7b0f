import type { Command, Option } from "commander";

/** What a shell needs to know of the command line. */
export interface CommandWords {
  readonly name: string;
  readonly description: string;
  /** Words for the argument; file names where there are none. */
  readonly values: readonly string[];
  readonly options: readonly OptionWords[];
}

export interface OptionWords {
  /** "-o", "--output", or one of them alone. */
  readonly names: readonly string[];
  readonly description: string;
  readonly takesValue: boolean;
  /** Words for its value. */
  readonly values: readonly string[];
  /** The value may be a file. */
  readonly file: boolean;
}

/** Words that an option may take in place of a file name. */
const besideFiles: Readonly<Record<string, readonly string[]>> = { "--at": ["mean", "cautious"] };

export function commandWords(program: Command): readonly CommandWords[] {
  return program.commands.map((command) => ({
    name: command.name(),
    description: firstSentence(command.description()),
    values: command.registeredArguments[0]?.argChoices ?? [],
    options: command.options.map(optionWords),
  }));
}

function optionWords(option: Option): OptionWords {
  return {
    names: [option.short, option.long].filter((name) => name !== undefined),
    description: option.description,
    takesValue: option.required || option.optional,
    values: option.argChoices ?? besideFiles[option.long ?? ""] ?? [],
    file: (option.required || option.optional) && option.argChoices === undefined,
  };
}

const firstSentence = (text: string): string => /^.*?[.?](?= |$)/.exec(text)?.[0] ?? text;

export type Shell = "bash" | "zsh" | "fish";

/** A script that teaches a shell the commands, the options and their words. */
export function completionScript(shell: Shell, commands: readonly CommandWords[]): string {
  return { bash: bashScript, zsh: zshScript, fish: fishScript }[shell](commands);
}

/** Where it offers nothing, bash offers file names (complete -o default). */
function bashScript(commands: readonly CommandWords[]): string {
  const valueLines = commands.flatMap(({ name, options }) => {
    const wanting = options.filter(({ takesValue }) => takesValue);
    const patterns = (some: readonly OptionWords[]): string =>
      some.flatMap(({ names }) => names.map((flag) => `${name}:${flag}:*`)).join("|");
    const free = wanting.filter(({ values }) => values.length === 0);
    return [
      ...wanting
        .filter(({ values }) => values.length > 0)
        .map((one) => `    ${patterns([one])}) words="${one.values.join(" ")}" ;;`),
      ...(free.length === 0 ? [] : [`    ${patterns(free)}) ;;`]),
    ];
  });
  const flagLines = commands.map(
    ({ name, options }) => `    ${name}:*:-*) words="${options.flatMap(({ names }) => names).join(" ")} --help" ;;`,
  );
  const argumentLines = commands
    .filter(({ values }) => values.length > 0)
    .map(({ name, values }) => `    ${name}:*) words="${values.join(" ")}" ;;`);
  const names = commands.map(({ name }) => name).join(" ");
  return `# toehold completion bash >> ~/.bashrc
_toehold() {
  local word="\${COMP_WORDS[COMP_CWORD]}" before="\${COMP_WORDS[COMP_CWORD-1]}" words=""
  local command="\${COMP_WORDS[1]}"
  if [ "$COMP_CWORD" -eq 1 ]; then command=""; words="${names} help --help --version"; fi
  case "$command:$before:$word" in
${valueLines.join("\n")}
${flagLines.join("\n")}
${argumentLines.join("\n")}
    help:*) words="${names}" ;;
  esac
  COMPREPLY=( $(compgen -W "$words" -- "$word") )
}
complete -o default -F _toehold toehold
`;
}

function zshScript(commands: readonly CommandWords[]): string {
  const quoted = (text: string): string => text.replace(/'/g, "'\\''");
  const value = ({ takesValue, values, file }: OptionWords): string => {
    if (!takesValue) return "";
    if (values.length === 0) return ":value:_files";
    return file ? `:value:{ compadd ${values.join(" ")}; _files }` : `:value:(${values.join(" ")})`;
  };
  const options = ({ options: all, values }: CommandWords): string[] => [
    ...all.flatMap((one) =>
      one.names.map((name) => `'*${name}[${quoted(one.description.replace(/[[\]:\\]/g, "\\$&"))}]${value(one)}'`),
    ),
    values.length > 0 ? `'*:word:(${values.join(" ")})'` : "'*:file:_files'",
  ];
  const cases = commands.map(
    (command) => `    ${command.name})\n      _arguments -s \\\n        ${options(command).join(" \\\n        ")} ;;`,
  );
  const described = commands.map(
    ({ name, description }) => `    '${name}:${quoted(description.replace(/:/g, "\\:"))}'`,
  );
  return `#compdef toehold
# toehold completion zsh -o DIR/_toehold, where DIR is a folder on $fpath
_toehold() {
  local -a commands
  commands=(
${described.join("\n")}
  )
  if (( CURRENT == 2 )); then
    _describe command commands
    return
  fi
  local command="\${words[2]}"
  shift words
  (( CURRENT-- ))
  case "$command" in
${cases.join("\n")}
  esac
}
if [ "\${funcstack[1]}" = "_toehold" ]; then _toehold "$@"; else compdef _toehold toehold; fi
`;
}

function fishScript(commands: readonly CommandWords[]): string {
  const quoted = (text: string): string => `'${text.replace(/[\\']/g, "\\$&")}'`;
  const names = commands.map(({ name }) => name).join(" ");
  const seen = (name: string): string => `complete -c toehold -n '__fish_seen_subcommand_from ${name}'`;
  const option = (command: string, { names: flags, description, takesValue, values, file }: OptionWords): string => {
    const written = flags.map((flag) => (flag.startsWith("--") ? `-l ${flag.slice(2)}` : `-s ${flag.slice(1)}`));
    const after = [
      takesValue ? (file ? " -r -F" : " -x") : "",
      values.length > 0 ? ` -a ${quoted(values.join(" "))}` : "",
    ];
    return `${seen(command)} ${written.join(" ")}${after.join("")} -d ${quoted(description)}`;
  };
  return [
    "# toehold completion fish > ~/.config/fish/completions/toehold.fish",
    ...commands.map(
      ({ name, description }) =>
        `complete -c toehold -f -n 'not __fish_seen_subcommand_from ${names}' -a ${name} -d ${quoted(description)}`,
    ),
    ...commands.flatMap(({ name, values }) =>
      values.length > 0 ? [`${seen(name)} -f -a ${quoted(values.join(" "))}`] : [],
    ),
    ...commands.flatMap(({ name, options }) => options.map((words) => option(name, words))),
    "",
  ].join("\n");
}
