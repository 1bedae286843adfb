import { stages, type MeasureResult } from '../../shared/contracts/measureResult';

/** Counts what this worker has done since it started. */
export interface WorkMetrics {
  frameDone(state: 'ready' | 'unusable'): void;
  runDone(result: MeasureResult): void;
  /** The counts in the text format of Prometheus (exposition format 0.0.4). */
  text(now: { children: number; busy: number; queued: Record<string, number> }): string;
}

export function createMetrics(): WorkMetrics {
  const frames = { ready: 0, unusable: 0 };
  const runs = { measured: 0, refused: 0, failed: 0 };
  const seconds = new Map<string, number>();

  return {
    frameDone(state) {
      frames[state] += 1;
    },
    runDone(result) {
      runs[result.status] += 1;
      if (result.status === 'failed' || result.timingsMs === null) return;
      for (const stage of stages) {
        seconds.set(stage, (seconds.get(stage) ?? 0) + result.timingsMs[stage] / 1000);
      }
    },
    text({ children, busy, queued }) {
      const lines: string[] = [];
      const family = (name: string, type: 'counter' | 'gauge', help: string, values: [string, number][]) => {
        lines.push(`# HELP ringwright_${name} ${help}`, `# TYPE ringwright_${name} ${type}`);
        for (const [labels, value] of values) lines.push(`ringwright_${name}${labels} ${value}`);
      };
      const labelled = (label: string, values: Record<string, number>): [string, number][] =>
        Object.entries(values).map(([key, value]) => [`{${label}="${key}"}`, value]);
      family('frames_total', 'counter', 'Frames looked at.', labelled('state', frames));
      family('runs_total', 'counter', 'Measurements ended.', labelled('state', runs));
      family(
        'stage_seconds_total',
        'counter',
        'Time spent in a stage of the engine.',
        labelled('stage', Object.fromEntries(seconds)),
      );
      family('children', 'gauge', 'Child processes.', [['', children]]);
      family('children_busy', 'gauge', 'Child processes with a job.', [['', busy]]);
      family('queued', 'gauge', 'Jobs that wait.', labelled('queue', queued));
      return `${lines.join('\n')}\n`;
    },
  };
}
