import type { Role } from '../../shared/contracts/roles';

/** Who calls, as the access token says. */
export interface Actor {
  userId: string;
  membershipId: string;
  laboratoryId: string;
  role: Role;
  /** The client whose lots the person may see; only with the role `client`. */
  clientId: string | null;
  /** The session: all refresh tokens that grew from one sign-in. */
  familyId: string;
  /** When the access token ends. */
  until: Date;
}
