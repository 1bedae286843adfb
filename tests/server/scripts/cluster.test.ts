import { readFileSync, rmSync, writeFileSync, mkdtempSync, chmodSync, statSync } from 'node:fs';
import net from 'node:net';
import path from 'node:path';
import { createDatabase, startCluster, stopCluster, withClient } from '../../../server/scripts/lib/cluster.js';

// Under /tmp itself: as root, PostgreSQL runs as a user that must be able to reach it.
const folder = mkdtempSync('/tmp/ringwright-cluster-');
chmodSync(folder, 0o711);
const home = path.join(folder, 'home');

afterAll(() => {
  stopCluster(home, { immediately: true });
  rmSync(folder, { recursive: true, force: true });
});

test('a new cluster listens on loopback only, without a Unix socket, and keeps its passwords private', async () => {
  const cluster = await startCluster({ home, durable: false });
  expect(cluster.wasRunning).toBe(false);
  await withClient(cluster.clusterUrl('postgres'), async (client) => {
    const show = async (name: string): Promise<string> => (await client.query(`show ${name}`)).rows[0][name];
    expect(await show('listen_addresses')).toBe('127.0.0.1');
    expect(await show('unix_socket_directories')).toBe('');
    expect(await show('password_encryption')).toBe('scram-sha-256');
  });
  expect(statSync(path.join(home, 'cluster.json')).mode & 0o077).toBe(0);
  await expect(
    withClient(cluster.clusterUrl('postgres').replace(/:[^:@]+@/, ':wrong@'), () => Promise.resolve()),
  ).rejects.toThrow(/password authentication failed/);
});

test('the application role reads and writes rows of what the owner creates, and changes nothing else', async () => {
  const cluster = await startCluster({ home, durable: false });
  expect(await createDatabase(cluster, 'trial')).toBe(true);
  expect(await createDatabase(cluster, 'trial')).toBe(false);
  await withClient(cluster.ownerUrl('trial'), async (client) => {
    await client.query('create table thing (id integer primary key)');
  });
  await withClient(cluster.appUrl('trial'), async (client) => {
    await client.query('insert into thing values (1)');
    expect((await client.query('select id from thing')).rows).toEqual([{ id: 1 }]);
    for (const forbidden of ['create table other ()', 'drop table thing', 'truncate thing', 'create schema other']) {
      await expect(client.query(forbidden)).rejects.toThrow(/permission denied|must be owner/);
    }
  });
});

test('a cluster that still runs is taken over; one that was killed is started again with its data', async () => {
  const first = await startCluster({ home, durable: true });
  const again = await startCluster({ home, durable: true });
  expect(again).toMatchObject({ wasRunning: true, port: first.port });

  const pid = Number(readFileSync(path.join(home, 'data', 'postmaster.pid'), 'utf8').split('\n')[0]);
  process.kill(pid, 'SIGKILL');
  const revived = await startCluster({ home, durable: true });
  expect(revived.wasRunning).toBe(false);
  await withClient(revived.appUrl('trial'), async (client) => {
    expect((await client.query('select id from thing')).rows).toEqual([{ id: 1 }]);
  });
});

test('a pid file that names another process is stale, and a taken port is exchanged for another', async () => {
  const before = await startCluster({ home, durable: true });
  stopCluster(home);
  const squatter = net.createServer();
  await new Promise<void>((resolve) => squatter.listen(before.port, '127.0.0.1', resolve));
  writeFileSync(path.join(home, 'data', 'postmaster.pid'), `${process.pid}\n${home}/data\n0\n${before.port}\n`);
  const after = await startCluster({ home, durable: true });
  expect(after.wasRunning).toBe(false);
  expect(after.port).not.toBe(before.port);
  await new Promise((resolve) => squatter.close(resolve));
});

test('data of another PostgreSQL version are left alone, with words on what to do', async () => {
  stopCluster(home);
  const file = path.join(home, 'data', 'PG_VERSION');
  const version = readFileSync(file, 'utf8');
  writeFileSync(file, '9\n');
  await expect(startCluster({ home, durable: true })).rejects.toThrow(/belong to PostgreSQL 9.*postgresql-9/s);
  writeFileSync(file, version);
});
