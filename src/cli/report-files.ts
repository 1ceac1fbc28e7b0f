/** The report in other forms than one page: a result file, tables, pictures. */
import { mkdir, stat } from "node:fs/promises";
import { createRequire } from "node:module";
import { join } from "node:path";
import type { ReportInput } from "../results.ts";
import { reason, refuseBadTarget, writeOutput } from "./files.ts";
import { UsageError } from "./io.ts";

export const reportFormats = ["html", "json", "csv", "svg", "png"] as const;
export type ReportFormat = (typeof reportFormats)[number];

/** One file, or a folder of several. */
export const isFolder = (format: ReportFormat): boolean => format === "csv" || format === "svg" || format === "png";

/** Where the report goes if nothing is said. */
export const usualTarget = (format: ReportFormat): string =>
  isFolder(format) ? `report-${format}` : `report.${format}`;

export interface ReportFile {
  readonly name: string;
  readonly content: string | Uint8Array;
}

/**
 * Looks before a long run whether the files can be written.
 *
 * @throws UsageError where a folder is wanted and something else is there
 */
export async function refuseBadPlace(format: ReportFormat, target: string, inputs: readonly string[]): Promise<void> {
  if (!isFolder(format)) return refuseBadTarget(target, inputs);
  if (target === "-") throw new UsageError(`--format ${format} writes several files: name a folder with -o`);
  const found = await stat(target).catch(() => undefined);
  if (found !== undefined && !found.isDirectory())
    throw new UsageError(`--format ${format} writes several files: ${target} is not a folder`);
  if (found === undefined) await refuseBadTarget(target, inputs);
}

/** Writes each file whole or not at all, into a folder that is made where it is missing. */
export async function writeFolder(
  folder: string,
  files: readonly ReportFile[],
  inputs: readonly string[],
): Promise<void> {
  try {
    await mkdir(folder, { recursive: true });
  } catch (error) {
    throw new UsageError(`cannot write ${folder}: ${reason(error)}`);
  }
  for (const { name, content } of files) await writeOutput(join(folder, name), content, inputs);
}

/** Everything that was computed, in one tree of the result file's words. */
export async function resultFile({ check, assess, scope, size }: ReportInput): Promise<string> {
  const { resultJson } = await import("../report/result-json.ts");
  return resultJson({
    ...assess,
    check,
    ...(scope === undefined ? {} : { scope }),
    ...(size === undefined ? {} : { size }),
  });
}

/** @param rows of samples.csv; no such file where 0 */
export async function tableFiles({ study, assess }: ReportInput, rows: number): Promise<readonly ReportFile[]> {
  const { variablesCsv, driversCsv, probabilitiesCsv, samplesCsv } = await import("../report/result-csv.ts");
  const files = [
    { name: "variables.csv", content: variablesCsv(assess) },
    { name: "probabilities.csv", content: probabilitiesCsv(assess) },
    { name: "drivers.csv", content: driversCsv(assess) },
  ];
  if (rows === 0) return files;
  const { sampleTable } = await import("../sample-table.ts");
  return [...files, { name: "samples.csv", content: samplesCsv(sampleTable(study, assess.seed, rows)) }];
}

/** Every picture of the page as a file of its own. */
export async function pictureFiles(page: string, format: "svg" | "png"): Promise<readonly ReportFile[]> {
  const { figureFiles } = await import("../report/figures.ts");
  const figures = figureFiles(page);
  if (format === "svg") return figures.map(({ name, svg }) => ({ name: `${name}.svg`, content: svg }));
  const paint = await painter();
  return figures.map(({ name, svg }) => ({ name: `${name}.png`, content: paint(svg) }));
}

/** Fonts come with a package, so that a picture does not depend on the machine; twice the size of the page's, for print. */
async function painter(): Promise<(svg: string) => Uint8Array> {
  const { Resvg } = await import("@resvg/resvg-js");
  const fonts = createRequire(import.meta.url);
  const fontFiles = ["DejaVuSans.ttf", "DejaVuSans-Bold.ttf"].map((name) =>
    fonts.resolve(`dejavu-fonts-ttf/ttf/${name}`),
  );
  const font = { fontFiles, loadSystemFonts: false, defaultFontFamily: "DejaVu Sans", sansSerifFamily: "DejaVu Sans" };
  return (svg) => new Resvg(svg, { font, fitTo: { mode: "zoom", value: 2 } }).render().asPng();
}
