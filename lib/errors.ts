/** Every way a request can be refused, with the status it maps to. One table, so nothing can be forgotten. */
export const REFUSALS = {
  signed_out: 401,
  address_unchecked: 403,
  not_found: 404,
  not_your_part: 403,
  not_from_here: 403,
  not_json: 415,
  too_large: 413,
  bad_input: 422,
  not_yet: 409,
  stale: 409,
  key_reused: 422,
  too_many: 429,
  busy: 503,
  gone: 410,
} as const;

/** Stable problem types (RFC 9457): `/problems/<code>`. */
export type Refusal = keyof typeof REFUSALS;

/** Field path (`legs.1.payer`) to what is wrong with it, in words. */
export type FieldErrors = Record<string, string[]>;

export type Denial = { code: Refusal; message: string; fields?: FieldErrors; missing?: string[] };

/** A refusal in words that a person may read. `missing` lists what would make it possible. */
export class AppError extends Error {
  override name = "AppError";
  readonly code: Refusal;
  readonly fields: FieldErrors | undefined;
  readonly missing: string[] | undefined;
  readonly retryAfterSeconds: number | undefined;
  constructor(code: Refusal, message: string, more: { fields?: FieldErrors; missing?: string[]; retryAfterSeconds?: number; cause?: unknown } = {}) {
    super(message, { cause: more.cause });
    this.code = code;
    this.fields = more.fields;
    this.missing = more.missing;
    this.retryAfterSeconds = more.retryAfterSeconds;
  }
}

/** Throws when a rule denied; rules answer null when they allow. */
export function refuse(denial: Denial | null): void {
  if (denial) throw new AppError(denial.code, denial.message, denial);
}
