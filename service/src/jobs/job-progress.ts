const WRITE_EVERY_MS = 250;

/** Progress as a runner reports it: never falls, stays within 0 to 1, and is not written more often than needed. */
export class JobProgress {
  private progress = 0;
  private stage = '';
  private writtenAt = 0;

  constructor(
    private readonly signal: AbortSignal,
    private readonly write: (progress: number, stage: string) => Promise<unknown>,
  ) {}

  /** @throws the reason of the signal when the job was cancelled: a runner that reports need not look itself */
  async report(progress: number, stage: string): Promise<void> {
    this.signal.throwIfAborted();
    const newStage = stage !== this.stage;
    this.progress = Math.max(this.progress, Number.isFinite(progress) ? Math.min(1, progress) : 0);
    this.stage = stage;
    if (!newStage && Date.now() - this.writtenAt < WRITE_EVERY_MS) return;
    this.writtenAt = Date.now();
    await this.write(this.progress, stage);
  }
}
