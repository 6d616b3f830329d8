/**
 * Bad input to the engine. `field` names the argument, `reason` is a sentence for people, `allowed` the range in SI units
 * when there is one. Thrown instead of ever returning NaN.
 */
export class EngineInputError extends Error {
  readonly field: string;
  readonly reason: string;
  readonly allowed: string | null;

  constructor(field: string, reason: string, allowed: string | null = null) {
    super(allowed ? `${field}: ${reason} (allowed: ${allowed})` : `${field}: ${reason}`);
    this.name = "EngineInputError";
    this.field = field;
    this.reason = reason;
    this.allowed = allowed;
  }
}
