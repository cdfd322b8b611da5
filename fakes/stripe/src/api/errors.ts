/** The inside of `{"error": …}`, as the SDK turns it into its error classes. */
export type ErrorBody = {
  type: 'invalid_request_error' | 'idempotency_error' | 'card_error' | 'api_error';
  message: string;
  code?: string;
  param?: string;
  decline_code?: string;
};

/** A refusal that goes back to the caller as it is. */
export class ApiError extends Error {
  constructor(
    readonly status: number,
    readonly body: ErrorBody,
    /** Whether an idempotency key remembers this answer. A fault in the parameters is not remembered. */
    readonly isRemembered = false,
  ) {
    super(body.message);
  }
}

/** A parameter is wrong; nothing was done. */
export function badParameter(param: string, message: string, code?: string): ApiError {
  return new ApiError(400, { type: 'invalid_request_error', message, param, ...(code ? { code } : {}) });
}

/** The call was understood, but the object is not in a state that allows it. */
export function refused(message: string, code?: string, param?: string): ApiError {
  const body: ErrorBody = { type: 'invalid_request_error', message };
  if (code) body.code = code;
  if (param) body.param = param;
  return new ApiError(400, body, true);
}

/** `kind` is the object's name in the API (`payment_intent`), `param` the field that named it. */
export function missing(kind: string, id: string, param = 'id'): ApiError {
  return new ApiError(404, {
    type: 'invalid_request_error',
    code: 'resource_missing',
    message: `No such ${kind}: '${id}'`,
    param,
  });
}

export function unknownRoute(method: string, path: string): ApiError {
  return new ApiError(404, {
    type: 'invalid_request_error',
    message: `Unrecognized request URL (${method}: ${path}). The local stand-in does not offer it.`,
  });
}
