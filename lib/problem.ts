/** One row per expected refusal: its HTTP status and the title that every such refusal shares. */
export const PROBLEMS = {
  "not-signed-in": { status: 401, title: "Sign in to go on" },
  "session-ended": { status: 401, title: "Your session has ended" },
  "not-allowed": { status: 403, title: "Your role does not allow this" },
  "own-work": { status: 403, title: "Nobody approves or reviews their own work" },
  "wrong-origin": { status: 403, title: "The request came from another site" },
  "not-found": { status: 404, title: "There is no such record" },
  "method-not-allowed": { status: 405, title: "This address does not take that kind of request" },
  conflict: { status: 409, title: "The record has changed or does not allow this now" },
  "key-reused": { status: 409, title: "The same key was sent with different content" },
  "needs-confirmation": { status: 409, title: "A person must confirm this first" },
  "too-large": { status: 413, title: "The upload is larger than is allowed" },
  "wrong-type": { status: 415, title: "The content is not of a kind that can be read here" },
  invalid: { status: 422, title: "Some of what was sent cannot be used" },
  "wrong-password": { status: 422, title: "The password is not right" },
  "too-many": { status: 429, title: "Too many tries" },
  unavailable: { status: 503, title: "The server cannot do this at the moment" },
} as const;

export type ProblemCode = keyof typeof PROBLEMS;

/** One thing that is wrong in what was sent: where (a JSON pointer, RFC 6901), a code, and a sentence for a person. */
export type FieldProblem = { pointer: string; code: string; detail: string };

/** The body of a refusal as it leaves the server (RFC 9457, media type application/problem+json). */
export type ProblemDocument = {
  type: string;
  title: string;
  status: number;
  detail: string;
  instance?: string;
  errors?: FieldProblem[];
};

/**
 * An expected refusal. Thrown by rules, commands and queries; shown to a person as sentences.
 * A programmer's error is not a Problem: use `invariant`.
 */
export class Problem extends Error {
  readonly code: ProblemCode;
  readonly errors: FieldProblem[];

  constructor(code: ProblemCode, detail: string, errors: FieldProblem[] = [], options?: ErrorOptions) {
    super(detail, options);
    this.name = "Problem";
    this.code = code;
    this.errors = errors;
  }

  get status(): number {
    return PROBLEMS[this.code].status;
  }

  toDocument(instance?: string): ProblemDocument {
    return {
      type: `urn:stillwell:problem:${this.code}`,
      title: PROBLEMS[this.code].title,
      status: this.status,
      detail: this.message,
      ...(instance ? { instance } : {}),
      ...(this.errors.length > 0 ? { errors: this.errors } : {}),
    };
  }
}

/** Shorthand for one wrong field. */
export function invalidField(pointer: string, code: string, detail: string): Problem {
  return new Problem("invalid", detail, [{ pointer, code, detail }]);
}

/** The record that was asked for does not exist, or the person may not know that it does. */
export function notFound(what: string): Problem {
  return new Problem("not-found", `There is no ${what}, or you may not see it.`);
}
