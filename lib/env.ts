import { z } from "zod";

/** Every variable the product reads, checked once. A mistake is told as a sentence and stops the start. */
const envSchema = z.object({
  DATABASE_FILE: z.string().min(1).default("data/knockwire.sqlite"),
  NEXTAUTH_URL: z.url({ error: "NEXTAUTH_URL must be the address people open, such as https://rig.example." }).optional(),
  NEXTAUTH_SECRET: z.string().min(32, "NEXTAUTH_SECRET must be at least 32 characters of random text.").optional(),
  KNOCKWIRE_DEMO: z.enum(["yes", "no"], { error: "KNOCKWIRE_DEMO is yes or no." }).optional(),
  CALCULATOR_CALLS_PER_MINUTE: z.coerce.number().int().min(600, "CALCULATOR_CALLS_PER_MINUTE is 600 or more.").default(1200),
});

export type Env = z.infer<typeof envSchema> & { isDemo: boolean };

/**
 * Reads the configuration.
 * @throws Error with one line for each mistake.
 */
export function readEnv(source: Record<string, string | undefined> = process.env): Env {
  const parsed = envSchema.safeParse(source);
  if (!parsed.success) {
    throw new Error(`The configuration has mistakes:\n${parsed.error.issues.map((issue) => `- ${issue.message}`).join("\n")}`);
  }
  return { ...parsed.data, isDemo: parsed.data.KNOCKWIRE_DEMO === "yes" };
}

let cached: Env | undefined;

/** The configuration of this process. */
export function env(): Env {
  cached ??= readEnv();
  return cached;
}
