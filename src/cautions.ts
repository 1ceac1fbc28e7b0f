/** What every output carries, whatever it found. */
export const cautions: readonly string[] = [
  "This assesses the external stability of one wall section in plane strain. It does not design the reinforced concrete, and does not check settlement, freeze–thaw, scour, piping at the front, compaction pressure, clogging of drains, softening with time, tie-backs or construction stages.",
  "The probability is for one section: a long wall is likelier to fail somewhere along its length.",
  "It holds for the ground model, the spreads and the model uncertainty that were put in. Human error is not in it.",
  "Earth pressure at rest describes restrained walls, not a sliding one.",
  "Local codes and a licensed engineer decide. Where people can be hurt, a target set by the code or the authority governs.",
];
