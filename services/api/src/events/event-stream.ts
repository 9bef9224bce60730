import type { RunEvent } from '@noonwell/schema';
import type { Response } from 'express';

/**
 * Server-sent events to one client. To a client that reads too slowly only the newest state of each run is kept,
 * so that it costs no more memory than its runs.
 */
export class EventStream {
  private readonly waiting = new Map<string, RunEvent>();
  private full = false;

  constructor(private readonly response: Response) {
    response.writeHead(200, {
      'Content-Type': 'text/event-stream; charset=utf-8',
      'Cache-Control': 'no-store, no-transform',
      // A proxy that collects the answer first would hold every event back.
      'X-Accel-Buffering': 'no',
    });
    response.on('drain', () => {
      this.flush();
    });
    this.write(': open\n\n');
  }

  receive(event: RunEvent): void {
    this.waiting.set(event.runId, event);
    if (!this.full) this.flush();
  }

  /** A comment, which clients pass over: it keeps proxies from closing a line that seems unused. */
  beat(): void {
    if (!this.full) this.write(': heartbeat\n\n');
  }

  end(): void {
    this.response.end();
  }

  private flush(): void {
    this.full = false;
    for (const [runId, event] of this.waiting) {
      this.waiting.delete(runId);
      if (!this.write(`event: run\ndata: ${JSON.stringify(event)}\n\n`)) return;
    }
  }

  /** @returns whether the client takes more at the moment */
  private write(text: string): boolean {
    if (this.response.writableEnded || this.response.destroyed) return false;
    this.full = !this.response.write(text);
    return !this.full;
  }
}
