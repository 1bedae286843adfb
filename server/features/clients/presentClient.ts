import type { Client } from '../../../shared/contracts/lots';
import type { ClientEntity } from '../../entities/ClientEntity';

export function presentClient(client: ClientEntity): Client {
  return { id: client.id, name: client.name, address: client.address, createdAt: client.createdAt.toISOString() };
}
