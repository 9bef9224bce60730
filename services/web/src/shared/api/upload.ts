import type { RouteKey } from '@noonwell/schema';
import type { z } from 'zod';
import { ApiProblem, ContractError, NoAnswerError, problemOf } from './problem.js';
import { routeRequest } from './route-url.js';
import { currentToken, endSession, refreshSession } from './session.js';

interface UploadOptions {
  /** Fraction of the bytes that left this machine, 0 … 1. */
  onProgress?: (fraction: number) => void;
  signal?: AbortSignal;
}

interface Answer {
  status: number;
  body: unknown;
}

/** Sends a form with a file. XMLHttpRequest, because fetch cannot tell how much has been sent. */
export async function upload<Schema extends z.ZodType>(
  route: RouteKey,
  schema: Schema,
  form: FormData,
  options: UploadOptions = {},
): Promise<z.output<Schema>> {
  let answer = await sendForm(route, form, await currentToken(), options);
  if (answer.status === 401) {
    if (await refreshSession()) answer = await sendForm(route, form, await currentToken(), options);
    if (answer.status === 401) endSession();
  }
  if (answer.status < 200 || answer.status > 299) {
    throw new ApiProblem(problemOf(answer.status, answer.body), route);
  }
  const parsed = schema.safeParse(answer.body);
  if (!parsed.success) throw new ContractError(route, parsed.error);
  return parsed.data;
}

function sendForm(
  route: RouteKey,
  form: FormData,
  token: string | null,
  { onProgress, signal }: UploadOptions,
): Promise<Answer> {
  const { method, url } = routeRequest(route, undefined);
  return new Promise((resolve, reject) => {
    const http = new XMLHttpRequest();
    const abort = () => {
      http.abort();
    };
    const finish = () => {
      signal?.removeEventListener('abort', abort);
    };
    http.open(method, url);
    http.setRequestHeader('accept', 'application/json, application/problem+json');
    if (token !== null) http.setRequestHeader('authorization', `Bearer ${token}`);
    http.upload.addEventListener('progress', (event) => {
      if (event.lengthComputable) onProgress?.(event.loaded / event.total);
    });
    http.addEventListener('load', () => {
      finish();
      resolve({ status: http.status, body: parseJson(http.responseText) });
    });
    http.addEventListener('error', () => {
      finish();
      reject(new NoAnswerError(route, null));
    });
    http.addEventListener('abort', () => {
      finish();
      reject(new DOMException('The upload was cancelled.', 'AbortError'));
    });
    signal?.addEventListener('abort', abort);
    http.send(form);
  });
}

function parseJson(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch {
    return null;
  }
}
