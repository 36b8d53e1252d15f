import { inject } from "vitest";

const url = inject("url");

/** Somebody talking to the server: keeps cookies as a browser would. */
export class Client {
  private readonly cookies = new Map<string, string>();

  async request(method: string, path: string, body?: unknown, headers: Record<string, string> = {}): Promise<Response> {
    const response = await fetch(new URL(path, url), {
      method,
      redirect: "manual",
      headers: {
        ...(body === undefined ? {} : { "content-type": "application/json" }),
        cookie: [...this.cookies].map(([name, value]) => `${name}=${value}`).join("; "),
        ...headers,
      },
      body: body === undefined ? undefined : typeof body === "string" ? body : JSON.stringify(body),
    });
    for (const cookie of response.headers.getSetCookie()) {
      const [pair = ""] = cookie.split(";");
      const at = pair.indexOf("=");
      this.cookies.set(pair.slice(0, at), pair.slice(at + 1));
    }
    return response;
  }

  get(path: string): Promise<Response> {
    return this.request("GET", path);
  }

  post(path: string, body: unknown): Promise<Response> {
    return this.request("POST", path, body);
  }

  put(path: string, body: unknown): Promise<Response> {
    return this.request("PUT", path, body);
  }

  async signIn(email: string, password = "two-tea-trolleys"): Promise<this> {
    const { csrfToken } = (await (await this.get("/api/auth/csrf")).json()) as { csrfToken: string };
    const form = new URLSearchParams({ csrfToken, email, password, json: "true" });
    const response = await this.request("POST", "/api/auth/callback/credentials", form.toString(), { "content-type": "application/x-www-form-urlencoded" });
    if (response.status !== 200) throw new Error(`sign-in refused: ${response.status}`);
    return this;
  }
}

export const DEMO = {
  performer: "performer@marrowlane.example",
  collaborator: "collaborator@marrowlane.example",
  "sound-helper": "sound@marrowlane.example",
} as const;

export const DEMO_RIG = "marrow-lane";
