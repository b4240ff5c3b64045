/**
 * The words in which every computation answers. `ok` and `warn` carry a value, `refuse` carries a
 * reason and no value: outside its published range an equation gives no number.
 */
export interface Notice<Code extends string = string> {
  readonly code: Code;
  readonly text: string;
}

export interface Refusal<Code extends string = string> {
  readonly verdict: "refuse";
  readonly code: Code;
  readonly reason: string;
}

/** A value with the warnings that go with it; `warn` exactly when there is at least one. */
export type Answer<Value, Code extends string = string> = Value & {
  readonly verdict: "ok" | "warn";
  readonly warnings: readonly Notice<Code>[];
};

export function answer<Value extends object, Code extends string>(
  value: Value,
  warnings: readonly Notice<Code>[] = [],
): Answer<Value, Code> {
  return { ...value, verdict: warnings.length > 0 ? "warn" : "ok", warnings };
}

export function refuse<Code extends string>(code: Code, reason: string): Refusal<Code> {
  return { verdict: "refuse", code, reason };
}

/** Finite and above zero: what every load, indent size and divisor has to be. */
export function isPositive(value: number): boolean {
  return Number.isFinite(value) && value > 0;
}
