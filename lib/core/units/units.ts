/** The units Knockwire reads and prints, each with the words people write for it. */
export type Unit = "V" | "Ohm" | "F" | "s" | "A" | "W" | "Hz";

export interface UnitWords {
  /** What is printed after the number. */
  symbol: string;
  /** Plural noun for sentences. */
  noun: string;
  /** Accepted spellings, lower case; Ω is normalised to `ohm` before the look-up. */
  words: readonly string[];
  /** SI prefixes that make sense for parts and signals of this kind. */
  prefixes: readonly Prefix[];
  /** Smallest mantissa printed before a smaller prefix is taken (0.6 V, but 600 Ω). */
  leastMantissa: number;
  example: string;
}

export type Prefix = "p" | "n" | "u" | "m" | "" | "k" | "M" | "G";

export const PREFIX_EXPONENT: Record<Prefix, number> = { p: -12, n: -9, u: -6, m: -3, "": 0, k: 3, M: 6, G: 9 };

export const UNITS: Record<Unit, UnitWords> = {
  V: { symbol: "V", noun: "volts", words: ["v", "volt", "volts"], prefixes: ["n", "u", "m", "", "k"], leastMantissa: 0.1, example: "4.5 V" },
  Ohm: { symbol: "Ω", noun: "ohms", words: ["ohm", "ohms", "r"], prefixes: ["u", "m", "", "k", "M", "G"], leastMantissa: 1, example: "4k7" },
  F: { symbol: "F", noun: "farads", words: ["f", "farad", "farads"], prefixes: ["p", "n", "u", "m", ""], leastMantissa: 1, example: "100 nF" },
  s: { symbol: "s", noun: "seconds", words: ["s", "sec", "secs", "second", "seconds"], prefixes: ["n", "u", "m", ""], leastMantissa: 1, example: "2.5 ms" },
  A: { symbol: "A", noun: "amperes", words: ["a", "amp", "amps", "ampere", "amperes"], prefixes: ["p", "n", "u", "m", ""], leastMantissa: 0.1, example: "20 mA" },
  W: { symbol: "W", noun: "watts", words: ["w", "watt", "watts"], prefixes: ["n", "u", "m", "", "k"], leastMantissa: 0.1, example: "250 mW" },
  Hz: { symbol: "Hz", noun: "hertz", words: ["hz", "hertz"], prefixes: ["m", "", "k", "M", "G"], leastMantissa: 1, example: "1.2 kHz" },
};
