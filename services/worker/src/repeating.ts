/**
 * Work that is done now and again and whenever it is asked for, never twice at once: asked for while it runs, it
 * runs once more afterwards.
 */
export class Repeating {
  private running: Promise<void> | undefined;
  private again = false;
  private timer: NodeJS.Timeout | undefined;
  private stopped = false;

  constructor(
    private readonly work: () => Promise<unknown>,
    private readonly onError: (error: unknown) => void,
  ) {}

  start(everyMs: number): void {
    this.timer = setInterval(() => {
      this.wake();
    }, everyMs);
    this.wake();
  }

  wake(): void {
    if (this.stopped) return;
    if (this.running !== undefined) {
      this.again = true;
      return;
    }
    this.running = this.work()
      .then(() => undefined, this.onError)
      .finally(() => {
        this.running = undefined;
        if (this.again) {
          this.again = false;
          this.wake();
        }
      });
  }

  /** Stops and waits for what is under way. */
  async stop(): Promise<void> {
    this.stopped = true;
    clearInterval(this.timer);
    await this.running;
  }
}
