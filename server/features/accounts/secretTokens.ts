import { createHash, randomBytes } from 'node:crypto';

/** A secret of 256 random bits for a cookie or a mailed link. */
export const newSecret = (): string => randomBytes(32).toString('base64url');

/** What is kept of a secret: whoever reads the database cannot use it. Random secrets need no slow hash. */
export const hashSecret = (secret: string): string => createHash('sha256').update(secret).digest('hex');
