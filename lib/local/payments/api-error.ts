/** The part of an error that callers see; the shape is that of the service. */
export type ErrorBody = { message: string; type?: string; code?: string; param?: string };

/** A call that is answered with an error. */
export class ApiError extends Error {
  constructor(
    readonly status: number,
    readonly body: ErrorBody,
    /** True when the call had begun to act: then its key keeps the error, as it keeps a result. */
    readonly kept = false,
  ) {
    super(body.message);
  }

  toJson() {
    const { code, ...rest } = this.body;
    const docs = code ? { code, doc_url: `https://stripe.com/docs/error-codes/${code.replaceAll("_", "-")}` } : {};
    return { error: { type: "invalid_request_error", ...rest, ...docs } };
  }
}

/** There is no such thing, or not under this account. */
export const missing = (kind: string, id: string, param = "id") =>
  new ApiError(404, { code: "resource_missing", message: `No such ${kind}: '${id}'`, param });
