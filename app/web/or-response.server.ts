import { data } from "react-router";
import { AppError } from "#app/domain/app-error.ts";

/** Turns a planned refusal into the answer that the nearest ErrorBoundary shows. Bugs fly on. */
export async function orResponse<T>(work: Promise<T>): Promise<T> {
  try {
    return await work;
  } catch (error) {
    if (error instanceof AppError) {
      throw data({ userMessage: error.userMessage }, {
        status: error.status,
        headers: error.retryAfterS === null ? {} : { "Retry-After": String(error.retryAfterS) },
      });
    }
    throw error;
  }
}
