import type { Problem } from "@/shared/contract/problem";

/** The one error the data layer rejects with. `message` is a sentence for people; `status` is 0 where no server answered. */
export class ApiError extends Error {
  readonly status: number;
  readonly code: string;
  readonly fields: NonNullable<Problem["fields"]>;

  constructor(status: number, code: string, message: string, fields: NonNullable<Problem["fields"]> = []) {
    super(message);
    this.name = "ApiError";
    this.status = status;
    this.code = code;
    this.fields = fields;
  }

  /** The request itself was refused: sending it again unchanged will not help. */
  get refused(): boolean {
    return this.status >= 400 && this.status < 500 && this.status !== 401 && this.status !== 429;
  }

  static notFound(): ApiError {
    return new ApiError(404, "not-found", "This is not on your shelf any more.");
  }

  static offline(): ApiError {
    return new ApiError(0, "offline", "Larkspan cannot be reached. Check your connection and try again.");
  }
}
