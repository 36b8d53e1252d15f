import nextCoreWebVitals from "eslint-config-next/core-web-vitals";
import nextTypescript from "eslint-config-next/typescript";

/** Which room may import which; everything not listed as allowed from a room is refused. */
const rooms = [
  { target: "./lib/core", from: "./", except: ["./lib/core", "./node_modules"], message: "lib/core is pure: it imports lib/core alone." },
  { target: "./lib/core/units", from: "./lib/core", except: ["./units"], message: "units imports nothing." },
  { target: "./lib/core/chart", from: "./lib/core", except: ["./chart"], message: "chart imports nothing." },
  { target: "./lib/core/electrics", from: "./lib/core", except: ["./electrics", "./units"], message: "electrics imports units." },
  { target: "./lib/core/planning", from: "./lib/core", except: ["./planning", "./units"], message: "planning imports units." },
  { target: "./lib/schemas", from: "./", except: ["./lib/schemas", "./lib/core", "./node_modules"], message: "schemas import core." },
  { target: "./lib/rights", from: "./", except: ["./lib/rights", "./lib/schemas", "./node_modules"], message: "rights are pure predicates over schemas." },
  { target: "./components", from: "./models", message: "Only lib/data imports models." },
  { target: "./components", from: "./lib", except: ["./core", "./schemas", "./rights", "./client", "./paths.ts"], message: "components import core, schemas, rights, client and paths." },
  { target: "./components/ui", from: "./components", except: ["./ui"], message: "ui knows no domain word." },
  { target: "./components/ui", from: "./lib", message: "ui knows no domain word." },
  { target: "./components", from: "./app", message: "Nothing imports upward." },
  { target: "./lib", from: "./app", message: "Nothing imports upward." },
  { target: "./lib", from: "./components", message: "Nothing imports upward." },
  { target: "./app", from: "./models", message: "Only lib/data imports models." },
  { target: "./lib/paper", from: "./models", message: "Only lib/data imports models." },
];

const config = [
  { ignores: [".next/**", "node_modules/**", "next-env.d.ts", "data/**", "test-results/**", "playwright-report/**"] },
  ...nextCoreWebVitals,
  ...nextTypescript,
  {
    settings: { react: { version: "19.3" } },
    rules: {
      "import/no-restricted-paths": ["error", { zones: rooms }],
      "import/no-cycle": ["error", { ignoreExternal: true }],
      "@typescript-eslint/no-explicit-any": "error",
      "@typescript-eslint/consistent-type-imports": ["error", { fixStyle: "inline-type-imports", prefer: "type-imports" }],
      "@typescript-eslint/no-unused-vars": ["error", { argsIgnorePattern: "^_", varsIgnorePattern: "^_", ignoreRestSiblings: true }],
      eqeqeq: "error",
    },
  },
];

export default config;
