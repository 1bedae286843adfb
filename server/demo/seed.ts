import { setTimeout as sleep } from 'node:timers/promises';
import { accountEndpoints } from '../../shared/contracts/accounts';
import { benchEndpoints, type Bench } from '../../shared/contracts/benches';
import { captureEndpoints } from '../../shared/contracts/captures';
import { lotEndpoints, type Aperture } from '../../shared/contracts/lots';
import { todayEndpoints } from '../../shared/contracts/today';
import { readConfig } from '../config';
import { DemoCallError, DemoClient } from './DemoClient';
import { demoFrames } from './demoFrames';
import { captures, clientCompany, greenBench, laboratoryName, lots, redBench } from './demoLaboratory';
import { demoPerson, demoSignIns } from './demoSignIns';

const DAY_MS = 86_400_000;
const MAIL_WAIT_MS = 30_000;
const MEASURE_WAIT_MS = 300_000;

/**
 * Fills the demo laboratory through the service itself, as its people would: what is there already is left alone, so
 * that a run that broke off can be begun again.
 */
async function seed(address: string): Promise<void> {
  const manager = await managerOf(address);
  const clientId = await demoClient(manager);
  await people(address, manager, clientId);
  const benches = new Map<string, string>();
  for (const bench of [redBench, greenBench]) benches.set(bench.name, await benchId(manager, bench));
  const apertures = await lotsOf(manager, clientId);

  const technician = new DemoClient(address);
  const { email, password } = demoPerson('technician');
  await technician.signIn(email, password);
  for (const capture of captures) {
    const bench = benches.get(capture.bench.name);
    const aperture = apertures.get(capture.serial);
    if (bench === undefined || aperture === undefined) throw new Error(`The demo has no ${capture.serial}.`);
    await framesOf(technician, capture, aperture.id, bench);
  }
  await allMeasured(technician);
}

async function managerOf(address: string): Promise<DemoClient> {
  const { name, email, password } = demoPerson('manager');
  const manager = new DemoClient(address);
  try {
    await manager.signIn(email, password);
  } catch (error) {
    if (!(error instanceof DemoCallError && error.status === 401)) throw error;
    await manager.call(accountEndpoints.register, { body: { laboratoryName, name, email, password } });
    await manager.signIn(email, password);
  }
  return manager;
}

async function demoClient(manager: DemoClient): Promise<string> {
  const known = (await manager.call(lotEndpoints.clients)).find((client) => client.name === clientCompany.name);
  return (known ?? (await manager.call(lotEndpoints.createClient, { body: clientCompany }))).id;
}

/** Invites whoever is missing; they accept by the link in their mail. */
async function people(address: string, manager: DemoClient, clientId: string): Promise<void> {
  const there = new Set((await manager.call(accountEndpoints.people)).map((person) => person.email));
  for (const { role, name, email, password } of demoSignIns) {
    if (there.has(email)) continue;
    for (const open of await manager.call(accountEndpoints.invitations)) {
      if (open.email !== email) continue;
      await manager.call(accountEndpoints.withdrawInvitation, { params: { invitationId: open.id } });
    }
    const body = { email, role, clientId: role === 'client' ? clientId : null };
    await manager.call(accountEndpoints.invite, { body });
    const token = await tokenFromMail(manager, email);
    await new DemoClient(address).call(accountEndpoints.acceptInvitation, { body: { token, name, password } });
  }
}

async function tokenFromMail(manager: DemoClient, email: string): Promise<string> {
  const end = Date.now() + MAIL_WAIT_MS;
  while (Date.now() < end) {
    const mails = (await manager.call(accountEndpoints.inbox)).filter((mail) => mail.to.includes(email));
    mails.sort((a, b) => b.receivedAt.localeCompare(a.receivedAt));
    const token = /invitation\?token=(\S+)/.exec(mails[0]?.text ?? '')?.[1];
    if (token !== undefined) return decodeURIComponent(token);
    await sleep(200);
  }
  throw new Error(`The invitation of ${email} did not arrive.`);
}

async function benchId(manager: DemoClient, demo: typeof redBench): Promise<string> {
  const named = <Record extends { name: string }>(all: Record[], name: string) => all.find((r) => r.name === name);
  const known: Bench | undefined = named(await manager.call(benchEndpoints.benches), demo.name);
  if (known) return known.id;
  const laser =
    named(await manager.call(benchEndpoints.lasers), demo.laser.name) ??
    (await manager.call(benchEndpoints.createLaser, { body: demo.laser }));
  const camera =
    named(await manager.call(benchEndpoints.cameras), demo.camera.name) ??
    (await manager.call(benchEndpoints.createCamera, { body: demo.camera }));
  const illumination = { kind: 'plane' } as const;
  const revision = { ...demo.revision, laserId: laser.id, cameraId: camera.id, illumination };
  return (await manager.call(benchEndpoints.createBench, { body: { name: demo.name, revision } })).id;
}

/** The lots with their apertures, by serial. */
async function lotsOf(manager: DemoClient, clientId: string): Promise<Map<string, Aperture>> {
  const bySerial = new Map<string, Aperture>();
  const there = await manager.call(lotEndpoints.lots);
  for (const { number, orderReference, dueInDays, apertures } of lots) {
    const dueOn = new Date(Date.now() + dueInDays * DAY_MS).toISOString().slice(0, 10);
    const lotId =
      there.find((lot) => lot.number === number)?.id ??
      (await manager.call(lotEndpoints.createLot, { body: { number, clientId, orderReference, dueOn } })).id;
    let lot = await manager.call(lotEndpoints.lot, { params: { lotId } });
    const missing = apertures.filter(({ serial }) => !lot.apertures.some((known) => known.serial === serial));
    if (missing.length > 0) {
      lot = await manager.call(lotEndpoints.addApertures, { params: { lotId }, body: { apertures: missing } });
    }
    for (const aperture of lot.apertures) bySerial.set(aperture.serial, aperture);
  }
  return bySerial;
}

/** Begins the capture if it is not there and sends the frames that it lacks. */
async function framesOf(
  technician: DemoClient,
  capture: (typeof captures)[number],
  apertureId: string,
  bench: string,
): Promise<void> {
  const begun = await technician.call(captureEndpoints.captures, { query: { apertureId } });
  const body = { apertureId, benchId: bench, note: capture.note ?? '' };
  const captureId =
    begun.find((known) => known.benchId === bench)?.id ??
    (await technician.call(captureEndpoints.createCapture, { body })).id;
  const params = { captureId };
  const frames = await demoFrames(capture);
  const files = frames.map(({ name, kind, sha256 }) => ({ name, kind, sha256 }));
  const { missing } = await technician.call(captureEndpoints.placeKnown, { params, body: { files } });
  for (const { name, kind, sha256, bytes } of frames) {
    if (!missing.includes(sha256)) continue;
    await technician.call(captureEndpoints.upload, { params, body: { kind, sha256 }, file: { name, bytes } });
  }
}

async function allMeasured(technician: DemoClient): Promise<void> {
  const end = Date.now() + MEASURE_WAIT_MS;
  while ((await technician.call(todayEndpoints.today)).running > 0) {
    if (Date.now() > end) throw new Error('The frames of the demo are not measured after five minutes.');
    await sleep(500);
  }
}

seed(readConfig().publicUrl).catch((error: unknown) => {
  process.stderr.write(`The demo could not be filled: ${error instanceof Error ? error.message : String(error)}\n`);
  process.exit(1);
});
