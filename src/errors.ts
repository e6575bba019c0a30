/** What a person can have got wrong in a design; the list is closed so a screen can treat each kind. */
export type FaultKind =
  | 'missing'
  | 'unknown key'
  | 'wrong type'
  | 'not a quantity'
  | 'wrong dimension'
  | 'unknown unit'
  | 'ambiguous unit'
  | 'out of range'
  | 'unknown name'
  | 'inconsistent'
  | 'not a design'
  | 'unsupported version';

/** One fault in a design: where, of which kind, and one sentence saying field, got, allowed and what to do. */
export interface Fault {
  /** Dotted path into the design file, "pump.radius"; empty for the file as a whole. */
  path: string;
  kind: FaultKind;
  message: string;
}

/** The design cannot be answered until the person mends these faults. */
export class DesignError extends Error {
  override readonly name = 'DesignError';
  constructor(readonly faults: readonly Fault[]) {
    super(faults.map((fault) => fault.message).join('\n'));
  }
}

/** A numerical method failed (did not converge, or a value is not finite); never a person's fault. */
export class NumericalError extends Error {
  override readonly name = 'NumericalError';
  /**
   * @param where the method and what it was solving
   * @param residual last residual, in the unit the method states, or NaN where there is none
   * @param cell index of the first bad cell, where a field is involved
   */
  constructor(
    readonly where: string,
    readonly residual: number,
    readonly cell?: number,
  ) {
    super(
      `${where}: no convergence, residual ${residual}${cell === undefined ? '' : `, first bad cell ${cell}`}`,
    );
  }
}

/** A remark a person should see beside an answer: a formula left its validity range, an assumption matters. */
export interface Warning {
  /** Dotted design path or report section it belongs to. */
  where: string;
  text: string;
}
