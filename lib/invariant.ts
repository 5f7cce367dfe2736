/** A programmer's error: something that no input can bring about in a right program. Logged, shown as 500. */
export class InvariantError extends Error {
  constructor(message: string, options?: ErrorOptions) {
    super(message, options);
    this.name = "InvariantError";
  }
}

/** Throws `InvariantError` when `condition` does not hold; narrows the type when it does. */
export function invariant(condition: unknown, message: string): asserts condition {
  if (!condition) throw new InvariantError(message);
}
