/** Thrown by a call, answered in the shape that the SDK turns into its own error classes. */
export class ApiError extends Error {
  override readonly name = "ApiError";
  readonly status: number;
  readonly body: { error: { type: string; message: string; code?: string; param?: string } };
  constructor(status: number, message: string, { type = "invalid_request_error", ...rest }: { type?: string; code?: string; param?: string } = {}) {
    super(message);
    this.status = status;
    this.body = { error: { type, message, ...rest } };
  }
}
