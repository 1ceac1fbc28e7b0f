import { directionalSampling } from "../../src/reliability/directional.ts";
import { samplingLaws } from "./sampling-laws.ts";

samplingLaws("directional", directionalSampling);
