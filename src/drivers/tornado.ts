import type { JointSpace } from "../probability/marginal.ts";
import type { LimitStates } from "../reliability/limit-states.ts";
import { factorsAt, oneAtATime } from "../reliability/second-moment.ts";
import type { TornadoBar } from "../results.ts";

/**
 * Factor of safety with one variable at its 5 and 95 % fractile and the others at their means, the widest bar first.
 *
 * @returns one list per limit state
 */
export function tornado(states: LimitStates, space: JointSpace): readonly (readonly TornadoBar[])[] {
  const points = oneAtATime(space, (place) => {
    const { marginal } = space.unknowns[place];
    return [marginal.quantile(0.05), marginal.upperQuantile(0.05)];
  });
  const rows = factorsAt(states, points);
  return states.names.map((_, k) => {
    const bars = space.unknowns.map(({ path }, place) => ({
      path,
      factorAt5: rows[1 + 2 * place][k],
      factorAt95: rows[2 + 2 * place][k],
    }));
    return bars.sort((a, b) => width(b) - width(a));
  });
}

const width = (bar: TornadoBar): number => Math.abs(bar.factorAt95 - bar.factorAt5);
