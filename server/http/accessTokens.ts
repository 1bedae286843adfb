import jwt from 'jsonwebtoken';
import { z } from 'zod';
import { roleSchema } from '../../shared/contracts/roles';
import type { Actor } from './Actor';

/** An access token ends by itself after this, s; every call asks as well whether its access still stands. */
export const ACCESS_TOKEN_SECONDS = 600;

const issuer = 'ringwright';
const claimsSchema = z.object({
  sub: z.uuid(),
  membership: z.uuid(),
  laboratory: z.uuid(),
  role: roleSchema,
  client: z.uuid().nullable(),
  session: z.uuid(),
  exp: z.number().int(),
});

export interface AccessTokens {
  issue(actor: Omit<Actor, 'until'>): string;
  /** Who holds the token, or null when it is forged, ended or not ours. */
  read(token: string): Actor | null;
}

/** Signed access tokens (JSON Web Token, RFC 7519, HMAC with SHA-256). */
export function createAccessTokens(secret: string, seconds = ACCESS_TOKEN_SECONDS): AccessTokens {
  return {
    issue(actor) {
      const claims = {
        membership: actor.membershipId,
        laboratory: actor.laboratoryId,
        role: actor.role,
        client: actor.clientId,
        session: actor.familyId,
      };
      return jwt.sign(claims, secret, { algorithm: 'HS256', issuer, subject: actor.userId, expiresIn: seconds });
    },
    read(token) {
      const claims = claimsSchema.safeParse(verified(token, secret));
      if (!claims.success) return null;
      const { sub, membership, laboratory, role, client, session, exp } = claims.data;
      return {
        userId: sub,
        membershipId: membership,
        laboratoryId: laboratory,
        role,
        clientId: client,
        familyId: session,
        until: new Date(exp * 1000),
      };
    },
  };
}

function verified(token: string, secret: string): unknown {
  try {
    return jwt.verify(token, secret, { algorithms: ['HS256'], issuer });
  } catch {
    return null;
  }
}
