/**
 * The best estimate on thirty walls beside what is known by other means. By hand, from the top folder:
 *
 *   npx esbuild tests/outside/wall-probabilities/battery.ts --bundle --platform=node --format=esm --packages=external \
 *     | node --input-type=module - 30 tests/outside/wall-probabilities/battery.json
 *
 * The first number is that of millions of plain samples for walls that fail once in 10 000 or more often.
 */
import { writeFileSync } from "node:fs";
import { bestEstimate } from "../../../src/reliability/best-estimate.ts";
import { subsetSimulation } from "../../../src/reliability/subset-simulation.ts";
import { countedFailures, sharpValue } from "./methods.ts";
import { modelOf, thirtyWalls } from "./walls.ts";

const millions = Number(process.argv[2]);
const target = process.argv[3];
const result: unknown[] = [];
for (const wall of thirtyWalls) {
  const model = modelOf(wall);
  const { states, space } = model;
  const { crossCheck, reason, doubts, intervalKind, ...best } = bestEstimate(states, space, {
    seed: "battery",
    precision: 0.05,
    samples: 1_000_000,
  });
  const sharp = sharpValue(model, 8);
  const failures = sharp.probability >= 1e-4 ? countedFailures(model, millions) : undefined;
  const subset =
    failures === undefined
      ? subsetSimulation(states, { seed: "known", precision: 0.03, samples: 4_000_000 })
      : undefined;
  result.push({
    wall,
    unknowns: space.unknowns.length,
    best: { ...best, agrees: crossCheck?.agrees, doubts },
    sharp,
    ...(failures === undefined ? {} : { counted: { samples: millions * 1e6, failures } }),
    ...(subset === undefined
      ? {}
      : {
          subset: {
            probability: subset.probability,
            standardError: subset.standardError,
            evaluations: subset.evaluations,
          },
        }),
  });
  writeFileSync(target, `${JSON.stringify(result, null, 2)}\n`);
  console.error(
    wall.kind,
    wall.heel,
    best.method,
    best.probability,
    best.standardError,
    sharp,
    failures,
    subset?.probability,
    subset?.standardError,
  );
}
