import type { Role } from '../../../shared/contracts/roles';
import type { Database } from '../../database/Database';
import { inLaboratory, scoped } from '../../database/LaboratoryScope';
import type { Actor } from '../../http/Actor';
import { found, ProblemError } from '../../http/ProblemError';
import { lockUser } from '../accounts/accountRepository';
import { revokeMembership } from '../accounts/sessionRepository';
import { changeMembership, lockManagers, readPeople, readPerson, type Person } from './membershipRepository';

export interface PeopleDependencies {
  database: Database;
  now: () => Date;
}

export type PeopleService = ReturnType<typeof createPeopleService>;

const refuse = (field: string, message: string): ProblemError =>
  new ProblemError('conflict', message, { fields: { [field]: message } });

/** The people of a laboratory and what they may do. */
export function createPeopleService({ database, now }: PeopleDependencies) {
  return {
    list: (actor: Actor): Promise<Person[]> => readPeople(scoped(database, actor.laboratoryId)),

    /**
     * Changes a role, ends access or restores it. Ended access ends its sessions; a new role counts from the next
     * access token on. A laboratory keeps at least one manager.
     */
    update(actor: Actor, membershipId: string, change: { role?: Role; active?: boolean }): Promise<Person> {
      return inLaboratory(database, actor.laboratoryId, async (laboratory, transaction) => {
        const managers = await lockManagers(laboratory);
        const person = found(await readPerson(laboratory, membershipId), 'person');
        const role = change.role ?? person.role;
        const active = change.active ?? person.active;
        if (role !== person.role && (role === 'client' || person.role === 'client')) {
          throw refuse('role', 'People of a client stay that. End this access and invite the person again.');
        }
        const staysManager = active && role === 'manager';
        if (managers.length === 1 && managers[0] === membershipId && !staysManager) {
          throw refuse(
            active ? 'role' : 'active',
            'This is the only manager of the laboratory. Make somebody else a manager first.',
          );
        }
        await lockUser(transaction, person.userId);
        await changeMembership(laboratory, membershipId, { role, active });
        if (!active) await revokeMembership(transaction, membershipId, now());
        return { ...person, role, active };
      });
    },
  };
}
