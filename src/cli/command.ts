import type { Command } from "commander";
import type { Io } from "./io.ts";

/** Puts one command on the program. `end` sets an exit code other than 0 for a command that came to its end. */
export type AddCommand = (program: Command, io: Io, end: (code: number) => void) => void;
