import { randomUUID } from 'node:crypto';
import * as path from 'node:path';
import { Inject, Injectable, mixin, type NestInterceptor, type Type } from '@nestjs/common';
import { FileInterceptor } from '@nestjs/platform-express';
import { diskStorage } from 'multer';
import { Settings } from '../config/settings';
import { problem } from '../http/problem';

/** Text formats may be this large; workbooks are held to less by the reader. */
export const LARGEST_UPLOAD = 200 * 1024 * 1024;

/**
 * Takes one multipart file named `file` straight to the temporary folder, under a name of ours, with every limit of
 * the parser set. What is left there by a broken connection is swept at the next start.
 */
export function ReceivesFile(maxBytes: number = LARGEST_UPLOAD): Type<NestInterceptor> {
  @Injectable()
  class FileReceiver implements NestInterceptor {
    private readonly inner: NestInterceptor;

    constructor(@Inject(Settings) settings: Settings) {
      const Inner = FileInterceptor('file', {
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
      } as Parameters<typeof FileInterceptor>[1]);
      this.inner = new Inner();
    }

    intercept(...args: Parameters<NestInterceptor['intercept']>) {
      return this.inner.intercept(...args);
    }
  }
  return mixin(FileReceiver);
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
  // eslint-disable-next-line no-control-regex -- control characters are what is taken out here
  const shown = path
    .basename(received.originalname.replaceAll('\\', '/'))
    .replace(/[\x00-\x1f\x7f\u202a-\u202e\u2066-\u2069]/g, '');
  return { path: received.path, fileName: shown.slice(0, 200) || 'file' };
}
