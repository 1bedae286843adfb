import type { ClientBody } from '../../../shared/contracts/lots';
import type { LaboratoryScope } from '../../database/LaboratoryScope';
import { ClientEntity } from '../../entities/ClientEntity';

export const readClients = (laboratory: LaboratoryScope): Promise<ClientEntity[]> =>
  laboratory.find(ClientEntity, { order: { name: 'ASC' } });

export const readClient = (laboratory: LaboratoryScope, id: string): Promise<ClientEntity | null> =>
  laboratory.findOne(ClientEntity, { where: { id } });

export const addClient = (laboratory: LaboratoryScope, body: ClientBody): Promise<string> =>
  laboratory.insert(ClientEntity, body);

export const changeClient = (laboratory: LaboratoryScope, id: string, body: ClientBody): Promise<number> =>
  laboratory.update(ClientEntity, { id }, body);
