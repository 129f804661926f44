import type { Expression } from '@/components/reference/formulas/expression';

/** A formula with what it says. */
export interface Formula {
  readonly id: string;
  readonly says: string;
  readonly unit?: string;
  readonly left: Expression;
  readonly right: Expression;
  /** What its letters mean, and where it stops. */
  readonly where?: string;
  readonly source?: string;
}
