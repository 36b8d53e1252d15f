import { PREFIX_EXPONENT, UNITS, type Prefix, type Unit } from "./units";

export type Parsed<T> = { ok: true; value: T } | { ok: false; message: string };

/** A quantity and whether its text carried a prefix or a unit of its own. */
export interface QuantityParts {
  value: number;
  mantissa: string;
  prefix: Prefix;
  bare: boolean;
}

const LONGEST_TEXT = 64;

/**
 * Reads a quantity the way people write it and the way IEC 60062 codes it:
 * `4k7`, `2n2`, `R47`, `0.01 µF`, `0,1uF`, `2.5 ms`, `100R`, `-0.3 V`, `1e-9`.
 * @param text what was typed; both µ code points, `u`, Ω, `ohm` and `R` are understood.
 * @param unit what the figure must be; a text in another unit is refused.
 * @returns the value in SI, or one plain sentence that says what is wrong.
 * Source: IEC 60062 (the letter stands for the decimal point), from memory.
 */
export function parseQuantity(text: string, unit: Unit): Parsed<number> {
  const parts = parseQuantityParts(text, unit);
  return parts.ok ? { ok: true, value: parts.value.value } : parts;
}

/** As {@link parseQuantity}, and also says which prefix was written: `20–50k` lends its `k` to the 20. */
export function parseQuantityParts(text: string, unit: Unit): Parsed<QuantityParts> {
  const plain = normaliseText(text);
  if (plain === "") return refuse(`Write a value in ${UNITS[unit].noun}, for example ${UNITS[unit].example}.`);
  if (plain.length > LONGEST_TEXT) return refuse("That is too long to be a value.");
  if (/^[+-]?[1-9]\d{0,2},\d{3}(?!\d)/.test(plain)) {
    return refuse(`“${text.trim()}” could mean two values: write it without the comma, or with k.`);
  }
  const decimal = plain.includes(".") ? plain : plain.replace(",", ".");
  return readPlain(decimal, unit, text) ?? readCode(decimal, unit, text) ?? refuse(explain(decimal, unit, text));
}

/** One spelling for each sign that has several: µ, Ω, minus, odd spaces. */
export function normaliseText(text: string): string {
  return text
    .replace(/[\u00a0\u2000-\u200b\u202f\u205f\t]/g, " ")
    .replace(/[\u00b5\u03bc]/g, "u")
    .replace(/[\u03a9\u2126]/g, "ohm")
    .replace(/\u2212/g, "-")
    .trim();
}

const NUMBER = String.raw`([+-]?)(\d+\.?\d*|\.\d+)(e[+-]?\d{1,3})?`;
const PLAIN = new RegExp(`^${NUMBER}\\s*([a-z]*)$`, "i");
const CODE = /^([+-]?)(\d*)([a-z])(\d+)\s*([a-z]*)$/i;

function readPlain(text: string, unit: Unit, typed: string): Parsed<QuantityParts> | null {
  const match = PLAIN.exec(text);
  if (!match) return null;
  const [, sign = "", digits = "", exponent = "", tail = ""] = match;
  const prefix = prefixOf(tail, unit);
  if (prefix === null) return null;
  const mantissa = `${sign}${digits}${exponent}`;
  const bare = tail === "";
  if (unit === "F" && bare && Math.abs(Number(mantissa)) >= 1) {
    return refuse(`“${typed.trim()}” says no unit: write 100 nF, 1 µF and the like.`);
  }
  return finish(mantissa, prefix, bare, typed);
}

/** `4k7`, `R47`, `3V3`: the letter is the decimal point. */
function readCode(text: string, unit: Unit, typed: string): Parsed<QuantityParts> | null {
  const match = CODE.exec(text);
  if (!match) return null;
  const [, sign = "", whole = "", letter = "", fraction = "", tail = ""] = match;
  if (tail !== "" && !UNITS[unit].words.includes(tail.toLowerCase())) return null;
  const prefix = UNITS[unit].words.includes(letter.toLowerCase()) && letter.length === 1
    ? letterAsUnit(letter, unit)
    : prefixFromLetters(letter, unit);
  if (prefix === null) return null;
  return finish(`${sign}${whole === "" ? "0" : whole}.${fraction}`, prefix, false, typed);
}

function letterAsUnit(letter: string, unit: Unit): Prefix | null {
  return UNITS[unit].words.includes(letter.toLowerCase()) ? "" : null;
}

function finish(mantissa: string, prefix: Prefix, bare: boolean, typed: string): Parsed<QuantityParts> {
  const value = scaleDecimal(mantissa, PREFIX_EXPONENT[prefix]);
  if (!Number.isFinite(value)) return refuse(`“${typed.trim()}” is too large to be a value.`);
  return { ok: true, value: { value: value === 0 ? 0 : value, mantissa, prefix, bare } };
}

/** Decimal shift by text, so that `0.1 µ` is the double nearest to 1e-7 and not a rounded product. */
export function scaleDecimal(mantissa: string, exponent: number): number {
  const [digits = "0", written = "0"] = mantissa.toLowerCase().split("e");
  return Number(`${digits}e${Number(written) + exponent}`);
}

function prefixOf(tail: string, unit: Unit): Prefix | null {
  if (tail === "") return "";
  const lower = tail.toLowerCase();
  const words = UNITS[unit].words;
  if (words.includes(lower)) return "";
  const word = [...words].sort((a, b) => b.length - a.length).find((w) => lower.endsWith(w) && lower.length > w.length);
  if (word !== undefined) {
    const prefix = prefixFromLetters(tail.slice(0, -word.length), unit);
    if (prefix !== null) return prefix;
  }
  return prefixFromLetters(tail, unit);
}

function prefixFromLetters(letters: string, unit: Unit): Prefix | null {
  const folded = ({ K: "k", N: "n", P: "p", U: "u" } as Record<string, string>)[letters] ?? letters;
  const prefix = ["meg", "mega"].includes(folded.toLowerCase()) ? "M" : folded === "kilo" ? "k" : folded;
  return prefix !== "" && (UNITS[unit].prefixes as readonly string[]).includes(prefix) ? (prefix as Prefix) : null;
}

function explain(text: string, unit: Unit, typed: string): string {
  const other = (Object.keys(UNITS) as Unit[]).find((u) => u !== unit && /[a-z]$/i.test(text) && readPlain(text, u, typed)?.ok);
  const want = `${UNITS[unit].noun}, for example ${UNITS[unit].example}`;
  return other
    ? `“${typed.trim()}” reads as ${UNITS[other].noun}; this wants ${want}.`
    : `“${typed.trim()}” is not a value: write ${want}.`;
}

function refuse(message: string): { ok: false; message: string } {
  return { ok: false, message };
}
