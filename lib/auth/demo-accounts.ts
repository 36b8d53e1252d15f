import { env } from "@/lib/env";

export interface DemoAccount {
  email: string;
  password: string;
  role: string;
}

export const DEMO_PASSWORD = "two-tea-trolleys";

/** The accounts a local demo run offers on its sign-in page; none in any other run. */
export function demoAccounts(): DemoAccount[] {
  if (!env().isDemo) return [];
  return [
    { email: "performer@marrowlane.example", password: DEMO_PASSWORD, role: "Performer (owns the rig)" },
    { email: "collaborator@marrowlane.example", password: DEMO_PASSWORD, role: "Collaborator (builds and measures)" },
    { email: "sound@marrowlane.example", password: DEMO_PASSWORD, role: "Sound helper (prints and line-checks)" },
  ];
}
