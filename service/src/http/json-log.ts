import type { LoggerService } from '@nestjs/common';

export type LogLine = { event: string; level: 'info' | 'warn' | 'error' } & Record<string, unknown>;
export type LogSink = (line: LogLine) => void;

/** One JSON line an event, UTC. JSON escapes line breaks, so no value can forge a second line. */
export const toStandardOutput: LogSink = (line) => {
  process.stdout.write(`${JSON.stringify({ at: new Date().toISOString(), ...line })}\n`);
};

/** The framework's own messages, in the same form; its start-up chatter is left out. */
export class JsonLog implements LoggerService {
  constructor(private readonly sink: LogSink) {}

  log(): void {}

  warn(message: unknown, ...context: unknown[]): void {
    this.sink({ event: 'framework', level: 'warn', message: String(message), context: context.map(String) });
  }

  error(message: unknown, ...context: unknown[]): void {
    this.sink({ event: 'framework', level: 'error', message: String(message), context: context.map(String) });
  }
}
