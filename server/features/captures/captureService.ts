import type { z } from 'zod';
import type {
  Capture,
  captureEndpoints,
  CaptureDetail,
  CaptureFrame,
  FrameKind,
} from '../../../shared/contracts/captures';
import {
  measurementSettingsSchema,
  type MeasurementSettings,
  type SettingsChange,
} from '../../../shared/contracts/measurements';
import { withConstraintProblems, type ConstraintProblem } from '../../database/constraintProblems';
import type { Database, Transaction } from '../../database/Database';
import { inLaboratory, scoped, type LaboratoryScope } from '../../database/LaboratoryScope';
import type { Actor } from '../../http/Actor';
import { found, ProblemError } from '../../http/ProblemError';
import type { Queue } from '../../worker/queue/createQueue';
import { publishProgress } from '../events/publishProgress';
import type { ReceivedFrame } from '../frames/createFrameReader';
import { addRun } from '../measurements/addRun';
import { readMeasurements } from '../measurements/readMeasurements';
import {
  addCapture,
  addPlace,
  changePlace,
  currentRevision,
  findStoredFrame,
  lockCapture,
  readCaptures,
  readLights,
  readPlaces,
  readSizes,
  readWaitingRuns,
  type CaptureFilter,
} from './captureRepository';
import { isOutdated, lightsToMeasure, wantsFirstRun } from './lightsToMeasure';
import { presentCapture, presentMean, presentPlace } from './presentCapture';

export interface CaptureDependencies {
  database: Database;
  queue: Queue;
}

type NewCapture = z.output<(typeof captureEndpoints)['createCapture']['body']>;
type KnownFiles = z.output<(typeof captureEndpoints)['placeKnown']['body']>['files'];

/** A frame that has just come into a capture. */
interface Arrival {
  captureId: string;
  frameId: string;
  kind: FrameKind;
  name: string;
}

export type CaptureService = ReturnType<typeof createCaptureService>;

const noAperture: ConstraintProblem = {
  type: 'invalid',
  field: 'apertureId',
  message: 'Choose an aperture of the laboratory.',
};

/** Captures and the frames in them. A light is measured by itself as soon as it is there. */
export function createCaptureService({ database, queue }: CaptureDependencies) {
  async function detail(laboratory: LaboratoryScope, captureId: string): Promise<CaptureDetail> {
    const [row] = await readCaptures(laboratory, { id: captureId });
    const capture = presentCapture(found(row, 'capture'));
    const measurements = await readMeasurements(laboratory, { captureId, newestOnly: true });
    const newest = new Map(measurements.map((measurement) => [measurement.captureFrameId, measurement]));
    const places = await readPlaces(laboratory, captureId);
    const lights = await readLights(laboratory, captureId);
    const darks = places.filter(isUsableDark).length;
    return {
      ...capture,
      frames: places.map((place) => presentPlace(place, newest.get(place.id) ?? null)),
      mean: presentMean(await readSizes(laboratory, captureId)),
      outdatedCount: lights.filter((light) => isOutdated(light, darks)).length,
    };
  }

  async function onePlace(laboratory: LaboratoryScope, captureId: string, placeId: string): Promise<CaptureFrame> {
    const [place] = await readPlaces(laboratory, captureId, placeId);
    const measurements = await readMeasurements(laboratory, { captureId, newestOnly: true });
    const newest = measurements.find((measurement) => measurement.captureFrameId === placeId);
    return presentPlace(found(place, 'frame in this capture'), newest ?? null);
  }

  /** Settings of a first run: the model of the aperture's kind, everything else found out. */
  async function defaultSettings(laboratory: LaboratoryScope, captureId: string): Promise<MeasurementSettings> {
    const [row] = await readCaptures(laboratory, { id: captureId });
    return measurementSettingsSchema.parse({ pattern: found(row, 'capture').apertureKind });
  }

  /** Gives a frame its place; a light that is new here gets its first run. Returns the place. */
  async function place(
    laboratory: LaboratoryScope,
    transaction: Transaction,
    actor: Actor,
    { captureId, frameId, kind, name }: Arrival,
  ): Promise<string> {
    const createdBy = actor.userId;
    const { id, isNew } = await addPlace(laboratory, { captureId, frameId, kind, name, createdBy });
    if (isNew) {
      await publishProgress(transaction, laboratory.laboratoryId, [
        { type: 'frame', captureId, captureFrameId: id, frameId, state: 'placed' },
      ]);
    }
    if (isNew && kind === 'light') {
      const settings = await defaultSettings(laboratory, captureId);
      await addRun(laboratory, transaction, queue, { captureId, captureFrameId: id, frameId, settings, createdBy });
    }
    return id;
  }

  return {
    async list(actor: Actor, filter: CaptureFilter): Promise<Capture[]> {
      return (await readCaptures(scoped(database, actor.laboratoryId), filter)).map(presentCapture);
    },

    get: (actor: Actor, captureId: string): Promise<CaptureDetail> =>
      detail(scoped(database, actor.laboratoryId), captureId),

    /** Begins a capture on the revision that the bench has now. */
    add: (actor: Actor, { apertureId, benchId, note }: NewCapture): Promise<CaptureDetail> =>
      withConstraintProblems({ fk_capture_aperture_id: noAperture }, () =>
        inLaboratory(database, actor.laboratoryId, async (laboratory) => {
          const benchRevisionId = await currentRevision(laboratory, benchId);
          if (benchRevisionId === null) {
            const message = 'Choose a bench of the laboratory.';
            throw new ProblemError('invalid', message, { fields: { benchId: message } });
          }
          const id = await addCapture(laboratory, { apertureId, benchRevisionId, note, createdBy: actor.userId });
          return detail(laboratory, id);
        }),
      ),

    /** Refuses an upload into a capture that is not there, before its first byte is taken. */
    async requireCapture(laboratoryId: string, captureId: string): Promise<void> {
      const [row] = await readCaptures(scoped(database, laboratoryId), { id: captureId });
      found(row, 'capture');
    },

    /** Ends an upload: the frame gets its place in the transaction in which its bytes were written. */
    async receive(actor: Actor, captureId: string, kind: FrameKind, file: ReceivedFrame): Promise<CaptureFrame> {
      const { open, written, name } = file;
      try {
        const laboratory = scoped(open.transaction, actor.laboratoryId);
        found(await lockCapture(laboratory, captureId), 'capture');
        if (written.isNew) await queue.send(open.transaction, 'inspect-frame', written.frameId);
        const arrival = { captureId, frameId: written.frameId, kind, name };
        const placeId = await place(laboratory, open.transaction, actor, arrival);
        const answer = await onePlace(laboratory, captureId, placeId);
        await open.commit();
        return answer;
      } finally {
        await open.rollBack();
      }
    },

    /** Places the frames whose bytes the laboratory holds; returns the hashes of those still to be sent. */
    placeKnown: (actor: Actor, captureId: string, files: KnownFiles): Promise<string[]> =>
      inLaboratory(database, actor.laboratoryId, async (laboratory, transaction) => {
        found(await lockCapture(laboratory, captureId), 'capture');
        const missing = new Set<string>();
        for (const { name, kind, sha256 } of files) {
          const frameId = await findStoredFrame(laboratory, sha256);
          if (frameId === null) missing.add(sha256);
          else await place(laboratory, transaction, actor, { captureId, frameId, kind, name });
        }
        return [...missing];
      }),

    /**
     * Changes what a frame is, or leaves it out. What becomes a light without a run gets its first one. Runs that
     * waited for the frame to be looked at may have nothing to wait for now: they are queued.
     */
    updatePlace: (
      actor: Actor,
      captureId: string,
      placeId: string,
      change: { kind?: FrameKind | undefined; leftOut?: boolean | undefined },
    ): Promise<CaptureFrame> =>
      inLaboratory(database, actor.laboratoryId, async (laboratory, transaction) => {
        found(await lockCapture(laboratory, captureId), 'capture');
        await changePlace(laboratory, captureId, placeId, change);
        const { frameId, state } = await onePlace(laboratory, captureId, placeId);
        const light = (await readLights(laboratory, captureId)).find((each) => each.captureFrameId === placeId);
        if (light !== undefined && wantsFirstRun(light)) {
          const settings = await defaultSettings(laboratory, captureId);
          const run = { captureId, captureFrameId: placeId, frameId, settings, createdBy: actor.userId };
          await addRun(laboratory, transaction, queue, run);
        }
        if (state === 'stored') {
          for (const id of await readWaitingRuns(laboratory, captureId)) {
            await queue.send(transaction, 'run-measurement', id);
          }
        }
        await publishProgress(transaction, actor.laboratoryId, [
          { type: 'frame', captureId, captureFrameId: placeId, frameId, state: 'changed' },
        ]);
        return onePlace(laboratory, captureId, placeId);
      }),

    /** Adds a run for every light that wants one; returns how many. */
    measure: (actor: Actor, captureId: string, change: SettingsChange): Promise<number> =>
      inLaboratory(database, actor.laboratoryId, async (laboratory, transaction) => {
        found(await lockCapture(laboratory, captureId), 'capture');
        const darks = (await readPlaces(laboratory, captureId)).filter(isUsableDark).length;
        const lights = await readLights(laboratory, captureId);
        const wanted = lightsToMeasure(lights, darks, await defaultSettings(laboratory, captureId), change);
        for (const light of wanted) {
          await addRun(laboratory, transaction, queue, { captureId, ...light, createdBy: actor.userId });
        }
        return wanted.length;
      }),
  };
}

const isUsableDark = (frame: { kind: FrameKind; leftOut: boolean; state: string }): boolean =>
  frame.kind === 'dark' && !frame.leftOut && frame.state !== 'unusable';
