import { expect, test } from "vitest";
import { studyJsonSchema } from "../../../src/study/json-schema.ts";
import { jsonOf } from "../fake-io.ts";

test("toehold schema prints the JSON Schema of the study file", async () => {
  expect(await jsonOf(["schema"])).toEqual(JSON.parse(JSON.stringify(studyJsonSchema())));
});
