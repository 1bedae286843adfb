import type { RecordStage } from '@/components/ui/StageGlyph';
import { slotPlace } from '@/components/ui/slotGeometry';
import type { Verdict } from '@/components/ui/VerdictGlyph';
import { refusalName } from '@/components/measurement/words/refusalWords';
import type { Aperture } from '@/shared/contracts/lots';
import { failureReasons, refusalReasons } from '@/shared/contracts/measureResult';

/** What the newest measurement says of an aperture, in a glyph and words. A plain reading of the gap, not a decision. */
export interface ApertureReading {
  stage: RecordStage;
  verdict: Verdict;
  words: string;
  /** Needs a person: stands first. */
  toLookAt: boolean;
}

/** Walls of the slot of an aperture, µm; none where no tolerance is agreed. */
export function apertureLimits(aperture: Pick<Aperture, 'nominalSizeUm' | 'toleranceUm'>): {
  lower: number | null;
  upper: number | null;
} {
  if (aperture.toleranceUm === null) return { lower: null, upper: null };
  return { lower: aperture.nominalSizeUm - aperture.toleranceUm, upper: aperture.nominalSizeUm + aperture.toleranceUm };
}

export function readAperture(aperture: Pick<Aperture, 'nominalSizeUm' | 'toleranceUm' | 'newest'>): ApertureReading {
  const { newest } = aperture;
  if (newest === null) return { stage: 'waiting', verdict: 'open', words: 'to measure', toLookAt: false };
  if (newest.state === 'waiting' || newest.state === 'measuring') {
    return { stage: newest.state, verdict: 'open', words: newest.state, toLookAt: false };
  }
  if (newest.state === 'refused' || newest.state === 'failed') {
    const reason = [...refusalReasons, ...failureReasons].find((known) => known === newest.reason);
    const words = reason === undefined ? newest.state : `${newest.state}: ${refusalName(reason).toLowerCase()}`;
    return { stage: newest.state, verdict: 'refused', words, toLookAt: true };
  }
  if (newest.sizeUm === null)
    return { stage: 'measured', verdict: 'open', words: 'measured, no size', toLookAt: false };
  if (aperture.toleranceUm === null)
    return { stage: 'measured', verdict: 'open', words: 'no tolerance agreed', toLookAt: false };
  const place = slotPlace(apertureLimits(aperture), newest.sizeUm, newest.expandedUncertaintyUm ?? 0);
  if (place === 'inside') return { stage: 'measured', verdict: 'conforms', words: 'within limits', toLookAt: false };
  if (place === 'across') return { stage: 'measured', verdict: 'undecided', words: 'at a limit', toLookAt: true };
  return {
    stage: 'measured',
    verdict: place,
    words: place === 'above' ? 'over the limit' : 'under the limit',
    toLookAt: true,
  };
}
