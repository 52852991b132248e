/** What is wrong with a formula; `at` is an offset, null where the whole formula is meant. */
export class FormulaTrouble extends Error {
  constructor(
    message: string,
    readonly at: number | null,
  ) {
    super(message);
  }
}
