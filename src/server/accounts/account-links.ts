import { randomUUID } from 'node:crypto';
import type { Role, TokenPurpose } from '../../../shared/accounts/accounts-contract';
import { hashToken, tokenFor, type Context } from '../platform';
import type { LinkRef } from '../messages';
import { insertToken } from './accounts-queries';

const HOUR = 3_600_000;
const LIFE: Record<TokenPurpose, number> = {
  'confirm-address': 48 * HOUR,
  'reset-password': HOUR,
  invitation: 14 * 24 * HOUR,
};
const PAGE: Record<TokenPurpose, string> = {
  'confirm-address': '/accounts/confirm/:token',
  'reset-password': '/accounts/reset/:token',
  invitation: '/accounts/invitation/:token',
};

export interface AccountLink {
  rowId: string;
  token: string;
  ref: LinkRef;
  hours: number;
}

/** Makes a single-use link; the database keeps its hash, the message its row. */
export async function createLink(
  tx: Context,
  purpose: TokenPurpose,
  personId: string | null,
  roles: Role[] = [],
): Promise<AccountLink> {
  const rowId = randomUUID();
  const token = tokenFor(tx.settings.sessionSecret, purpose, rowId);
  const now = tx.now();
  await insertToken(tx.db, {
    id: rowId,
    personId,
    purpose,
    roles,
    tokenHash: hashToken(token),
    createdAt: now,
    expiresAt: new Date(now.getTime() + LIFE[purpose]),
  });
  return { rowId, token, ref: { path: PAGE[purpose], purpose, rowId }, hours: LIFE[purpose] / HOUR };
}
