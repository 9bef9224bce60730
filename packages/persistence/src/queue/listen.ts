import pg from 'pg';

export interface ListenOptions {
  readonly databaseUrl: string;
  readonly channel: string;
  readonly onSignal: (payload: string) => void;
  /** Signals may have been missed until now: read what there is. Called on the first connection and each later one. */
  readonly onConnected?: () => void;
  readonly onError?: (error: Error) => void;
}

export interface Listener {
  close(): Promise<void>;
}

const FIRST_WAIT_MS = 200;
const LONGEST_WAIT_MS = 10_000;

/**
 * Listens to one notification channel on a session of its own and connects again, with growing waits, whenever
 * that session is lost.
 */
export function listen(options: ListenOptions): Listener {
  const { channel, onSignal, onConnected, onError } = options;
  let closed = false;
  let waitMs = FIRST_WAIT_MS;
  let timer: NodeJS.Timeout | undefined;
  let client: pg.Client | undefined;
  let connecting: Promise<void> = Promise.resolve();

  function connectLater(): void {
    if (closed || timer !== undefined) return;
    timer = setTimeout(() => {
      timer = undefined;
      connecting = connect();
    }, waitMs);
    waitMs = Math.min(waitMs * 2, LONGEST_WAIT_MS);
  }

  async function connect(): Promise<void> {
    if (closed) return;
    // keepAlive: a session that is lost without a word is noticed instead of waited on for ever.
    const session = new pg.Client({ connectionString: options.databaseUrl, keepAlive: true });
    client = session;
    session.on('error', (error) => onError?.(error));
    session.on('end', connectLater);
    session.on('notification', (message) => {
      if (message.channel === channel) onSignal(message.payload ?? '');
    });
    try {
      await session.connect();
      await session.query(`LISTEN ${session.escapeIdentifier(channel)}`);
      waitMs = FIRST_WAIT_MS;
      onConnected?.();
    } catch (error) {
      onError?.(error instanceof Error ? error : new Error(String(error)));
      await session.end().catch(() => undefined);
      connectLater();
    }
  }

  connecting = connect();
  return {
    close: async () => {
      closed = true;
      clearTimeout(timer);
      await connecting;
      await client?.end().catch(() => undefined);
    },
  };
}
