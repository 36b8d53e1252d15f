import { z } from "zod";
import { parseQuantity } from "@/lib/core/units/parse-quantity";
import { parseSpread } from "@/lib/core/units/parse-spread";
import { toRange, type Spread } from "@/lib/core/units/spread";

/** Units a figure can carry; every one is stored in SI without a prefix. */
export type FigureUnit = "V" | "Ohm" | "F" | "s" | "A";

interface Bounds {
  min: number;
  max: number;
  /** True: the lower bound itself is refused (a load of 0 Ω). */
  openMin?: boolean;
}

const BOUNDS: Record<FigureUnit, Bounds> = {
  V: { min: -10_000, max: 10_000 },
  Ohm: { min: 0, max: 1e15 },
  F: { min: 0, max: 1, openMin: true },
  s: { min: 0, max: 86_400 },
  A: { min: 0, max: 1_000 },
};

const unitWords: Record<FigureUnit, string> = { V: "volts", Ohm: "ohms", F: "farads", s: "seconds", A: "amperes" };

function boundsFault(low: number, high: number, unit: FigureUnit, bounds: Bounds): string | null {
  if (bounds.openMin ? low <= bounds.min : low < bounds.min) {
    return bounds.min === 0
      ? `This must be ${bounds.openMin ? "more than zero" : "zero or more"} (${unitWords[unit]}).`
      : `This must be ${bounds.min} ${unitWords[unit]} or more.`;
  }
  if (high > bounds.max) return `This must be ${bounds.max} ${unitWords[unit]} or less.`;
  return null;
}

/** One exact figure: an SI number, or text as people write it (`4k7`, `0.01 µF`). */
export function figure(unit: FigureUnit, limits: Partial<Bounds> = {}) {
  const bounds = { ...BOUNDS[unit], ...limits };
  return z
    .union([z.number(), z.string().max(60)], { error: `Give one number of ${unitWords[unit]}.` })
    .transform((value, ctx): number => {
      let number: number;
      if (typeof value === "number") number = value;
      else {
        const parsed = parseQuantity(value, unit);
        if (!parsed.ok) {
          ctx.issues.push({ code: "custom", message: parsed.message, input: value });
          return z.NEVER;
        }
        number = parsed.value;
      }
      const fault = boundsFault(number, number, unit, bounds);
      if (fault) {
        ctx.issues.push({ code: "custom", message: fault, input: value });
        return z.NEVER;
      }
      return number;
    });
}

/** A figure with its spread: a number, `{min, max}`, `{nominal, tol}`, or text (`20k–50k`, `10k ±5%`). */
export function spread(unit: FigureUnit, limits: Partial<Bounds> = {}) {
  const bounds = { ...BOUNDS[unit], ...limits };
  return z
    .union(
      [
        z.number(),
        z.strictObject({ min: z.number(), max: z.number() }),
        z.strictObject({ nominal: z.number(), tol: z.number() }),
        z.string().max(60),
      ],
      { error: `Give a number of ${unitWords[unit]}, both ends of a range, or a nominal value with its tolerance.` },
    )
    .transform((value, ctx): Spread => {
      let parsedSpread: Spread;
      if (typeof value === "string") {
        const parsed = parseSpread(value, unit);
        if (!parsed.ok) {
          ctx.issues.push({ code: "custom", message: parsed.message, input: value });
          return z.NEVER;
        }
        parsedSpread = parsed.value;
      } else parsedSpread = value;
      try {
        const range = toRange(parsedSpread);
        const fault = boundsFault(range.min, range.max, unit, bounds);
        if (fault) throw new RangeError(fault);
      } catch (cause) {
        const message = cause instanceof RangeError ? sentence(cause.message) : "Not a figure.";
        ctx.issues.push({ code: "custom", message, input: value });
        return z.NEVER;
      }
      return parsedSpread;
    });
}

function sentence(text: string): string {
  const first = text.charAt(0).toUpperCase() + text.slice(1);
  return /[.!?]$/.test(first) ? first : `${first}.`;
}

/** In a form an empty box means "not known"; the API may say null. */
export function orUnknown<S extends z.ZodType>(schema: S) {
  return z.preprocess((value) => (value === undefined || isBlank(value) ? null : value), schema.nullable());
}

const isBlank = (value: unknown): boolean => typeof value === "string" && value.trim() === "";

/** A level in dBu: a number, or text such as `+22`, `−10 dBu`. */
export function level() {
  const refusal = "Write a level in dBu between −60 and 60, for example 22.";
  return z
    .union([z.number(), z.string().max(60)], { error: refusal })
    .transform((value, ctx): number => {
      const text = typeof value === "string" ? value.trim().replace("\u2212", "-").replace(/\s*dBu$/i, "") : value;
      const number = typeof text === "string" && text === "" ? Number.NaN : Number(text);
      if (Number.isFinite(number) && number >= -60 && number <= 60) return number;
      ctx.issues.push({ code: "custom", message: refusal, input: value });
      return z.NEVER;
    });
}

/** Limits of which either side may be absent, as for a wanted pulse length. */
export function limits(unit: FigureUnit) {
  return z.strictObject({ min: figure(unit).optional(), max: figure(unit).optional() });
}
