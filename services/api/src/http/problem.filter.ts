import {
  Catch,
  HttpException,
  HttpStatus,
  Logger,
  type ArgumentsHost,
  type ExceptionFilter,
} from '@nestjs/common';
import { isForeignKeyViolation, loggable } from '@noonwell/persistence';
import type { Problem } from '@noonwell/schema';
import type { Request, Response } from 'express';
import { ZodSerializationException, ZodValidationException } from 'nestjs-zod';
import { STATUS_CODES } from 'node:http';
import { z } from 'zod';
import { conflict, ProblemException, type ProblemErrors } from './problem';

/** What a request's own errors look like when body-parser or the router throws them (http-errors). */
const requestErrorSchema = z.object({ status: z.int().min(400).max(499) });

/** Turns everything thrown into problem details. Causes go to the log only, under the reference in the answer. */
@Catch()
export class ProblemFilter implements ExceptionFilter {
  private readonly log = new Logger('problem');

  catch(error: unknown, host: ArgumentsHost): void {
    const request = host.switchToHttp().getRequest<Request>();
    const response = host.switchToHttp().getResponse<Response>();
    const problem = {
      ...problemOf(isForeignKeyViolation(error) ? changedMeanwhile() : error),
      instance: request.path,
    };
    const failed = problem.status >= 500;
    const reference = typeof request.id === 'string' ? request.id : 'none';
    if (failed) {
      // pino writes the request's id and the stack beside it.
      this.log.error({ err: loggable(error), reference }, 'request failed');
    }
    if (response.headersSent) {
      // A stream broke on the way: only closing the connection tells the reader.
      response.destroy();
      return;
    }
    if (error instanceof ProblemException && error.more.retryAfterS !== undefined) {
      response.setHeader('Retry-After', String(error.more.retryAfterS));
    }
    response
      .status(problem.status)
      .type('application/problem+json')
      .send(JSON.stringify(failed ? { ...problem, reference } : problem));
  }
}

/** Looked at before it was written, and gone in between. */
function changedMeanwhile(): ProblemException {
  return conflict(
    'changed-meanwhile',
    'Nothing was saved: somebody else deleted something that this belongs to, at the same moment. Load the page again.',
  );
}

function problemOf(error: unknown): Problem {
  if (error instanceof ProblemException) {
    return {
      type: error.more.kind === undefined ? 'about:blank' : `urn:noonwell:problem:${error.more.kind}`,
      title: error.title,
      status: error.getStatus(),
      ...(error.detail === undefined ? {} : { detail: error.detail }),
      ...(error.more.errors === undefined ? {} : { errors: [...error.more.errors] }),
    };
  }
  if (error instanceof ZodValidationException) {
    return {
      type: 'urn:noonwell:problem:invalid-input',
      title: 'The request has values that cannot be taken',
      status: HttpStatus.BAD_REQUEST,
      detail: 'Nothing was saved. Each failing field is named.',
      errors: errorsOf(error.getZodError()),
    };
  }
  // A wrong answer of ours is a fault of ours, whatever Nest calls it.
  if (error instanceof HttpException && !(error instanceof ZodSerializationException)) {
    return plain(error.getStatus(), error.getStatus() < 500 ? error.message : undefined);
  }
  const requestError = requestErrorSchema.safeParse(error);
  if (requestError.success) return plain(requestError.data.status, detailOf(requestError.data.status));
  return plain(
    HttpStatus.INTERNAL_SERVER_ERROR,
    'Something failed on the server. Try again; if it stays, give the reference to your administrator.',
  );
}

function plain(status: number, detail: string | undefined): Problem {
  const problem = { type: 'about:blank', title: STATUS_CODES[status] ?? 'Error', status };
  return detail === undefined ? problem : { ...problem, detail };
}

function detailOf(status: number): string {
  if (status === 413) return 'The request is larger than this route takes.';
  return 'The request cannot be read: its body is not what its content type says.';
}

/** The failing fields; values are not repeated, they may be passwords. */
export function errorsOf(error: unknown): ProblemErrors {
  if (!(error instanceof z.core.$ZodError)) return [];
  return error.issues.map((issue) => ({ path: issue.path.map(String).join('.'), reason: issue.message }));
}
