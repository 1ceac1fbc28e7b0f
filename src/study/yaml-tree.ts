/**
 * Text of a study file -> a plain tree that remembers where everything stood.
 *
 * The text comes from anywhere, so the door is narrow: YAML 1.2 (JSON is a part of it), one document, at most 1 MB, little
 * nesting, few aliases, no tags, no merge keys, no key that reaches into JavaScript's own objects, no number that is not
 * finite. Everything wrong is collected.
 */
import {
  type Document,
  isAlias,
  isMap,
  isScalar,
  isSeq,
  LineCounter,
  type Node,
  type Pair,
  parseDocument,
  type YAMLError,
} from "yaml";
import type { Findings, Place, Places } from "./findings.ts";
import { isReservedKey } from "./paths.ts";

/** Longest text, in characters. */
export const longestText = 1_000_000;
/** Deepest nesting: the format itself needs about 12. */
export const deepestNesting = 40;
/** Most values, aliases followed. */
export const mostValues = 100_000;

export interface TextPlaces {
  readonly places: Places;
  /** Line and column of the character at an offset. */
  placeOfOffset(offset: number): Place;
  remember(path: string, part: "key" | "value", offset: number): void;
}

/** Places by offset; lines and columns are counted from 1. */
export function textPlaces(text: string): TextPlaces {
  const offsets = new Map<string, number>();
  const starts = [0];
  for (let i = text.indexOf("\n"); i >= 0; i = text.indexOf("\n", i + 1)) starts.push(i + 1);
  const placeOfOffset = (offset: number): Place => {
    let low = 0;
    let high = starts.length - 1;
    while (low < high) {
      const middle = (low + high + 1) >> 1;
      if (starts[middle]! <= offset) low = middle;
      else high = middle - 1;
    }
    return { line: low + 1, column: offset - starts[low]! + 1 };
  };
  return {
    placeOfOffset,
    places: (path, part) => {
      const offset = offsets.get(`${part} ${path}`);
      return offset === undefined ? undefined : placeOfOffset(offset);
    },
    remember: (path, part, offset) => offsets.set(`${part} ${path}`, offset),
  };
}

/** The tree of the text, or undefined where it cannot be read at all; what is wrong goes to the findings. */
export function readTree(text: string, at: TextPlaces, findings: Findings): unknown {
  at.remember("", "value", 0);
  const complaint = tooMuch(text);
  if (complaint !== undefined) {
    findings.problem("", complaint);
    return undefined;
  }
  const document = parseDocument(text, {
    version: "1.2",
    prettyErrors: false,
    uniqueKeys: false,
    lineCounter: new LineCounter(),
  });
  for (const error of document.errors) syntaxProblem(error, at, findings);
  for (const warning of document.warnings) tagProblem(warning, at, findings);
  if (document.directives?.yaml.explicit && document.directives.yaml.version !== "1.2") {
    findings.problem(
      "",
      `found a %YAML ${document.directives.yaml.version} directive; a study is YAML 1.2`,
      "leave the directive out",
    );
  }
  if (findings.problems.length > 0) return undefined;
  return convert(document, at, findings);
}

/** Nesting is judged before parsing, roughly, because a parser that recurses must not meet a hundred thousand brackets. */
function tooMuch(text: string): string | undefined {
  if (text.length > longestText) return `the file has ${text.length} characters; at most ${longestText} are read`;
  let depth = 0;
  let deepest = 0;
  for (let i = 0; i < text.length; i++) {
    const code = text.charCodeAt(i);
    if (code === 91 || code === 123) deepest = Math.max(deepest, ++depth);
    else if (code === 93 || code === 125) depth = Math.max(0, depth - 1);
  }
  const dashes = new RegExp(`(?:[-?:][ \\t]+){${deepestNesting + 1}}`);
  const indent = new RegExp(`^[ \\t]{${20 * deepestNesting},}`, "m");
  if (deepest > deepestNesting + 10 || dashes.test(text) || indent.test(text))
    return `is nested too deeply; at most ${deepestNesting} levels are read`;
  return undefined;
}

const syntaxHints: Readonly<Record<string, string>> = {
  TAB_AS_INDENT: "indent with spaces",
  MULTIPLE_DOCS: "keep one study in a file: take out the line ---",
  BLOCK_AS_IMPLICIT_KEY: 'put quotes around a text that holds ": "',
  MISSING_CHAR: "a quote or a bracket is not closed",
  BAD_INDENT: "check the brackets and the indentation just above",
};

/** Tags of what a study is made of; a text may carry one without harm. */
const plainTags = /^tag:yaml\.org,2002:(str|int|float|bool|null|map|seq)$/;
const tagHint = "take out the word after the !";

function syntaxProblem(error: YAMLError, at: TextPlaces, findings: Findings): void {
  const message =
    error.code === "MULTIPLE_DOCS" ? "the file holds more than one document" : `is not valid YAML: ${error.message}`;
  placed("", error.pos[0], message, syntaxHints[error.code], at, findings);
}

function tagProblem(warning: YAMLError, at: TextPlaces, findings: Findings): void {
  placed("", warning.pos[0], `${warning.message}; a study uses no tags`, tagHint, at, findings);
}

function placed(
  path: string,
  offset: number,
  message: string,
  hint: string | undefined,
  at: TextPlaces,
  findings: Findings,
): void {
  findings.placedProblem(at.placeOfOffset(offset), path, message, hint);
}

function convert(document: Document, at: TextPlaces, findings: Findings): unknown {
  let values = 0;
  const open = new Set<Node>();

  function walk(node: unknown, path: string, depth: number): unknown {
    if (++values > mostValues) {
      if (values === mostValues + 1) findings.problem("", `holds more than ${mostValues} values, aliases followed`);
      return null;
    }
    if (depth > deepestNesting) {
      findings.problem(path, `is nested too deeply; at most ${deepestNesting} levels are read`);
      return null;
    }
    const tag = isMap(node) || isSeq(node) || isScalar(node) ? node.tag : undefined;
    if (tag !== undefined && !plainTags.test(tag)) {
      placed(path, (node as Node).range?.[0] ?? 0, `found the tag ${tag}; a study uses no tags`, tagHint, at, findings);
      return null;
    }
    if (isAlias(node)) return follow(node.resolve(document), `*${node.source}`, node, path, depth);
    if (isMap(node)) return walkMap(node.items, node.range?.[0] ?? 0, path, depth);
    if (isSeq(node)) {
      remember(path, node.range?.[0]);
      return node.items.map((item, i) => walk(item, path === "" ? String(i) : `${path}.${i}`, depth + 1));
    }
    if (!isScalar(node)) return null;
    remember(path, node.range?.[0]);
    return scalar(node.value, node.source, path);
  }

  function remember(path: string, offset: number | undefined): void {
    if (offset !== undefined && path !== "") at.remember(path, "value", offset);
  }

  function follow(target: Node | undefined, name: string, alias: Node, path: string, depth: number): unknown {
    remember(path, alias.range?.[0]);
    if (target === undefined) findings.problem(path, `${name} names no anchor above it`);
    else if (open.has(target)) findings.problem(path, `${name} holds itself`);
    else {
      open.add(target);
      const value = walk(target, path, depth + 1);
      open.delete(target);
      return value;
    }
    return null;
  }

  function scalar(value: unknown, source: string | undefined, path: string): unknown {
    if (typeof value === "bigint" || (typeof value === "number" && !Number.isFinite(value))) {
      findings.problem(path, `${source ?? String(value)} is not a finite number`);
      return null;
    }
    return value === undefined || ["number", "string", "boolean"].includes(typeof value) ? (value ?? null) : null;
  }

  function walkMap(
    items: readonly Pair<unknown, unknown>[],
    offset: number,
    path: string,
    depth: number,
  ): Record<string, unknown> {
    remember(path, offset);
    const result: Record<string, unknown> = {};
    for (const item of items) {
      const name = isScalar(item.key) ? (item.key.source ?? String(item.key.value)) : undefined;
      const where = isScalar(item.key) || isMap(item.key) || isSeq(item.key) ? (item.key.range?.[0] ?? offset) : offset;
      const complaint = keyComplaint(name, result);
      if (complaint !== undefined) {
        placed(
          name === undefined || path === "" ? (name ?? path) : `${path}.${name}`,
          where,
          complaint.message,
          complaint.hint,
          at,
          findings,
        );
        continue;
      }
      const below = path === "" ? name! : `${path}.${name}`;
      at.remember(below, "key", where);
      at.remember(below, "value", where);
      result[name!] = walk(item.value, below, depth + 1);
    }
    return result;
  }

  return walk(document.contents, "", 0);
}

/** Why a key cannot stand in a mapping, if it cannot. */
export function keyComplaint(name: string | undefined, beside: object): { message: string; hint?: string } | undefined {
  if (name === undefined) return { message: "found a key that is not a single word", hint: "write key: value" };
  if (name === "<<")
    return {
      message: "merge keys (<<) are not part of YAML 1.2",
      hint: "write the keys out, or use an alias for a whole value",
    };
  if (isReservedKey(name)) return { message: `"${name}" cannot be a key`, hint: "choose another name" };
  if (Object.hasOwn(beside, name)) return { message: `"${name}" is given twice`, hint: "keep one of the two" };
  return undefined;
}
