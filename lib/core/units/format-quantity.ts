import { toRange, type Range, type Spread } from "./spread";
import { PREFIX_EXPONENT, UNITS, type Prefix, type Unit } from "./units";

const MINUS = "\u2212";
const SCALE: Record<Prefix, number> = { p: 1e-12, n: 1e-9, u: 1e-6, m: 1e-3, "": 1, k: 1e3, M: 1e6, G: 1e9 };

/**
 * A value with its unit and at most 3 significant figures, for people: `4.7 kΩ`, `0.6 V`, `2.62 ms`, `−0.5 V`.
 * @param figure SI, any size; volts under 0.1 µV print as 0 V. A value that is not finite prints as `—`.
 */
export function formatQuantity(figure: number, unit: Unit): string {
  if (!Number.isFinite(figure)) return "—";
  const value = orNothing(figure, unit);
  const prefix = prefixFor(value, unit);
  return `${significant(value, prefix)} ${symbol(prefix, unit)}`;
}

/** A range under one prefix: `4.2–4.8 V`, `−0.5 to 5.5 V`; one value where both ends print alike. */
export function formatRange(range: Range, unit: Unit): string {
  if (!Number.isFinite(range.min) || !Number.isFinite(range.max)) return "—";
  const [min, max] = [orNothing(range.min, unit), orNothing(range.max, unit)];
  const prefix = prefixFor(Math.max(Math.abs(min), Math.abs(max)), unit);
  const low = significant(min, prefix);
  const high = significant(max, prefix);
  if (low === high) return `${low} ${symbol(prefix, unit)}`;
  const between = low.startsWith(MINUS) || high.startsWith(MINUS) ? " to " : "–";
  return `${low}${between}${high} ${symbol(prefix, unit)}`;
}

/** A spread as it was meant: a value, a range, or a value with its tolerance (`10 kΩ ±5 %`). */
export function formatSpread(spread: Spread, unit: Unit): string {
  if (typeof spread === "number") return formatQuantity(spread, unit);
  if (!("nominal" in spread)) return formatRange(spread, unit);
  const percent = significant(spread.tol * 100, "");
  return `${formatQuantity(spread.nominal, unit)} ±${percent} %`;
}

/**
 * The text to put into an edit field: as short as the value allows, and read back by `parseSpread` to the very same numbers.
 * @throws RangeError when the spread is not one (see `toRange`).
 */
export function exactSpreadText(spread: Spread, unit: Unit): string {
  const range = toRange(spread);
  if (typeof spread === "number") return exactQuantityText(spread, unit);
  if ("nominal" in spread) return `${exactQuantityText(spread.nominal, unit)} ±${shiftDecimal(spread.tol, 2)}%`;
  return `${exactQuantityText(range.min, unit)}..${exactQuantityText(range.max, unit)}`;
}

/** As {@link exactSpreadText} for a single number. */
export function exactQuantityText(value: number, unit: Unit): string {
  const prefix = prefixFor(value, unit);
  const number = shiftDecimal(value, -PREFIX_EXPONENT[prefix]);
  return `${number} ${symbol(prefix, unit)}`;
}

/** Volts far under anything a bench can read are nothing: a level left over by a computation is not a figure. */
const LEAST_V = 1e-7;

function orNothing(value: number, unit: Unit): number {
  return unit === "V" && Math.abs(value) < LEAST_V ? 0 : value;
}

function symbol(prefix: Prefix, unit: Unit): string {
  return `${prefix === "u" ? "µ" : prefix}${UNITS[unit].symbol}`;
}

function prefixFor(value: number, unit: Unit): Prefix {
  const { prefixes, leastMantissa } = UNITS[unit];
  const size = Math.abs(value);
  if (size === 0) return "";
  let best: Prefix = prefixes[0] ?? "";
  for (const prefix of prefixes) {
    // 0.9995 rounds to 1.00 in three figures: 999.6 Ω prints as 1 kΩ.
    if (size / SCALE[prefix] >= 0.9995 * leastMantissa) best = prefix;
  }
  return best;
}

function significant(value: number, prefix: Prefix): string {
  const mantissa = Number((value / SCALE[prefix]).toPrecision(3));
  const text = Math.abs(mantissa) >= 1e6 || (mantissa !== 0 && Math.abs(mantissa) < 1e-4) ? mantissa.toExponential() : String(mantissa);
  return text.replace("-", MINUS);
}

/** value × 10^places, done on the decimal text so that no digit changes. */
function shiftDecimal(value: number, places: number): string {
  if (value === 0) return "0";
  const [digits = "0", exponent = "0"] = value.toExponential().split("e");
  const power = Number(exponent) + places;
  if (power < -6 || power > 20) return `${digits}e${power}`;
  const sign = digits.startsWith("-") ? "-" : "";
  const figures = digits.replace("-", "").replace(".", "");
  if (power < 0) return `${sign}0.${"0".repeat(-power - 1)}${figures}`;
  const whole = figures.slice(0, power + 1).padEnd(power + 1, "0");
  const rest = figures.slice(power + 1);
  return rest === "" ? `${sign}${whole}` : `${sign}${whole}.${rest}`;
}
