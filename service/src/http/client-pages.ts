import * as fs from 'node:fs';
import * as path from 'node:path';
import {
  static as serveStatic,
  type NextFunction,
  type Request,
  type RequestHandler,
  type Response,
} from 'express';
import { styleNonceOf } from './security-headers';

/** Files of the built client; their names carry a hash of their content, so they never change. */
export function clientAssets(uiDir: string): RequestHandler {
  return serveStatic(path.join(uiDir, 'assets'), {
    index: false,
    redirect: false,
    dotfiles: 'ignore',
    immutable: true,
    maxAge: '1y',
    setHeaders: (response) => response.setHeader('Content-Security-Policy', "default-src 'none'"),
  });
}

/** Other files beside the page, such as its icon; maps and the build's manifest are not for the public. */
export function clientFiles(uiDir: string): RequestHandler {
  return serveStatic(uiDir, { index: false, redirect: false, dotfiles: 'ignore', maxAge: 0 });
}

/** The page itself for every address of the client: what has an extension or lies under /api is not one. */
export function clientPage(uiDir: string): RequestHandler {
  const page = path.join(uiDir, 'index.html');
  return (request: Request, response: Response, next: NextFunction) => {
    const isPage =
      ['GET', 'HEAD'].includes(request.method) && !isApi(request.path) && path.extname(request.path) === '';
    if (!isPage || !fs.existsSync(page)) return next();
    response
      .set('Cache-Control', 'no-cache')
      .type('html')
      .send(withNonce(fs.readFileSync(page, 'utf8'), styleNonceOf(response)));
  };
}

export function isApi(requestPath: string): boolean {
  return requestPath === '/api' || requestPath.startsWith('/api/');
}

/** The client reads `.nonce` of this element and gives it to the style elements that it makes. */
function withNonce(html: string, nonce: string): string {
  return html.replace('<head>', `<head>\n    <meta property="csp-nonce" nonce="${nonce}" />`);
}
