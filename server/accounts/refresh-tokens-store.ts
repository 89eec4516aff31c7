import type { Database, Transaction } from '../db/database';
import { toInt } from '../db/rows';

export interface RefreshTokenRow {
  readonly lab: string;
  readonly token_sha: string;
  readonly device: string;
  readonly person: string;
  readonly expires_ms: number;
}

export async function insertRefreshToken(
  database: Database | Transaction,
  row: RefreshTokenRow & { readonly issued_ms: number },
): Promise<void> {
  const { lab, token_sha, device, person, issued_ms, expires_ms } = row;
  await database('refresh_tokens').insert({ lab, token_sha, device, person, issued_ms, expires_ms });
}

export async function findRefreshToken(
  database: Database,
  lab: string,
  token_sha: string,
): Promise<RefreshTokenRow | undefined> {
  const row = await database('refresh_tokens')
    .select(
      'refresh_tokens.lab',
      'refresh_tokens.token_sha',
      'refresh_tokens.device',
      'refresh_tokens.person',
      'refresh_tokens.expires_ms',
    )
    .where({ lab, token_sha })
    .first<(Omit<RefreshTokenRow, 'expires_ms'> & { expires_ms: string }) | undefined>();
  return row === undefined ? undefined : { ...row, expires_ms: toInt(row.expires_ms) };
}

export async function noteRefreshTokenUse(
  database: Database,
  { lab, token_sha }: Pick<RefreshTokenRow, 'lab' | 'token_sha'>,
  last_used_ms: number,
): Promise<void> {
  await database('refresh_tokens').where({ lab, token_sha }).update({ last_used_ms });
}

export async function deleteRefreshToken(
  database: Database,
  { lab, token_sha, device, person }: Omit<RefreshTokenRow, 'expires_ms'>,
): Promise<void> {
  await database('refresh_tokens').where({ lab, token_sha, device, person }).delete();
}
