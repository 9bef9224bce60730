import { afterEach, expect, it, vi } from 'vitest';
import '../../test/browser.js';
import { runEventSchema, type RunEvent } from '@noonwell/schema';
import { access, id } from '../../test/fixtures.js';
import { createEventParser, listen, type StreamState } from './events.js';
import { startSession } from './session.js';

afterEach(() => {
  vi.useRealTimers();
});

function parse(...parts: string[]) {
  const messages: { event: string; data: string }[] = [];
  const feed = createEventParser((message) => messages.push(message));
  parts.forEach(feed);
  return messages;
}

it('reads messages wherever the network cut them', () => {
  const text = 'event: run\ndata: {"a":1}\n\n: heartbeat\n\ndata: one\ndata:two\n\n';
  const whole = parse(text);
  expect(whole).toEqual([
    { event: 'run', data: '{"a":1}' },
    { event: 'message', data: 'one\ntwo' },
  ]);
  for (let cut = 1; cut < text.length; cut += 1) {
    expect(parse(text.slice(0, cut), text.slice(cut))).toEqual(whole);
  }
});

it('takes all three line ends, and CR LF also when it is cut in the middle', () => {
  for (const end of ['\n', '\r\n']) {
    expect(parse(`event: run${end}data: x${end}${end}`)).toEqual([{ event: 'run', data: 'x' }]);
  }
  expect(parse('event: run\r', '\ndata: x\r', '\n\r', '\n')).toEqual([{ event: 'run', data: 'x' }]);
});

it('connects again after a broken line, with the bearer header each time', async () => {
  const event: RunEvent = { runId: id(1), scenarioId: id(2), state: 'running', progress: 0.5, failure: null };
  const tokens: (string | null)[] = [];
  vi.stubGlobal('fetch', (_: string, init: RequestInit) => {
    tokens.push(new Headers(init.headers).get('authorization'));
    const data = JSON.stringify({ ...event, progress: tokens.length / 10 });
    return Promise.resolve(new Response(`event: run\ndata: ${data}\n\nevent: run\ndata: {"broken":\n\n`));
  });
  startSession(access('engineer', 'abc'));
  vi.useFakeTimers();
  const seen: number[] = [];
  const states: StreamState[] = [];
  const stop = listen(
    'GET /api/studies/{id}/events',
    { params: { id: id(10) } },
    {
      event: 'run',
      schema: runEventSchema,
      onEvent: ({ progress }) => seen.push(progress),
      onState: (state) => states.push(state),
    },
  );
  await vi.waitFor(() => {
    expect(seen).toEqual([0.1, 0.2]);
  });
  stop();
  expect(tokens.slice(0, 2)).toEqual(['Bearer abc', 'Bearer abc']);
  expect(states.slice(0, 4)).toEqual(['connecting', 'open', 'waiting', 'connecting']);
});

it('gives up where trying again cannot help', async () => {
  const fetches = vi.fn(() =>
    Promise.resolve(Response.json({ type: 'x', title: 'No such study', status: 404 }, { status: 404 })),
  );
  vi.stubGlobal('fetch', fetches);
  startSession(access());
  const refused = await new Promise<number>((resolve) => {
    listen(
      'GET /api/studies/{id}/events',
      { params: { id: id(10) } },
      {
        event: 'run',
        schema: runEventSchema,
        onEvent: () => undefined,
        onRefused: ({ status }) => {
          resolve(status);
        },
      },
    );
  });
  expect(refused).toBe(404);
  expect(fetches).toHaveBeenCalledTimes(1);
});
