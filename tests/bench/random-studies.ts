/**
 * Random studies over the whole range of the schema: counts those whose evaluation holds a NaN, an infinity or a factor
 * outside 0 to 1000, those that reading refuses, and the marks. Seeded by the number of the study. From the top folder:
 *
 *   npx esbuild tests/bench/random-studies.ts --bundle --platform=node --format=esm --packages=external \
 *     | node --input-type=module - 100000
 */
import { StudyError } from "../../src/errors.ts";
import { evaluateWall } from "../mechanics/evaluate-wall.ts";
import { randomStudy } from "../mechanics/random-study.ts";
import { unsound } from "../mechanics/unsound.ts";

const count = Number(process.argv[2] ?? 100_000);
const marks = new Map<string, number>();
const refusals: number[] = [];
const findings: string[] = [];
for (let seed = 0; seed < count; seed++) {
  const tree = randomStudy(seed, "wide");
  try {
    const result = evaluateWall(tree);
    const wrong = unsound(result);
    if (wrong.length > 0) findings.push(`study ${seed}: ${wrong.slice(0, 5).join(", ")}`);
    for (const word of result.marks) marks.set(word, (marks.get(word) ?? 0) + 1);
  } catch (error) {
    if (error instanceof StudyError) refusals.push(seed);
    else findings.push(`study ${seed}: ${error}`);
  }
}
console.log(`${count} random studies, ${refusals.length} refused by reading, ${findings.length} unsound`);
console.log([...marks].map(([word, times]) => `${word} ${times}`).join(", "));
for (const line of findings.slice(0, 20)) console.log(line);
if (refusals.length > 0) console.log(`refused: ${refusals.slice(0, 10).join(", ")}`);
process.exitCode = findings.length > 0 ? 1 : 0;
