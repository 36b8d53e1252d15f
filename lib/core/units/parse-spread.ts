import { normaliseText, parseQuantityParts, scaleDecimal, type Parsed, type QuantityParts } from "./parse-quantity";
import type { Spread } from "./spread";
import { PREFIX_EXPONENT, type Unit } from "./units";

const TOLERANCE = /^(.*?)\s*(?:±|\+\s*\/\s*-|\+-)\s*(.+)$/;
const PERCENT = /^((?:\d+\.?\d*|\.\d+)(?:e[+-]?\d{1,3})?)\s*%$/i;
const LONGEST_TEXT = 160;
const RANGE_WORD = /^(.*?[^.])\s*(?:\.{2,3}|…|–|—|~|\bto\b)\s*(.+)$/i;

/**
 * Reads a value that may be spread: `47k`, `20k–50k`, `20–50 kΩ`, `20k..50k`,
 * `20k-50k`, `9 to 12 V`, `10k ±5%`, `10k +/-5%`, `9 V ±0.5 V`.
 * @param unit what both sides must be.
 * @returns the spread in SI, or a plain sentence: upside-down ranges, one side alone and tolerances of 100 % or more are refused.
 */
export function parseSpread(text: string, unit: Unit): Parsed<Spread> {
  const plain = normaliseText(text);
  if (plain.length > LONGEST_TEXT) return { ok: false, message: "That is too long to be a value." };
  const toleranced = TOLERANCE.exec(plain);
  if (toleranced) return readToleranced(toleranced[1] ?? "", toleranced[2] ?? "", unit);
  const worded = RANGE_WORD.exec(plain);
  if (worded) return readRange(worded[1] ?? "", worded[2] ?? "", unit);
  for (const [left, right] of hyphenSplits(plain)) {
    const range = readRange(left, right, unit);
    if (range.ok || bothRead(left, right, unit)) return range;
  }
  const single = parseQuantityParts(text, unit);
  return single.ok ? { ok: true, value: single.value.value } : single;
}

function readToleranced(left: string, right: string, unit: Unit): Parsed<Spread> {
  const nominal = parseQuantityParts(left, unit);
  if (!nominal.ok) return nominal;
  const percent = PERCENT.exec(right.replace(",", ".").trim());
  if (percent) {
    const tol = scaleDecimal(percent[1] ?? "", -2);
    if (!(tol < 1)) return { ok: false, message: "A tolerance must be under 100 %." };
    return { ok: true, value: { nominal: nominal.value.value, tol } };
  }
  const half = parseQuantityParts(right, unit);
  if (!half.ok) return { ok: false, message: `After ± write a percentage or a value: ${half.message}` };
  const width = half.value.bare ? scaleDecimal(half.value.mantissa, PREFIX_EXPONENT[nominal.value.prefix]) : half.value.value;
  if (width < 0) return { ok: false, message: "After ± write a positive value." };
  return { ok: true, value: { min: nominal.value.value - width, max: nominal.value.value + width } };
}

function readRange(left: string, right: string, unit: Unit): Parsed<Spread> {
  const high = parseQuantityParts(right, unit);
  if (!high.ok) return high;
  // The right side's prefix is lent to a bare left side before it is judged alone: `1–10 µF`.
  const lent = lend(left, right, unit, high.value);
  const low = lent !== null ? null : parseQuantityParts(left, unit);
  if (low && !low.ok) return low;
  const min = lent ?? (low?.ok ? low.value.value : 0);
  const max = high.value.value;
  if (min > max) return { ok: false, message: "The first value of a range must not be above the second." };
  return { ok: true, value: { min, max } };
}

function lend(left: string, right: string, unit: Unit, high: QuantityParts): number | null {
  if (high.bare) return null;
  const suffix = /[a-z]*$/i.exec(right.trim())?.[0] ?? "";
  const bare = parseQuantityParts(`${left.trim()}${suffix}`, unit);
  if (!/\d\.?$/.test(left.trim()) || /[a-df-z]/i.test(left) || !bare.ok) return null;
  return bare.value.value <= high.value ? bare.value.value : null;
}

function bothRead(left: string, right: string, unit: Unit): boolean {
  return parseQuantityParts(left, unit).ok && parseQuantityParts(right, unit).ok;
}

/** Every way to read a hyphen as “to”: not the leading minus, not an exponent's. */
function hyphenSplits(text: string): [string, string][] {
  const splits: [string, string][] = [];
  for (let i = 1; i < text.length - 1 && splits.length < 8; i += 1) {
    if (text[i] === "-" && !/e$/i.test(text.slice(0, i).trimEnd())) splits.push([text.slice(0, i), text.slice(i + 1)]);
  }
  return splits;
}
