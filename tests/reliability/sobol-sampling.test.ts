import { sobolSampling } from "../../src/reliability/sobol-sampling.ts";
import { samplingLaws } from "./sampling-laws.ts";

samplingLaws("sobol", sobolSampling);
