const statusByCode = {
  not_found: 404,
  forbidden: 403,
  conflict: 409,
  invalid_input: 422,
  rate_limited: 429,
  unavailable: 503,
} as const;
export type ErrorCode = keyof typeof statusByCode;
export type FieldErrors = Readonly<Record<string, readonly string[]>>;

/** An outcome we planned for. Anything else that is thrown is a bug. */
export class AppError extends Error {
  override readonly name = "AppError";
  readonly code: ErrorCode;
  /** Shown to the person as it is; the cause is for the log. */
  readonly userMessage: string;
  /** Messages that belong next to one field each, by the field's name in the form. */
  readonly fieldErrors: FieldErrors;
  readonly retryAfterS: number | null;

  constructor(
    code: ErrorCode,
    userMessage: string,
    options?: ErrorOptions & { fieldErrors?: FieldErrors; retryAfterS?: number },
  ) {
    super(`${code}: ${userMessage}`, options);
    this.code = code;
    this.userMessage = userMessage;
    this.fieldErrors = options?.fieldErrors ?? {};
    this.retryAfterS = options?.retryAfterS ?? null;
  }

  get status(): number {
    return statusByCode[this.code];
  }
}
