import { HttpException, HttpStatus } from '@nestjs/common';
import type { Problem } from '@noonwell/schema';

export type ProblemErrors = NonNullable<Problem['errors']>;

/** Kinds of problem that a client tells apart; everything else is known by its status alone. */
export type ProblemKind =
  | 'invalid-input'
  | 'weather-refused'
  | 'weather-in-use'
  | 'version-conflict'
  | 'changed-meanwhile'
  | 'quota-reached'
  | 'last-administrator'
  | 'too-many-scenarios'
  | 'weather-missing'
  | 'run-not-finished'
  | 'nothing-to-run'
  | 'run-not-ended'
  | 'result-exists'
  | 'session-ended'
  | 'role-changed'
  | 'cross-site';

/** An answer other than success, in the words of RFC 9457. */
export class ProblemException extends HttpException {
  constructor(
    status: HttpStatus,
    readonly title: string,
    readonly detail?: string,
    readonly more: {
      readonly kind?: ProblemKind;
      readonly errors?: ProblemErrors;
      readonly retryAfterS?: number;
    } = {},
  ) {
    super(title, status);
  }
}

/** Nothing there, or nothing that the asking person may know of: the same answer. */
export const notFound = (what: string): ProblemException =>
  new ProblemException(HttpStatus.NOT_FOUND, 'Not found', `There is no such ${what} in this workspace.`);

export const forbidden = (detail: string): ProblemException =>
  new ProblemException(HttpStatus.FORBIDDEN, 'Not allowed', detail);

export const unauthorized = (detail: string, kind?: ProblemKind): ProblemException =>
  new ProblemException(HttpStatus.UNAUTHORIZED, 'Sign in first', detail, kind === undefined ? {} : { kind });

export const conflict = (kind: ProblemKind, detail: string): ProblemException =>
  new ProblemException(HttpStatus.CONFLICT, 'This does not fit the present state', detail, { kind });
