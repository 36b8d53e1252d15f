import type { Spread } from "@/lib/core/units/spread";
import type { Connection } from "./connection-types";
import type { Input, Output } from "./jacks";

/** A broken precondition, named by its path from the connection's root. */
export interface Issue {
  path: (string | number)[];
  message: string;
}

/** Bounds inside which no sum or product overflows; every real bench figure lies far inside. */
const MOST: Record<Kind, number> = { volt: 1e9, ohm: 1e18, second: 1e9, ampere: 1e9 };
const LEAST_OHM = 1e-12;

type Kind = "volt" | "ohm" | "second" | "ampere";
type Path = (string | number)[];

/**
 * Names every figure of a connection that cannot be meant: upside-down or one-sided ranges, tolerances outside 0…1,
 * loads of 0 Ω or less, negative times, resistances and currents, numbers that are not finite or beyond any bench.
 * @param connection outputs may be partial; absent figures are no issue.
 * @returns an empty list where `checkConnection` may be called.
 */
export function findConnectionIssues(connection: Connection): Issue[] {
  return [
    ...connection.outputs.flatMap((output, i) => findOutputIssues(output, ["outputs", i])),
    ...connection.inputs.flatMap((input, i) => findInputIssues(input, ["inputs", i])),
  ];
}

/** As {@link findConnectionIssues} for one output jack. */
export function findOutputIssues(output: Partial<Output>, at: Path = []): Issue[] {
  return [
    ...spread(output.restV, "volt", [...at, "restV"]),
    ...spread(output.activeV, "volt", [...at, "activeV"]),
    ...spread(output.sourceOhm, "ohm", [...at, "sourceOhm"]),
    ...spread(output.pulseS, "second", [...at, "pulseS"]),
    ...spread(output.decayS, "second", [...at, "decayS"]),
    ...spread(output.limitA, "ampere", [...at, "limitA"]),
  ];
}

/** As {@link findConnectionIssues} for one input jack. */
export function findInputIssues(input: Omit<Input, "id">, at: Path = []): Issue[] {
  const { clamp } = input;
  const issues = [
    ...spread(input.onV, "volt", [...at, "onV"]),
    ...spread(input.offV, "volt", [...at, "offV"]),
    ...spread(input.safeV, "volt", [...at, "safeV"]),
    ...spread(input.loadOhm ?? undefined, "ohm", [...at, "loadOhm"], true),
    ...spread(input.biasV, "volt", [...at, "biasV"]),
    ...limits(input.pulseS, [...at, "pulseS"]),
    ...limits(input.decayS, [...at, "decayS"]),
  ];
  if (input.maxDbu !== undefined && !(Math.abs(input.maxDbu) <= 200)) {
    issues.push({ path: [...at, "maxDbu"], message: "Must be a level between −200 and 200 dBu." });
  }
  if (!clamp) return issues;
  const inClamp = [
    ...spread(clamp.lowV, "volt", [...at, "clamp", "lowV"]),
    ...spread(clamp.highV, "volt", [...at, "clamp", "highV"]),
    ...spread(clamp.seriesOhm, "ohm", [...at, "clamp", "seriesOhm"]),
    ...number(clamp.maxA, "ampere", [...at, "clamp", "maxA"]),
  ];
  if (inClamp.length === 0 && low(clamp.lowV) > high(clamp.highV)) {
    inClamp.push({ path: [...at, "clamp", "lowV"], message: "The lower clamp must not lie above the upper one." });
  }
  return [...issues, ...inClamp];
}

function spread(value: Spread | undefined, kind: Kind, path: Path, aboveZero = false): Issue[] {
  if (value === undefined) return [];
  if (typeof value === "number") return number(value, kind, path, aboveZero);
  if (value === null || typeof value !== "object") return [{ path, message: "Must be a number, a range or a value with a tolerance." }];
  if ("nominal" in value) {
    const inTol = value.tol >= 0 && value.tol < 1 ? [] : [{ path: [...path, "tol"], message: "A tolerance must be at least 0 and under 1 (under 100 %)." }];
    return [...number(value.nominal, kind, [...path, "nominal"], aboveZero), ...inTol];
  }
  const sides = (["min", "max"] as const).flatMap((side) =>
    value[side] === undefined || value[side] === null
      ? [{ path: [...path, side], message: "A range needs both its ends." }]
      : number(value[side], kind, [...path, side], aboveZero));
  if (sides.length === 0 && value.min > value.max) return [{ path, message: "The range is upside down: min must not be above max." }];
  return sides;
}

function limits(value: { min?: number; max?: number } | undefined, path: Path): Issue[] {
  if (value === undefined) return [];
  const issues = (["min", "max"] as const).flatMap((side) =>
    value[side] === undefined ? [] : number(value[side], "second", [...path, side]));
  if (issues.length === 0 && value.min !== undefined && value.max !== undefined && value.min > value.max) {
    return [{ path, message: "The limits are upside down: min must not be above max." }];
  }
  return issues;
}

function number(value: number, kind: Kind, path: Path, aboveZero = false): Issue[] {
  if (typeof value !== "number" || !Number.isFinite(value)) return [{ path, message: "Must be a finite number." }];
  if (Math.abs(value) > MOST[kind]) return [{ path, message: `Is beyond anything on a bench (at most ${MOST[kind].toExponential()}).` }];
  if (kind === "volt") return [];
  if (aboveZero && value <= 0) return [{ path, message: "Must be above 0 (null for an open input)." }];
  if (value < 0) return [{ path, message: "Must not be negative." }];
  if (kind === "ohm" && value !== 0 && value < LEAST_OHM) return [{ path, message: `Is below anything on a bench (at least ${LEAST_OHM.toExponential()}, or 0 where ideal).` }];
  return [];
}

function low(value: Spread): number {
  return typeof value === "number" ? value : "nominal" in value ? value.nominal - Math.abs(value.nominal) * value.tol : value.min;
}

function high(value: Spread): number {
  return typeof value === "number" ? value : "nominal" in value ? value.nominal + Math.abs(value.nominal) * value.tol : value.max;
}
