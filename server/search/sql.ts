/** Collects the values of a statement and hands out their places. */
export class Binds {
  readonly values: unknown[] = [];

  /** The place of a value: `$3`. */
  add(value: unknown): string {
    this.values.push(value);
    return `$${this.values.length}`;
  }
}
