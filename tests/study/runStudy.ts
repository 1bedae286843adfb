import { writeFileSync } from 'node:fs';
import { studyFrame, type StudyKind, type StudyOutcome } from './studyFrame';
import { overBound, summarise, warningsOf } from './summarise';

/** Seeds were fixed before the first run. */
const FIRST_SEED = 20_261_201;
const DEFAULT_FRAMES = 2000;
const WORST = 12;
const RUNS: { kind: StudyKind; drawn: boolean; words: string }[] = [
  { kind: 'ideal', drawn: false, words: 'shot, read and rounding noise; bench exact' },
  { kind: 'ideal', drawn: true, words: 'the same; bench drawn from its stated uncertainties' },
  { kind: 'uneven', drawn: false, words: 'uneven pixels, no flat; bench exact' },
  { kind: 'uneven', drawn: true, words: 'uneven pixels, no flat; bench drawn' },
];

function say(line: string): void {
  process.stdout.write(`${line}\n`);
}

/**
 * The engine against the statistical limit: well-posed frames of an independent simulator, shared out evenly over four
 * runs. Arguments: how many frames in all, and a file for one line of JSON a frame.
 */
async function main(): Promise<void> {
  const args = process.argv.slice(2).filter((argument) => argument !== 'study');
  const each = Math.ceil(Number(args[0] ?? DEFAULT_FRAMES) / RUNS.length);
  if (!(each > 0)) throw new Error('The first argument is the number of frames.');
  say(`Study of ${each * RUNS.length} well-posed frames (bound of the size below 0.05 %).`);
  say('Targets: RMS of error over bound ≤ 1.15; 93 to 97 % of the stated intervals hold the truth; no warning.\n');
  const lines: string[] = [];
  for (const [r, { kind, drawn, words }] of RUNS.entries()) {
    const outcomes: StudyOutcome[] = [];
    const started = performance.now();
    let tried = 0;
    while (outcomes.length < each) {
      const outcome = await studyFrame(FIRST_SEED + 100_000 * r + tried++, kind, drawn);
      if (outcome === null) continue;
      outcomes.push(outcome);
      lines.push(JSON.stringify({ kind, drawn, ...outcome }));
    }
    const ms = (performance.now() - started) / tried;
    report(words, drawn, outcomes, tried, ms);
  }
  if (args[1] !== undefined) writeFileSync(args[1], `${lines.join('\n')}\n`);
}

function report(words: string, drawn: boolean, outcomes: StudyOutcome[], tried: number, ms: number): void {
  const s = summarise(outcomes);
  const percent = (share: number) => `${(100 * share).toFixed(1)} %`;
  say(`${words}: ${s.frames} frames of ${tried} drawn, ${ms.toFixed(0)} ms each; ${s.refused} refused`);
  // With the bench drawn the error is the bench's, not the fit's: only the interval is then a test.
  if (!drawn) {
    say(
      `  error over bound, light free          RMS ${s.rmsOfFree.toFixed(2)}  median ${s.medianOfFree.toFixed(2)} (normal: 0.67)`,
    );
    say(
      `  error over bound, light as was stated RMS ${s.rmsOfInformed.toFixed(2)}  median ${s.medianOfInformed.toFixed(2)}`,
    );
  }
  say(
    `  truth within the stated interval ${percent(s.covered)}, ${drawn ? '' : `within 1.96 × the fit's own uncertainty ${percent(s.coveredByFit)}; `}warned ${percent(s.warned)}`,
  );
  const worst = outcomes
    .filter(({ refusal }) => refusal === null)
    .toSorted((a, b) => Math.abs(overBound(b)) - Math.abs(overBound(a)))
    .slice(0, WORST);
  for (const outcome of [...worst, ...outcomes.filter(({ refusal }) => refusal !== null).slice(0, WORST)])
    say(`    ${described(outcome)}`);
  say('');
}

function described(outcome: StudyOutcome): string {
  const { study, bound } = outcome;
  const error =
    outcome.refusal ?? `error ${(100 * outcome.error).toFixed(4)} % = ${overBound(outcome).toFixed(1)} × bound`;
  return [
    `seed ${outcome.seed}: ${error} (bound ${(100 * bound.informed).toFixed(4)}, stated ${(100 * outcome.expanded).toFixed(4)} %)`,
    `N ${study.fresnelNumber.toFixed(2)}, ${study.bitDepth} bits, exposure ${study.exposure.toFixed(2)}, taper ${study.taper.toFixed(2)}`,
    `${study.onRecord ? 'on record' : 'unknown camera'}${warningsOf(outcome)
      .map((flag) => `, ${flag}`)
      .join('')}`,
  ].join('; ');
}

main().catch((error: unknown) => {
  process.stderr.write(`${error instanceof Error ? error.stack : String(error)}\n`);
  process.exit(1);
});
