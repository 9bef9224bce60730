import { problemSchema, type Problem } from '@noonwell/schema';

/** The server refused or failed: carries its problem details (RFC 9457). */
export class ApiProblem extends Error {
  override readonly name = 'ApiProblem';
  constructor(
    readonly problem: Problem,
    /** The route that was called, for the message and the log. */
    readonly route: string,
  ) {
    super(problem.detail ?? problem.title);
  }

  get status(): number {
    return this.problem.status;
  }
}

/** No answer came: server down, network gone. */
export class NoAnswerError extends Error {
  override readonly name = 'NoAnswerError';
  constructor(
    readonly route: string,
    cause: unknown,
  ) {
    super('The server did not answer.', { cause });
  }
}

/** The server answered with something that its contract does not allow: a fault of the program. */
export class ContractError extends Error {
  override readonly name = 'ContractError';
  constructor(
    readonly route: string,
    cause: unknown,
  ) {
    super('The server answered in a form that this page does not know.', { cause });
  }
}

export type PlaceOfError = NonNullable<Problem['errors']>[number];

/** What every error message says: what happened, to what, what to do next, and the reference into the log. */
export interface ErrorDescription {
  readonly title: string;
  readonly detail: string | null;
  readonly next: string;
  readonly reference: string | null;
  readonly places: readonly PlaceOfError[];
}

const nextByStatus: Readonly<Record<number, string>> = {
  401: 'Sign in again, then repeat what you did.',
  403: 'Ask an administrator of your workspace if you need it.',
  404: 'It may have been deleted, or it belongs to another workspace. Go back to the list and choose again.',
  409: 'Load the page again to see the newest state, then decide.',
  413: 'Choose a smaller file.',
  422: 'Correct what is listed, then try again.',
  429: 'Wait a minute, then try again.',
  503: 'The server is starting or overloaded. Try again in a minute.',
};

export function describeError(error: unknown): ErrorDescription {
  const none = { detail: null, reference: null, places: [] };
  if (error instanceof ApiProblem) {
    const { title, detail, status, reference, errors } = error.problem;
    return {
      title,
      detail: detail !== undefined && detail !== title ? detail : null,
      next:
        nextByStatus[status] ??
        (status >= 500
          ? 'Nothing was changed by this page. Try again; if it stays, pass on the reference below.'
          : 'Correct what is named, then try again.'),
      reference: reference ?? null,
      places: errors ?? [],
    };
  }
  if (error instanceof NoAnswerError) {
    return { ...none, title: error.message, next: 'Check that Noonwell is still running and try again.' };
  }
  if (error instanceof ContractError) {
    return {
      ...none,
      title: error.message,
      detail: `Route: ${error.route}`,
      next: 'Load the page again: the server may have been updated while it was open.',
    };
  }
  return {
    ...none,
    title: 'Something went wrong in this page.',
    detail: error instanceof Error ? error.message : null,
    next: 'Load the page again. Nothing on the server was changed by it.',
  };
}

/** Reads the problem details of a refusal; invents plain ones where a proxy answered in another form. */
export function problemOf(status: number, body: unknown): Problem {
  const parsed = problemSchema.safeParse(body);
  if (parsed.success) return parsed.data;
  return { type: 'about:blank', title: `The server answered with status ${status}.`, status };
}
