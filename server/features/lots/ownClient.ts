import type { Actor } from '../../http/Actor';
import { ProblemError } from '../../http/ProblemError';

/** The client to whose lots the actor is confined; null: all lots of the laboratory. */
export function ownClient(actor: Actor): string | null {
  if (actor.role !== 'client') return null;
  if (actor.clientId === null) throw new ProblemError('forbidden', 'This access belongs to no client.');
  return actor.clientId;
}
