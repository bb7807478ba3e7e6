import type { Response } from 'express';

/** Marks the reply as a file to save under `name`, whatever letters it is spelt in. */
export function sendAsDownload(response: Response, name: string, contentType: string): void {
  // RFC 6266: a plain name for old readers, the exact one encoded beside it.
  const plain = name.replaceAll(/[^\w .()-]/g, '_');
  const exact = encodeURIComponent(name).replaceAll(/['()*]/g, percentEncoded);
  response.setHeader(
    'Content-Disposition',
    `attachment; filename="${plain}"; filename*=UTF-8''${exact}`,
  );
  response.setHeader('Content-Type', contentType);
  response.setHeader('Cache-Control', 'no-store');
}

function percentEncoded(character: string): string {
  return `%${character.charCodeAt(0).toString(16).toUpperCase()}`;
}
