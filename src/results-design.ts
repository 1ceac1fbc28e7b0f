/** Shape of a check with partial factors, beside the plain one. */
import type { DesignCheck } from "./mechanics/design-check.ts";

export interface DesignResult extends DesignCheck {
  /** The file that the factors came from, as it is shown. */
  readonly file: string;
  /** What the uncertain values stand at, before factors: mean, cautious, a file's name. */
  readonly at: string;
}
