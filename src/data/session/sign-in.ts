import * as z from 'zod/mini';
import { uuid } from '../../domain/book/ids';
import type { ApiClient, ApiOutcome } from './api-client';
import { publicJwk } from './device-key';
import type { SignInInput, SignInOutcome } from './session-types';

export const signInAnswerSchema = z.object({
  access_token: z.string(),
  person: z.object({ id: uuid, name: z.string() }),
  lab: z.object({ id: uuid, name: z.string(), epoch: uuid }),
  device: z.object({ id: uuid, letter: z.string(), name: z.string() }),
});
export type SignInAnswer = z.infer<typeof signInAnswerSchema>;

export interface SignInRequest {
  readonly input: SignInInput;
  readonly keys: CryptoKeyPair;
  readonly lab: string | null;
}

/** Signs in and enrols the tablet by its key: a key that the lab knows keeps its tablet and letter. */
export async function askSignIn(
  api: ApiClient,
  subtle: SubtleCrypto,
  { input, keys, lab }: SignInRequest,
): Promise<ApiOutcome<SignInAnswer>> {
  const { email, password, device_name } = input;
  const place = lab === null ? {} : { lab };
  return await api.request({
    method: 'POST',
    path: '/api/accounts/sign-in',
    body: { email, password, device_name, public_key: await publicJwk(subtle, keys), ...place },
    schema: signInAnswerSchema,
  });
}

export function signInRefusal(outcome: Exclude<ApiOutcome<unknown>, { type: 'ok' }>): SignInOutcome {
  if (outcome.type === 'no-network')
    return { type: 'no-network', words: `The first sign-in on a tablet needs the network. ${outcome.words}` };
  const { code, problem, retry_after_s } = outcome;
  const words = problem.detail;
  if (code === 'slow-down') return { type: 'slow-down', words, retry_after_s: retry_after_s ?? 60 };
  if (code === 'revoked') return { type: 'revoked', words };
  return problem.status >= 500 ? { type: 'no-network', words } : { type: 'refused', words };
}
