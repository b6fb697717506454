import { createHash, randomBytes } from 'node:crypto';

/** A secret for a cookie or a link: 256 random bits. Only its hash is stored. */
export const newToken = () => randomBytes(32).toString('base64url');
export const hashToken = (token: string) => createHash('sha256').update(token).digest('hex');
