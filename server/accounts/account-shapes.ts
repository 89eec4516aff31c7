import * as z from 'zod/mini';
import { ROLES } from '../../src/domain/book/bodies/people-bodies';
import { uuid } from '../../src/domain/book/ids';
import { devicePublicKeySchema } from './device-keys';

const role = z.enum(ROLES);
const nonce = z.string().check(z.maxLength(200));
const signature = z.string().check(z.regex(/^[\w-]{86}$/, 'must be 64 bytes in base64url'));
const unixMs = z.int();

export const signInRequestSchema = z.object({
  email: z.string().check(z.minLength(3), z.maxLength(254)),
  password: z.string().check(z.minLength(1), z.maxLength(1000)),
  public_key: devicePublicKeySchema,
  device_name: z.string().check(z.trim(), z.minLength(1), z.maxLength(120)),
  lab: z.optional(uuid),
});
export type SignInRequest = z.infer<typeof signInRequestSchema>;

const session = { access_token: z.string(), expires_ms: unixMs };

export const signInAnswerSchema = z.object({
  ...session,
  person: z.object({ id: uuid, name: z.string() }),
  labs: z.array(z.object({ id: uuid, name: z.string(), role })),
  lab: z.object({ id: uuid, name: z.string(), epoch: uuid }),
  device: z.object({ id: uuid, letter: z.string(), name: z.string() }),
});
export type SignInAnswer = z.infer<typeof signInAnswerSchema>;

export const emptySchema = z.object({});
export const nonceAnswerSchema = z.object({ nonce: z.string(), expires_ms: unixMs });

export const refreshRequestSchema = z.object({ lab: uuid, person: uuid, device: uuid, nonce, signature });
export type RefreshRequest = z.infer<typeof refreshRequestSchema>;
export const refreshAnswerSchema = z.object({ ...session, role });

export const deviceTokenRequestSchema = z.object({ lab: uuid, device: uuid, nonce, signature });
export type DeviceTokenRequest = z.infer<typeof deviceTokenRequestSchema>;
export const deviceTokenAnswerSchema = z.object(session);

export const meAnswerSchema = z.object({
  person: z.object({ id: uuid, name: z.string() }),
  role,
  lab: z.object({ id: uuid, name: z.string(), epoch: uuid }),
  device: z.object({ id: uuid, letter: z.string() }),
});
