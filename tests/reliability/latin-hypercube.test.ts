import { latinHypercube } from "../../src/reliability/latin-hypercube.ts";
import { samplingLaws } from "./sampling-laws.ts";

samplingLaws("latin_hypercube", latinHypercube);
