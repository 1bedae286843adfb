import type { Stage } from '../../shared/contracts/measureResult';

export interface Timings {
  decode: number;
  calibrate: number;
  centre: number;
  profile: number;
  fit: number;
  total: number;
}

/** Wall-clock time of each stage, ms; tells a listener when a stage begins. */
export class Stopwatch {
  private readonly began = performance.now();
  private readonly spent: Record<Stage, number> = { decode: 0, calibrate: 0, centre: 0, profile: 0, fit: 0 };
  private current: { stage: Stage; since: number } | null = null;

  constructor(private readonly onStage?: (stage: Stage) => void) {}

  begin(stage: Stage): void {
    this.end();
    this.current = { stage, since: performance.now() };
    this.onStage?.(stage);
  }

  timings(): Timings {
    this.end();
    const rounded = Object.fromEntries(
      Object.entries(this.spent).map(([stage, ms]) => [stage, Math.round(ms * 10) / 10]),
    ) as Record<Stage, number>;
    return { ...rounded, total: Math.round((performance.now() - this.began) * 10) / 10 };
  }

  private end(): void {
    if (this.current !== null) this.spent[this.current.stage] += performance.now() - this.current.since;
    this.current = null;
  }
}
