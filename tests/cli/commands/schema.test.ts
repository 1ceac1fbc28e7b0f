import { expect, test } from "vitest";
import { studyJsonSchema } from "../../../src/study/json-schema.ts";
import { studyReference } from "../../../src/study/reference.ts";
import { jsonOf, runWith } from "../fake-io.ts";

test("toehold schema prints the JSON Schema of the study file", async () => {
  expect(await jsonOf(["schema"])).toEqual(JSON.parse(JSON.stringify(studyJsonSchema())));
});

test("toehold schema --reference prints the page of all keys, and not as JSON", async () => {
  expect(await runWith(["schema", "--reference"])).toEqual({ code: 0, out: `${studyReference()}\n`, err: "" });
  const both = await runWith(["schema", "--reference", "--json"]);
  expect(both).toMatchObject({ code: 2, out: "" });
  expect(both.err).toContain("give one of the two");
});
