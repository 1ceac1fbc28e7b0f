import type { SheetLine } from "../results.ts";

export interface SheetBlock {
  readonly heading: string;
  readonly lines: readonly SheetLine[];
}

/**
 * The calculation sheet by heading. Where headings of one kind alternate ("Earth pressure, fill", "Earth pressure, sand", and the
 * first again), the lines of each are brought together: they lean on their own heading and on what stands before the kind.
 */
export function sheetBlocks(sheet: readonly SheetLine[]): readonly SheetBlock[] {
  const blocks: { heading: string; lines: SheetLine[] }[] = [];
  let kind = "";
  let start = 0;
  for (const line of sheet) {
    const kindOfLine = line.heading.split(/[,:]/, 1)[0];
    if (kindOfLine !== kind) {
      kind = kindOfLine;
      start = blocks.length;
    }
    const block = blocks.slice(start).find((candidate) => candidate.heading === line.heading);
    if (block === undefined) blocks.push({ heading: line.heading, lines: [line] });
    else block.lines.push(line);
  }
  return blocks;
}
