import type { Config } from "tailwindcss";
import plugin from "tailwindcss/plugin";

/** Every colour of the product. `bench` is the light theme, `floor` the dark one; nothing else holds a raw colour. */
export const bench = {
  floor: "#e6e9ea",
  bench: "#f6f8f8",
  raised: "#ffffff",
  tape: "#ffffff",
  "tape-edge": "#737c82",
  "tape-ink": "#0d0e0f",
  ink: "#15181a",
  "ink-soft": "#4a5157",
  line: "#737c82",
  "line-soft": "#c6cccf",
  mark: "#d4f53c",
  "mark-ink": "#15181a",
  "verdict-good": "#1c6237",
  "verdict-tight": "#635400",
  "verdict-unproven": "#48535c",
  "verdict-brief": "#7d4600",
  "verdict-long": "#7d4600",
  "verdict-weak": "#8c3a00",
  "verdict-dead": "#86291c",
  "verdict-stuck": "#742655",
  "verdict-wrong-kind": "#523788",
  "verdict-reversed": "#523788",
  "verdict-overload": "#96194a",
  "verdict-clash": "#a0101b",
  "verdict-hot": "#a80000",
} as const;

export const floor: Record<keyof typeof bench, string> = {
  floor: "#17191b",
  bench: "#202326",
  raised: "#2a2e31",
  tape: "#f3f4f1",
  "tape-edge": "#c9cdca",
  "tape-ink": "#0d0e0f",
  ink: "#f1f3f2",
  "ink-soft": "#b9c0c4",
  line: "#8b949a",
  "line-soft": "#464d52",
  mark: "#d4f53c",
  "mark-ink": "#15181a",
  "verdict-good": "#7fd49b",
  "verdict-tight": "#e3cc5c",
  "verdict-unproven": "#b7c2cb",
  "verdict-brief": "#f0b266",
  "verdict-long": "#f0b266",
  "verdict-weak": "#f79c66",
  "verdict-dead": "#f5927f",
  "verdict-stuck": "#e79acb",
  "verdict-wrong-kind": "#bfa8f2",
  "verdict-reversed": "#bfa8f2",
  "verdict-overload": "#f590b4",
  "verdict-clash": "#ff8d8d",
  "verdict-hot": "#ff8a80",
};

const asVariables = (tokens: Record<string, string>) => Object.fromEntries(Object.entries(tokens).map(([name, value]) => [`--${name}`, value]));
const asColours = Object.fromEntries(Object.keys(bench).map((name) => [name, `var(--${name})`]));

const config: Config = {
  content: ["./app/**/*.{ts,tsx}", "./components/**/*.{ts,tsx}"],
  theme: {
    extend: {
      colors: asColours,
      fontFamily: {
        sans: ["var(--font-text)", "sans-serif"],
        mono: ["var(--font-figures)", "monospace"],
        tape: ["var(--font-tape)", "sans-serif"],
      },
    },
  },
  plugins: [
    plugin(({ addBase }) => {
      addBase({
        ":root": { ...asVariables(bench), "color-scheme": "light" },
        "@media (prefers-color-scheme: dark)": { ":root:not([data-theme='bench'])": { ...asVariables(floor), "color-scheme": "dark" } },
        ":root[data-theme='floor']": { ...asVariables(floor), "color-scheme": "dark" },
        "@media print": { ":root, :root:not([data-theme='bench'])": { ...asVariables(bench), "--floor": "#ffffff", "--bench": "#ffffff", "color-scheme": "light" } },
      });
    }),
  ],
};

export default config;
