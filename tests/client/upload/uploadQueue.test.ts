import { createHash } from 'node:crypto';
import { UploadProblem } from '@/hooks/upload/uploadProblem';
import { uploadQueue, unheld, type UploadPort, type UploadQueueOptions } from '@/hooks/upload/uploadQueue';
import { memorySource, TIFF_HEAD } from './memorySource';

const hashOf = (bytes: ArrayLike<number>) => createHash('sha256').update(Uint8Array.from(bytes)).digest('hex');
let salt = 0;
const file = (name: string) => memorySource(name, [...TIFF_HEAD, ++salt, ...Array.from(name, (c) => c.charCodeAt(0))]);
const pause = (ms = 5) => new Promise((resolve) => setTimeout(resolve, ms));

/** A laboratory that keeps what it is sent, and whose every upload waits until it is let go. */
function laboratory() {
  const kept = new Set<string>();
  const order: string[] = [];
  const waiting: { name: string; go: () => void; fail: (cause: Error) => void; progress: (bytes: number) => void }[] =
    [];
  const port: jest.Mocked<UploadPort> = {
    placeKnown: jest.fn(async (files) => files.map((f) => f.sha256).filter((h) => !kept.has(h))),
    send: jest.fn(
      (item, { signal, onProgress }) =>
        new Promise<void>((resolve, reject) => {
          order.push(item.name);
          signal.addEventListener('abort', () => {
            waiting.splice(
              waiting.findIndex((w) => w.name === item.name),
              1,
            );
            reject(new Error('aborted'));
          });
          waiting.push({
            name: item.name,
            progress: onProgress,
            go: () => {
              kept.add(item.sha256);
              resolve();
            },
            fail: reject,
          });
        }),
    ),
    measure: jest.fn(async () => undefined),
  };
  async function letGo(): Promise<void> {
    for (let i = 0; i < 200; i++) {
      await pause(1);
      waiting.splice(0).forEach((w) => w.go());
    }
  }
  return { kept, order, waiting, port, letGo };
}
type Laboratory = ReturnType<typeof laboratory>;
const queueTo = (lab: Laboratory, more: Partial<UploadQueueOptions> = {}) =>
  uploadQueue({ port: lab.port, onHeld: jest.fn(), waitsMs: [20], ...more });
const states = (queue: ReturnType<typeof uploadQueue>) => queue.items().map((item) => `${item.name} ${item.state}`);

describe('uploadQueue', () => {
  it('sends darks before lights, three at a time, and then asks for what was measured without them', async () => {
    const lab = laboratory();
    const queue = queueTo(lab);
    queue.add(['l1.tif', 'dark1.tif', 'l2.tif', 'dark2.tif', 'l3.tif', 'l4.tif'].map(file));
    await pause(60);
    expect(lab.order).toEqual(['dark1.tif', 'dark2.tif']);
    lab.waiting.splice(0).forEach((w) => w.go());
    await pause(30);
    expect(lab.order).toEqual(['dark1.tif', 'dark2.tif', 'l1.tif', 'l2.tif', 'l3.tif']);
    expect(lab.port.measure).not.toHaveBeenCalled();
    await lab.letGo();
    expect(states(queue).every((s) => s.endsWith('stored'))).toBe(true);
    expect(lab.port.measure).toHaveBeenCalledTimes(1);
  });

  it('does not ask for measurements after lights alone: those are measured by themselves', async () => {
    const lab = laboratory();
    const queue = queueTo(lab);
    queue.add([file('a.tif')]);
    await lab.letGo();
    expect(states(queue)).toEqual(['a.tif stored']);
    expect(lab.port.measure).not.toHaveBeenCalled();
  });

  it('skips what the laboratory holds: the same files chosen again after a break send only the rest', async () => {
    const lab = laboratory();
    const files = ['a.tif', 'b.tif', 'c.tif'].map(file);
    const first = queueTo(lab, { parallel: 1 });
    first.add(files);
    await pause(40);
    lab.waiting.splice(0).forEach((w) => w.go());
    await pause(10);
    first.cancelAll();
    expect(lab.kept.size).toBe(1);

    const again = queueTo(lab);
    again.add(files);
    await lab.letGo();
    expect(states(again)).toEqual(['a.tif known', 'b.tif stored', 'c.tif stored']);
    expect(lab.order.filter((name) => name === 'a.tif')).toHaveLength(1);
  });

  it('sends the same bytes once, and the second one when the first is taken back', async () => {
    const lab = laboratory();
    const queue = queueTo(lab);
    const one = memorySource('one.tif', [...TIFF_HEAD, 250, 251]);
    const two = memorySource('two.tif', [...TIFF_HEAD, 250, 251]);
    queue.add([one, two]);
    await pause(40);
    expect(states(queue)).toEqual(['one.tif sending', 'two.tif known']);
    queue.cancel(queue.items()[0]!.id);
    await lab.letGo();
    expect(states(queue)).toEqual(['one.tif cancelled', 'two.tif stored']);
    expect(lab.kept).toEqual(new Set([hashOf([...TIFF_HEAD, 250, 251])]));
  });

  it('keeps files while there is no network and sends them by itself when it is back', async () => {
    const lab = laboratory();
    let network = false;
    lab.port.placeKnown.mockImplementation(async (files) => {
      if (!network) throw new UploadProblem('network', 'No network.');
      return files.map((f) => f.sha256);
    });
    const queue = queueTo(lab);
    queue.add(['a.tif', 'b.tif', 'c.tif'].map(file));
    await pause(60);
    expect(unheld(queue.items())).toHaveLength(3);
    expect(queue.items().some((item) => item.state === 'offline')).toBe(true);
    network = true;
    await lab.letGo();
    expect(states(queue)).toEqual(['a.tif stored', 'b.tif stored', 'c.tif stored']);
  });

  it('takes an upload up again that the network broke off', async () => {
    const lab = laboratory();
    const queue = queueTo(lab);
    queue.add([file('a.tif')]);
    await pause(40);
    lab.waiting.splice(0).forEach((w) => w.fail(new UploadProblem('network', 'No network.')));
    await pause(2);
    expect(states(queue)).toEqual(['a.tif offline']);
    await lab.letGo();
    expect(states(queue)).toEqual(['a.tif stored']);
  });

  it('wakes at once when told that the network is back', async () => {
    const lab = laboratory();
    const queue = queueTo(lab, { waitsMs: [60_000] });
    queue.add([file('a.tif')]);
    await pause(40);
    lab.waiting.splice(0).forEach((w) => w.fail(new UploadProblem('network', 'No network.')));
    await pause(20);
    expect(lab.waiting).toHaveLength(0);
    queue.wake();
    await pause(20);
    expect(lab.waiting).toHaveLength(1);
    queue.cancelAll();
  });

  it('gives up on a server that keeps failing, says why, and tries again when asked', async () => {
    const lab = laboratory();
    const queue = queueTo(lab, { waitsMs: [1], busyAttempts: 3 });
    lab.port.send.mockRejectedValue(new UploadProblem('busy', 'The server had a fault. Number 12.'));
    queue.add([file('a.tif')]);
    await pause(120);
    expect(queue.items()[0]).toMatchObject({
      state: 'failed',
      attempts: 3,
      problem: 'The server had a fault. Number 12.',
    });
    lab.port.send.mockResolvedValue(undefined);
    queue.retry(queue.items()[0]!.id);
    await pause(40);
    expect(states(queue)).toEqual(['a.tif stored']);
  });

  it('does not send again what was refused, and a refused dark does not hold up the lights', async () => {
    const lab = laboratory();
    const queue = queueTo(lab);
    queue.add([file('dark.tif'), file('light.tif')]);
    await pause(40);
    lab.waiting.splice(0).forEach((w) => w.fail(new UploadProblem('refused', 'Not a frame.')));
    await lab.letGo();
    expect(states(queue)).toEqual(['dark.tif failed', 'light.tif stored']);
    expect(lab.order).toEqual(['dark.tif', 'light.tif']);
  });

  it('cancels one file while it is sent and goes on with the next', async () => {
    const lab = laboratory();
    const queue = queueTo(lab, { parallel: 1 });
    queue.add([file('a.tif'), file('b.tif')]);
    await pause(40);
    queue.cancel(queue.items()[0]!.id);
    await lab.letGo();
    expect(states(queue)).toEqual(['a.tif cancelled', 'b.tif stored']);
    expect(lab.kept.size).toBe(1);
  });

  it('never sends what cannot be measured, and says why', async () => {
    const lab = laboratory();
    const queue = queueTo(lab);
    queue.add([memorySource('notes.txt', [1, 2, 3])]);
    await pause(20);
    expect(queue.items()[0]).toMatchObject({ state: 'unfit', problem: expect.stringContaining('Send TIFF') });
    expect(lab.port.placeKnown).not.toHaveBeenCalled();
    queue.dismiss(queue.items()[0]!.id);
    expect(queue.items()).toHaveLength(0);
  });

  it('tells how far an upload is and how long it will take', async () => {
    const lab = laboratory();
    let time = 0;
    const queue = queueTo(lab, { now: () => time });
    queue.add([memorySource('a.tif', [...TIFF_HEAD, ...new Array<number>(996).fill(7)])]);
    await pause(40);
    time = 2000;
    lab.waiting[0]!.progress(400);
    expect(queue.items()[0]).toMatchObject({ state: 'sending', part: 0.4, secondsLeft: expect.closeTo(3, 6) });
    await lab.letGo();
  });

  it('sends a frame as what a person says it is', async () => {
    const lab = laboratory();
    const queue = queueTo(lab);
    queue.add([file('dark-looking.tif')]);
    queue.setKind(queue.items()[0]!.id, 'light');
    await lab.letGo();
    expect(lab.port.send.mock.calls[0]![0].kind).toBe('light');
  });
});
