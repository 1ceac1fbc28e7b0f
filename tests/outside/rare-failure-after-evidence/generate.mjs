// Brute force: samples of the beliefs before the evidence, weighed by the likelihood of the results and by survival. No design point,
// no coordinates set anew, no importance sampling. After `npm run build`: node tests/outside/rare-failure-after-evidence/generate.mjs
import { readFileSync, writeFileSync } from "node:fs";
import { createSurvivalMargin } from "../../../dist/decision/after-survival.js";
import { knowledgeCurve } from "../../../dist/decision/knowledge-curve.js";
import { decisionModel } from "../../../dist/decision-model.js";
import { fillNormals } from "../../../dist/probability/streams.js";
import { readStudy } from "../../../dist/study/read-study.js";

const samples = Number(process.argv[2] ?? 60_000_000);
const [block, tile] = [16_384, 512];

function bruteForce(name) {
  const study = readStudy(readFileSync(new URL(`${name}.yaml`, import.meta.url), "utf8"));
  const { problem, results } = decisionModel({ ...study, decision: undefined });
  const { states } = problem.options[0];
  const margin = createSurvivalMargin(problem.survivals);
  const curves = results.map((result) => {
    const variable = problem.variables[result.variable];
    return { result, known: variable.known, curve: knowledgeCurve(variable) };
  });
  const z = problem.keys.map(() => new Float64Array(block));
  const factors = states.names.map(() => new Float64Array(tile));
  const [marks, least] = [new Uint8Array(tile), new Float64Array(tile)];
  let [all, allSquares, failing, failingSquares, failures, drawn] = [0, 0, 0, 0, 0, 0];
  for (let b = 0; drawn < samples; b++) {
    problem.keys.forEach((key, j) => {
      fillNormals("brute force", name, key, b, z[j], block);
    });
    for (let start = 0; start < block; start += tile) {
      const part = z.map((column) => column.subarray(start, start + tile));
      states.evaluate(part, tile, factors, marks, false);
      margin(part, tile, least, false);
      for (let i = 0; i < tile; i++) {
        if (problem.survivals.length > 0 && least[i] < 1) continue;
        let log = 0;
        for (const { result, known, curve } of curves) {
          const k = known.row.reduce((sum, weight, j) => sum + weight * part[j][i], known.offset);
          log -=
            (0.5 * (result.mean - curve.at(k)) ** 2) / (result.error ** 2 / result.tests + result.sharedError ** 2);
        }
        const weight = Math.exp(log);
        all += weight;
        allSquares += weight * weight;
        if (!factors.some((column) => column[i] < 1)) continue;
        failing += weight;
        failingSquares += weight * weight;
        failures++;
      }
    }
    drawn += block;
  }
  const probability = failing / all;
  const relative = Math.hypot(Math.sqrt(failingSquares) / failing, Math.sqrt(allSquares) / all);
  return [name, probability.toPrecision(5), (probability * relative).toPrecision(3), failures, drawn].join(",");
}

const rows = ["tests-alone", "survival-alone", "tests-and-survival"].map(bruteForce);
writeFileSync(
  new URL("cases.csv", import.meta.url),
  `study,probability,standard_error,failures,samples\n${rows.join("\n")}\n`,
);
