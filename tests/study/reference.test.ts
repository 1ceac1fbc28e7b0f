import { expect, test } from "vitest";
import { distributionKinds } from "../../src/study/distribution-keys.ts";
import { fields } from "../../src/study/fields.ts";
import { studyReference } from "../../src/study/reference.ts";

const page = studyReference();

test("the reference lists every numeric field with its unit and its default", () => {
  for (const { pattern, default: fallback } of fields) {
    const line = page.split("\n").find((one) => one.startsWith(`| \`${pattern}\` |`));
    expect(line, pattern).toBeDefined();
    if (fallback !== undefined) expect(line).toContain(`| \`${fallback}\` |`);
  }
  expect(page).toContain(
    "| `wall.base.heel` | Length of the base slab behind the stem. Unit: m (us: ft). Range: 0 to 100 m | m (us: ft) |  | `2.4` |",
  );
});

test("the reference lists every other key, every distribution and what may stand beside it, each once", () => {
  for (const key of [
    "title",
    "model.bearing",
    "assessment.limit_states",
    "assessment.target.named",
    "correlations.*.between",
    "evidence.*.survived",
    "decision.options.*.change",
    "decision.failure_cost.sliding",
    "decision.investigations.*.informs.*.path",
    "scatter.inherent",
    "yearly",
    "mixture.*.share",
    "as",
    "averaging",
    "normal.cov",
  ]) {
    expect(
      page.split("\n").filter((line) => line.startsWith(`| \`${key}\` |`)),
      key,
    ).toHaveLength(1);
  }
  for (const kind of distributionKinds) expect(page).toContain(`\`${kind}`);
});

test("every row of a table has its five cells", () => {
  const rows = page.split("\n").filter((line) => line.startsWith("|"));
  expect(rows.length).toBeGreaterThan(120);
  for (const line of rows) expect(line.replaceAll("\\|", "").split("|"), line).toHaveLength(7);
});
