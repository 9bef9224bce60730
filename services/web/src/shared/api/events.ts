import type { RouteKey } from '@noonwell/schema';
import type { z } from 'zod';
import { requestRaw, type RouteCall } from './client.js';
import { ApiProblem } from './problem.js';

export type StreamState = 'connecting' | 'open' | 'waiting';

interface EventOptions<Schema extends z.ZodType> {
  /** Name of the event that is listened to. */
  event: string;
  schema: Schema;
  onEvent: (data: z.output<Schema>) => void;
  /** For a line such as "connection lost, trying again". */
  onState?: (state: StreamState) => void;
  /** A refusal that trying again cannot mend (no right, not found); the stream has ended. */
  onRefused?: (problem: ApiProblem) => void;
}

type EventRoute = Extract<RouteKey, `GET ${string}/events`>;

const FIRST_WAIT_MS = 500;
const LONGEST_WAIT_MS = 15_000;
/** The server speaks at least every 15 s; after three silences the line is dead. */
const SILENCE_MS = 45_000;

/**
 * Listens to server-sent events with the bearer header (EventSource cannot send one) and connects again,
 * ever more slowly, whenever the line breaks. The server tells the present state at each connection, so
 * nothing is missed.
 *
 * @returns stops listening
 */
export function listen<Schema extends z.ZodType>(
  route: EventRoute,
  call: RouteCall<EventRoute>,
  options: EventOptions<Schema>,
): () => void {
  const stop = new AbortController();
  void run(route, call, options, stop.signal);
  return () => {
    stop.abort();
  };
}

async function run<Schema extends z.ZodType>(
  route: EventRoute,
  call: RouteCall<EventRoute>,
  { event, schema, onEvent, onState, onRefused }: EventOptions<Schema>,
  stopped: AbortSignal,
): Promise<void> {
  let waitMs = FIRST_WAIT_MS;
  while (!stopped.aborted) {
    onState?.('connecting');
    try {
      await readOnce(
        route,
        call,
        stopped,
        () => onState?.('open'),
        (message) => {
          waitMs = FIRST_WAIT_MS;
          if (message.event !== event) return;
          const parsed = schema.safeParse(parseJson(message.data));
          // An unknown message is left out; the row read by the next query is the truth.
          if (parsed.success) onEvent(parsed.data);
        },
      );
    } catch (error) {
      if (error instanceof ApiProblem && error.status >= 400 && error.status < 500 && error.status !== 429) {
        onRefused?.(error);
        return;
      }
    }
    if (isStopped(stopped)) return;
    onState?.('waiting');
    await wait(waitMs, stopped);
    waitMs = Math.min(waitMs * 2, LONGEST_WAIT_MS);
  }
}

/** The signal changes while we wait, which the compiler cannot see. */
function isStopped(signal: AbortSignal): boolean {
  return signal.aborted;
}

interface Message {
  event: string;
  data: string;
}

async function readOnce(
  route: EventRoute,
  call: RouteCall<EventRoute>,
  stopped: AbortSignal,
  onOpen: () => void,
  onMessage: (message: Message) => void,
): Promise<void> {
  const line = new AbortController();
  const hangUp = () => {
    line.abort();
  };
  stopped.addEventListener('abort', hangUp);
  let silence = setTimeout(hangUp, SILENCE_MS);
  try {
    const response = await requestRaw(route, {
      ...call,
      headers: { accept: 'text/event-stream' },
      signal: line.signal,
    });
    if (response.body === null) return;
    onOpen();
    const reader = response.body.pipeThrough(new TextDecoderStream()).getReader();
    const parser = createEventParser(onMessage);
    for (let part = await reader.read(); !part.done; part = await reader.read()) {
      clearTimeout(silence);
      silence = setTimeout(hangUp, SILENCE_MS);
      parser(part.value);
    }
  } finally {
    clearTimeout(silence);
    stopped.removeEventListener('abort', hangUp);
  }
}

/**
 * Cuts a stream of text into messages, wherever the network cut it.
 * Source: HTML Living Standard, section 9.2.6 "Interpreting an event stream".
 */
export function createEventParser(onMessage: (message: Message) => void): (text: string) => void {
  let rest = '';
  let event = '';
  let data: string[] = [];
  return (text) => {
    rest += text;
    // A lone CR at the very end may be the first half of CR LF: keep it for the next part.
    const lines = rest.split(/\r\n|\n|\r(?!$)/);
    rest = lines.pop() ?? '';
    for (const line of lines) {
      if (line === '') {
        if (data.length > 0) onMessage({ event: event === '' ? 'message' : event, data: data.join('\n') });
        event = '';
        data = [];
        continue;
      }
      const colon = line.indexOf(':');
      const field = colon < 0 ? line : line.slice(0, colon);
      const value = colon < 0 ? '' : line.slice(colon + 1).replace(/^ /, '');
      if (field === 'event') event = value;
      else if (field === 'data') data.push(value);
    }
  };
}

function parseJson(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch {
    return null;
  }
}

function wait(ms: number, stopped: AbortSignal): Promise<void> {
  return new Promise((resolve) => {
    const timer = setTimeout(resolve, ms);
    stopped.addEventListener(
      'abort',
      () => {
        clearTimeout(timer);
        resolve();
      },
      { once: true },
    );
  });
}
