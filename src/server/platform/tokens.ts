/**
 * Tokens for links. A token is derived from the session secret and the row it belongs to, so that a message repeats the same
 * link when it is sent again, and the database holds its hash alone.
 */
import { createHash, createHmac } from 'node:crypto';

/** 256 bits in base64url (43 characters) for one purpose and one row. */
export function tokenFor(secret: string, purpose: string, rowId: string): string {
  return createHmac('sha256', secret).update(`heddle link\n${purpose}\n${rowId}`).digest('base64url');
}

export const hashToken = (token: string): string => createHash('sha256').update(token).digest('hex');
