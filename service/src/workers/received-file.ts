import { randomUUID } from 'node:crypto';
import * as fs from 'node:fs/promises';
import * as path from 'node:path';
import {
  type CallHandler,
  type ExecutionContext,
  Inject,
  Injectable,
  mixin,
  type NestInterceptor,
  type Type,
} from '@nestjs/common';
import type { Request, RequestHandler, Response } from 'express';
import multer, { diskStorage, MulterError } from 'multer';
import { defaultIfEmpty, from, lastValueFrom, type Observable } from 'rxjs';
import { Settings } from '../config/settings';
import { problem } from '../http/problem';
import { sizeInWords } from './limits';
import { UploadRefused } from './upload-refused';

/** Text formats may be this large; workbooks are held to less by the reader. */
export const LARGEST_UPLOAD = 200 * 1024 * 1024;

/**
 * Takes one multipart file named `file` straight to the temporary folder, under a name of ours, with every limit of
 * the parser set. Whoever keeps the file moves it away; what still lies there after the answer is removed, whatever
 * the answer was. What a killed process leaves is swept at the next start.
 */
export function ReceivesFile(maxBytes: number = LARGEST_UPLOAD): Type<NestInterceptor> {
  @Injectable()
  class FileReceiver implements NestInterceptor {
    private readonly receive: RequestHandler;

    constructor(@Inject(Settings) settings: Settings) {
      this.receive = multer({
        storage: diskStorage({
          destination: settings.temporaryDir,
          filename: (_request, _file, done) => done(null, randomUUID()),
        }),
        defParamCharset: 'utf8',
        limits: {
          fileSize: maxBytes,
          files: 1,
          fields: 8,
          parts: 10,
          fieldSize: 2 * 1024 * 1024,
          fieldNameSize: 60,
          headerPairs: 20,
        },
      }).single('file');
    }

    async intercept(context: ExecutionContext, next: CallHandler): Promise<Observable<unknown>> {
      const http = context.switchToHttp();
      const request = http.getRequest<Request>();
      await new Promise<void>((resolve, reject) => {
        this.receive(request, http.getResponse<Response>(), (failed?: unknown) =>
          failed ? reject(asRefusal(failed, maxBytes)) : resolve(),
        );
      });
      const answered = lastValueFrom(next.handle().pipe(defaultIfEmpty(undefined)));
      return from(answered.finally(() => removed(request.file)));
    }
  }
  return mixin(FileReceiver);
}

async function removed(file: Express.Multer.File | undefined): Promise<void> {
  if (file) await fs.rm(file.path, { force: true });
}

function asRefusal(failed: unknown, maxBytes: number): Error {
  if (failed instanceof MulterError) {
    if (failed.code !== 'LIMIT_FILE_SIZE') return failed;
    const detail = `${sizeInWords(maxBytes)} are allowed at this address. Leave out what is not needed, or send it in parts.`;
    return new UploadRefused('too-large', detail, maxBytes);
  }
  const told = failed instanceof Error ? failed.message : String(failed);
  return problem(400, 'malformed-upload', 'The upload cannot be read', `${told}. Send it again.`);
}

/** Control characters and path parts do not belong into a name that is shown. */
export function requireFile(received: Express.Multer.File | undefined): { path: string; fileName: string } {
  if (!received) {
    throw problem(
      422,
      'file-missing',
      'There is no file',
      'Send the spreadsheet as the multipart field "file".',
      [{ pointer: '/file', field: 'file', message: 'Send the spreadsheet as the multipart field "file".' }],
    );
  }
  const shown = path
    .basename(received.originalname.replaceAll('\\', '/'))
    // eslint-disable-next-line no-control-regex -- control characters are what is taken out here
    .replace(/[\x00-\x1f\x7f\u202a-\u202e\u2066-\u2069]/g, '');
  return { path: received.path, fileName: shown.slice(0, 200) || 'file' };
}
