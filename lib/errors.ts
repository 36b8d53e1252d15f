/** Every refusal the product makes, and the HTTP status it has. One table for pages and API. */
const STATUS = {
  "bad-request": 400,
  "not-signed-in": 401,
  forbidden: 403,
  "not-found": 404,
  stale: 409,
  conflict: 409,
  "too-large": 413,
  "wrong-type": 415,
  unprocessable: 422,
  "too-many": 429,
  internal: 500,
} as const;

const TITLE: Record<ErrorCode, string> = {
  "bad-request": "Some of this cannot be read",
  "not-signed-in": "Sign in first",
  forbidden: "Your role in this rig does not allow that",
  "not-found": "There is nothing here",
  stale: "Somebody saved before you",
  conflict: "That clashes with what is already there",
  "too-large": "That is too large",
  "wrong-type": "This wants JSON",
  unprocessable: "That cannot be done as asked",
  "too-many": "Too many requests",
  internal: "Something went wrong on the server",
};

export type ErrorCode = keyof typeof STATUS;

/** One refused field, as it appears in problem details. */
export interface FieldFault {
  field: string;
  pointer: string;
  detail: string;
}

interface AppErrorOptions {
  userMessage?: string;
  cause?: unknown;
  fields?: FieldFault[];
  /** Further members of the problem details, such as `current` for a stale save. */
  extra?: Record<string, unknown>;
  headers?: Record<string, string>;
}

/** A refusal that the person who asked may read. Anything else thrown is logged and shown as one calm sentence. */
export class AppError extends Error {
  readonly code: ErrorCode;
  readonly status: number;
  readonly title: string;
  readonly userMessage: string;
  readonly fields: FieldFault[] | undefined;
  readonly extra: Record<string, unknown> | undefined;
  readonly headers: Record<string, string> | undefined;

  constructor(code: ErrorCode, options: AppErrorOptions = {}) {
    super(options.userMessage ?? TITLE[code], { cause: options.cause });
    this.name = "AppError";
    this.code = code;
    this.status = STATUS[code];
    this.title = TITLE[code];
    this.userMessage = options.userMessage ?? `${TITLE[code]}.`;
    this.fields = options.fields;
    this.extra = options.extra;
    this.headers = options.headers;
  }
}

/** JSON pointer and dotted name of a path such as `["jacks", 0, "name"]`. */
export function fieldFault(path: readonly PropertyKey[], detail: string): FieldFault {
  const steps = path.map(String);
  return {
    field: steps.join("."),
    pointer: `#${steps.map((step) => `/${step.replaceAll("~", "~0").replaceAll("/", "~1")}`).join("")}`,
    detail,
  };
}
