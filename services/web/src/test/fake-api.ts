import { ROUTES, type Problem, type RouteKey } from '@noonwell/schema';
import { vi } from 'vitest';

export interface FakeCall {
  readonly route: RouteKey;
  readonly params: Readonly<Record<string, string>>;
  readonly query: URLSearchParams;
  readonly body: unknown;
  readonly token: string | null;
}

interface FakeAnswer {
  status?: number;
  body?: unknown;
}

type Handler = (call: FakeCall) => FakeAnswer | Promise<FakeAnswer>;

const patterns = (Object.keys(ROUTES) as RouteKey[]).map((route) => {
  const [method = '', path = ''] = route.split(' ');
  return { route, method, pattern: new RegExp(`^${path.replace(/\{(\w+)\}/g, '(?<$1>[^/]+)')}$`) };
});

/** An API that answers what a test says and keeps what it was asked. Unknown addresses fail the test. */
export class FakeApi {
  readonly calls: FakeCall[] = [];
  private readonly handlers = new Map<RouteKey, Handler>();

  /** Puts itself in the place of the network until the test is over. */
  install(): this {
    vi.stubGlobal('fetch', (input: RequestInfo | URL, init?: RequestInit) => this.fetch(input, init));
    vi.stubGlobal('XMLHttpRequest', fakeHttpRequest(this));
    return this;
  }

  on(route: RouteKey, answer: Handler | FakeAnswer): this {
    this.handlers.set(route, typeof answer === 'function' ? answer : () => answer);
    return this;
  }

  callsOf(route: RouteKey): FakeCall[] {
    return this.calls.filter((call) => call.route === route);
  }

  async answer(method: string, address: string, body: unknown, token: string | null) {
    const url = new URL(address, window.location.origin);
    const found = patterns.find((entry) => entry.method === method && entry.pattern.test(url.pathname));
    if (found === undefined) throw new Error(`no route is ${method} ${url.pathname}`);
    const call: FakeCall = {
      route: found.route,
      params: { ...found.pattern.exec(url.pathname)?.groups },
      query: url.searchParams,
      body,
      token,
    };
    this.calls.push(call);
    const handler = this.handlers.get(found.route);
    if (handler === undefined) throw new Error(`the test gives no answer for ${found.route}`);
    const { status = 200, body: answer } = await handler(call);
    return { status, text: answer === undefined ? '' : JSON.stringify(answer) };
  }

  private async fetch(input: RequestInfo | URL, init: RequestInit = {}): Promise<Response> {
    const address = input instanceof Request ? input.url : input.toString();
    const authorization = new Headers(init.headers).get('authorization');
    const { status, text } = await this.answer(
      init.method ?? 'GET',
      address,
      typeof init.body === 'string' ? JSON.parse(init.body) : init.body,
      authorization?.replace(/^Bearer /, '') ?? null,
    );
    const bodyless = status === 204;
    return new Response(bodyless ? null : text, { status, headers: { 'content-type': 'application/json' } });
  }
}

/** The part of XMLHttpRequest that an upload uses. */
function fakeHttpRequest(api: FakeApi) {
  return class extends EventTarget {
    readonly upload = new EventTarget();
    status = 0;
    responseText = '';
    private method = '';
    private url = '';
    private token: string | null = null;

    open(method: string, url: string) {
      this.method = method;
      this.url = url;
    }

    setRequestHeader(name: string, value: string) {
      if (name === 'authorization') this.token = value.replace(/^Bearer /, '');
    }

    abort() {
      this.dispatchEvent(new Event('abort'));
    }

    send(body: unknown) {
      for (const loaded of [50, 100]) {
        this.upload.dispatchEvent(
          new ProgressEvent('progress', { lengthComputable: true, loaded, total: 100 }),
        );
      }
      void api.answer(this.method, this.url, body, this.token).then(
        ({ status, text }) => {
          this.status = status;
          this.responseText = text;
          this.dispatchEvent(new Event('load'));
        },
        () => this.dispatchEvent(new Event('error')),
      );
    }
  };
}

export function problem(status: number, title: string, more: Partial<Problem> = {}): FakeAnswer {
  return { status, body: { type: 'about:blank', title, status, ...more } };
}
