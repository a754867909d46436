import type { ErrorBody, ErrorHint } from '@driprail/shared/contracts/error.contract';

/** A refusal with a sentence for the person who asked. */
export class AppError extends Error {
  readonly status: number;
  readonly code: string;
  readonly fields: Record<string, string> | undefined;
  readonly hint: ErrorHint | undefined;

  constructor(
    status: number,
    code: string,
    message: string,
    more: { fields?: Record<string, string>; hint?: ErrorHint } = {},
  ) {
    super(message);
    this.status = status;
    this.code = code;
    this.fields = more.fields;
    this.hint = more.hint;
  }

  toBody(): ErrorBody {
    const { code, message, fields, hint } = this;
    return { error: { code, message, ...(fields && { fields }), ...(hint && { hint }) } };
  }
}

export const badRequest = (message: string, fields?: Record<string, string>) =>
  new AppError(400, 'bad_request', message, fields ? { fields } : {});
/** @param endedFor whose session it was, when somebody ended it on purpose: the device forgets what it kept for that user */
export const unauthorized = (endedFor?: string) =>
  endedFor === undefined
    ? new AppError(401, 'unauthorized', 'Sign in first.')
    : new AppError(401, 'session_ended', 'This device was signed out from elsewhere. Sign in first.', {
        hint: { endedFor },
      });
export const forbidden = (message = 'Your login may not do this.') => new AppError(403, 'forbidden', message);
export const notFound = (what: string) => new AppError(404, 'not_found', `${what} is not here.`);
export const conflict = (code: string, message: string, current?: unknown) =>
  new AppError(409, code, message, current === undefined ? {} : { hint: { current } });
export const unprocessable = (
  code: string,
  message: string,
  more: { fields?: Record<string, string>; hint?: ErrorHint } = {},
) => new AppError(422, code, message, more);
