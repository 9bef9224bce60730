import { runEventSchema, type RunEvent } from '@noonwell/schema';

/** Reads one stream of server-sent events. */
export class EventReader {
  private readonly reader: ReadableStreamDefaultReader<Uint8Array>;
  private readonly decoder = new TextDecoder();
  private text = '';

  private constructor(
    readonly status: number,
    readonly contentType: string | null,
    body: ReadableStream<Uint8Array>,
    private readonly controller: AbortController,
  ) {
    this.reader = body.getReader();
  }

  static async open(address: string, studyId: string, authorization: string): Promise<EventReader> {
    const controller = new AbortController();
    const answer = await fetch(`${address}/api/studies/${studyId}/events`, {
      headers: { authorization },
      signal: controller.signal,
    });
    if (answer.body === null) throw new Error('The answer has no body.');
    return new EventReader(answer.status, answer.headers.get('content-type'), answer.body, controller);
  }

  /** The next event of runs; undefined when the stream has ended. */
  async next(): Promise<RunEvent | undefined> {
    for (;;) {
      const end = this.text.indexOf('\n\n');
      if (end >= 0) {
        const message = this.text.slice(0, end);
        this.text = this.text.slice(end + 2);
        const data = /^event: run\ndata: (.*)$/s.exec(message)?.[1];
        if (data !== undefined) return runEventSchema.parse(JSON.parse(data));
        continue;
      }
      const { done, value } = await this.reader.read();
      if (done) return undefined;
      this.text += this.decoder.decode(value, { stream: true });
    }
  }

  /** Reads on to the first event that is wanted. */
  async until(wanted: (event: RunEvent) => boolean): Promise<RunEvent> {
    for (;;) {
      const event = await this.next();
      if (event === undefined) throw new Error('The stream ended before the event came.');
      if (wanted(event)) return event;
    }
  }

  close(): void {
    this.controller.abort();
  }
}
