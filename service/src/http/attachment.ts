import type { Response } from 'express';

/**
 * Heads of a download: type, names after RFC 6266 (ASCII and UTF-8), the checksum, and never a guess at the type.
 * What has a checksum cannot change, so the checksum is its strong tag.
 */
export function attachment(
  response: Response,
  {
    fileName,
    mediaType,
    sha256,
    bytes,
  }: { fileName: string; mediaType: string; sha256: string; bytes?: number },
): void {
  const ascii =
    fileName
      .normalize('NFKD')
      .replace(/[^\x20-\x7e]/g, '')
      .replace(/["\\/]/g, '_') || 'file';
  const utf8 = encodeURIComponent(fileName).replace(
    /['()*]/g,
    (c) => `%${c.charCodeAt(0).toString(16).toUpperCase()}`,
  );
  response.setHeader('Content-Type', mediaType);
  response.setHeader('Content-Disposition', `attachment; filename="${ascii}"; filename*=UTF-8''${utf8}`);
  response.setHeader('X-Content-Type-Options', 'nosniff');
  response.setHeader('X-Checksum-SHA256', sha256);
  response.setHeader('ETag', `"${sha256}"`);
  response.setHeader('Cache-Control', 'private, no-cache');
  if (bytes !== undefined) response.setHeader('Content-Length', String(bytes));
}
