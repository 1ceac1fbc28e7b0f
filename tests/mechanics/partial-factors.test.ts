import { expect, test } from "vitest";
import { readPartialFactors, unfactored } from "../../src/mechanics/partial-factors.ts";

test("factors are read by group; what is left out is 1", () => {
  const text = "actions: { permanent_unfavourable: 1.35, variable: 1.5 }\nstrength: { tan_friction_angle: 1.25 }\n";
  expect(readPartialFactors(text)).toEqual({
    actions: { permanentUnfavourable: 1.35, permanentFavourable: 1, variable: 1.5 },
    strength: { tanFrictionAngle: 1.25, cohesion: 1, undrainedStrength: 1, unitWeight: 1 },
    resistance: { sliding: 1, bearing: 1, passive: 1 },
  });
});

test("an empty file, and empty groups, leave everything unfactored", () => {
  expect(readPartialFactors("# none yet\n")).toEqual(unfactored);
  expect(readPartialFactors("actions:\nresistance:\n")).toEqual(unfactored);
});

test.each([
  ["action: { variable: 1.5 }", 'f.yaml:1:1 action: unknown key "action"\n  hint: did you mean "actions"?'],
  [
    "strength: { friction_angle: 1.25 }",
    'f.yaml:1:13 strength.friction_angle: unknown key "friction_angle"\n  hint: did you mean "tan_friction_angle"?',
  ],
  [
    "resistance: { overturning: 1.1 }",
    'f.yaml:1:15 resistance.overturning: unknown key "overturning"\n  hint: known here: sliding, bearing, passive',
  ],
  ["strength: { cohesion: 0 }", "f.yaml:1:23 strength.cohesion: 0 is outside 0.1 to 10"],
  ["actions: { variable: 15 }", "f.yaml:1:22 actions.variable: 15 is outside 0 to 10"],
  ["resistance: { sliding: yes please }", 'f.yaml:1:24 resistance.sliding: found "yes please"; a number is needed'],
  [
    "strength: 1.25",
    "f.yaml:1:11 strength: found 1.25; a group of factors is needed\n  hint: known here: tan_friction_angle, cohesion, undrained_strength, unit_weight",
  ],
  [
    "- 1.35",
    "f.yaml:1:1 found a list of 1; groups of factors are needed\n  hint: known here: actions, strength, resistance",
  ],
])("%s is refused", (text, message) => {
  expect(() => readPartialFactors(text, "f.yaml")).toThrow(expect.objectContaining({ message }));
});

test("everything wrong is reported at once", () => {
  const text = "actions: { variabel: 1.5 }\nresistance: { sliding: 0 }\n";
  expect(() => readPartialFactors(text)).toThrow(/variabel[\s\S]*resistance\.sliding/);
});
