/** Why a formula is refused, and what its author can do. */
export class FormulaFault extends Error {
  constructor(
    readonly detail: string,
    readonly fix: string,
  ) {
    super(detail);
  }
}
