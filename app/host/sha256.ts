import { createHash } from 'node:crypto';

/** Of the text as UTF-8, in hexadecimal. */
export const sha256Of = (text: string) => createHash('sha256').update(text, 'utf8').digest('hex');
