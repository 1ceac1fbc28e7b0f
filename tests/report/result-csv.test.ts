import { describe, expect, test } from "vitest";
import { csvText, driversCsv, variablesCsv } from "../../src/report/result-csv.ts";
import { handMade } from "./hand-made.ts";

describe("tables for a spreadsheet", () => {
  test("fields are quoted where they must be, and what is missing is empty", () => {
    expect(csvText([["a,b", 'say "x"', 1.5, null, undefined, Number.NaN]])).toBe('"a,b","say ""x""",1.5,,,\r\n');
  });

  test("a text is never taken for a formula", () => {
    expect(csvText([["=1+1", "@x", "-2", -2]])).toBe("'=1+1,'@x,'-2,-2\r\n");
  });

  test("variables stand in SI units, one row each", () => {
    const lines = variablesCsv(handMade.assess).trimEnd().split("\r\n");
    expect(lines[0]).toBe("path,label,unit,distribution,mean,sd,fractile_5,fractile_95,knowledge,yearly,source");
    expect(lines).toHaveLength(3);
    expect(lines[1]).toMatch(/^soils\.sand\.friction_angle,Friction angle of Medium sand,°,normal,32,2\.5,/);
  });

  test("drivers stand by limit state, with those of the system last", () => {
    const lines = driversCsv(handMade.assess).trimEnd().split("\r\n");
    expect(lines).toHaveLength(1 + 2 * 4);
    expect(lines[1]).toBe("sliding,soils.sand.friction_angle,0.62,low,0.7,-1.4,28.5,1.4,2.4");
    expect(lines.at(-1)).toBe("system,water.behind.level,,high,1,1.2,2.6,,");
  });
});
