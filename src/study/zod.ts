/**
 * The validator, told not to make code from strings: a strict page would refuse that, and for one study it costs more than it saves.
 * Import it as a namespace, so that what no schema uses stays out of bundles.
 */
import { config } from "zod";

config({ jitless: true });

export * from "zod";
