/** One slice holds the writer for at most this long, so that nobody who walks a round waits. */
export const SLICE_MS = 20;
/** Below this a slice may grow. */
const QUICK_MS = 8;

/**
 * How many rows the next slice may hold, by how long the last one took: halved when it was too long, doubled when it was
 * quick. Never fewer than `least`: writing to the disk takes its time whatever the slice holds.
 */
export class Pace {
  #size: number;

  constructor(
    private readonly least: number,
    private readonly most: number,
  ) {
    this.#size = least;
  }

  get size(): number {
    return this.#size;
  }

  /** Says how long the last slice took, and how many rows it held. */
  took(ms: number, rows: number): void {
    if (ms > SLICE_MS * 0.75) this.#size = Math.max(this.least, Math.floor(Math.min(this.#size, rows) / 2));
    else if (ms < QUICK_MS && rows >= this.#size) this.#size = Math.min(this.most, this.#size * 2);
  }
}
