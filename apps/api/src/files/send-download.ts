import type { Response } from 'express';

export interface Download {
  name: string;
  mediaType: string;
  bytes: Buffer;
}

/** Sends a file to be saved under its name. It may be of one reader only, so that nothing on the way keeps a copy. */
export function sendDownload(response: Response, { name, mediaType, bytes }: Download): void {
  response.set('Cache-Control', 'no-store').type(mediaType).attachment(name).send(bytes);
}
