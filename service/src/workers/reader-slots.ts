/** So many files are read at once; the rest wait their turn, and a waiting one may be called off. */
export class ReaderSlots {
  private readonly waiting: (() => void)[] = [];

  constructor(private free: number) {}

  async run<T>(work: () => Promise<T>, signal?: AbortSignal): Promise<T> {
    await this.enter(signal);
    try {
      return await work();
    } finally {
      this.leave();
    }
  }

  private enter(signal?: AbortSignal): Promise<void> {
    signal?.throwIfAborted();
    if (this.free > 0) {
      this.free -= 1;
      return Promise.resolve();
    }
    return new Promise((resolve, reject) => {
      const turn = (): void => {
        signal?.removeEventListener('abort', giveUp);
        resolve();
      };
      const giveUp = (): void => {
        this.waiting.splice(this.waiting.indexOf(turn), 1);
        reject(signal!.reason as Error);
      };
      signal?.addEventListener('abort', giveUp, { once: true });
      this.waiting.push(turn);
    });
  }

  /** The slot goes straight to the next in line. */
  private leave(): void {
    const next = this.waiting.shift();
    if (next) next();
    else this.free += 1;
  }
}
