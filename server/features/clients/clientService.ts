import type { ClientBody } from '../../../shared/contracts/lots';
import { withConstraintProblems } from '../../database/constraintProblems';
import type { Database } from '../../database/Database';
import { inLaboratory, scoped } from '../../database/LaboratoryScope';
import type { ClientEntity } from '../../entities/ClientEntity';
import type { Actor } from '../../http/Actor';
import { found } from '../../http/ProblemError';
import { addClient, changeClient, readClient, readClients } from './clientRepository';

const problems = {
  uq_client_name: {
    type: 'conflict',
    field: 'name',
    message: 'Another client of the laboratory has this name. Choose that one, or add the town to the name.',
  },
} as const;

export type ClientService = ReturnType<typeof createClientService>;

/** Who orders from the laboratory. */
export function createClientService(database: Database) {
  return {
    list: (actor: Actor): Promise<ClientEntity[]> => readClients(scoped(database, actor.laboratoryId)),

    add: (actor: Actor, body: ClientBody): Promise<ClientEntity> =>
      withConstraintProblems(problems, () =>
        inLaboratory(database, actor.laboratoryId, async (laboratory) =>
          found(await readClient(laboratory, await addClient(laboratory, body)), 'client'),
        ),
      ),

    change: (actor: Actor, clientId: string, body: ClientBody): Promise<ClientEntity> =>
      withConstraintProblems(problems, () =>
        inLaboratory(database, actor.laboratoryId, async (laboratory) => {
          await changeClient(laboratory, clientId, body);
          return found(await readClient(laboratory, clientId), 'client');
        }),
      ),
  };
}
