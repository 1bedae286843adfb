import { asEntered } from '@/components/measurement/asEntered';
import { leadSentence } from '@/components/measurement/BudgetBars';
import { placesOfUncertainty } from '@/components/measurement/placesOfUncertainty';
import { agreement, waysOf } from '@/components/measurement/ThreeWays';
import { tolerancePosition } from '@/components/measurement/tolerancePosition';
import { sayFlags } from '@/components/measurement/words/flagWords';
import { refusalName, refusalWords } from '@/components/measurement/words/refusalWords';
import { stateWord } from '@/components/measurement/words/stageWords';
import { failureReasons, flags, refusalReasons } from '@/shared/contracts/measureResult';
import { sampleResult } from './sampleResult';

describe('tolerancePosition', () => {
  it('says how far inside or outside, and how the named rule reads it', () => {
    const inside = tolerancePosition(100.37, 0.05, 100, 1);
    expect(inside).toMatchObject({ lower: 99, upper: 101, words: 'inside the tolerance by 0.63\u202fµm' });
    expect(inside.reading).toMatchObject({ place: 'conforms', guardBandUm: expect.closeTo(0.082, 3) });
    expect(inside.reading?.words).toBe('By ISO 14253-1, guard band 0.082\u202fµm: conforms. Not reviewed.');
  });

  it('tells undecided from outside, and the side', () => {
    expect(tolerancePosition(100.98, 0.05, 100, 1).reading?.place).toBe('undecided');
    expect(tolerancePosition(101.42, 0.05, 100, 1)).toMatchObject({
      words: 'outside the tolerance by 0.42\u202fµm',
      reading: { place: 'above' },
    });
    expect(tolerancePosition(98.5, 0.05, 100, 1).reading?.place).toBe('below');
  });

  it('reads nothing without an uncertainty', () => {
    expect(tolerancePosition(100.37, null, 100, 1).reading).toBeNull();
  });
});

describe('three ways', () => {
  it('agree when all lie within the stated uncertainty', () => {
    expect(agreement(waysOf(sampleResult()), 100.37, 0.11)).toBe('All three lie within the stated uncertainty.');
  });

  it('name the one that does not, and whether its own uncertainty explains it', () => {
    const off = (standardUncertaintyUm: number) =>
      waysOf(sampleResult({ secondOpinion: { sizeUm: 100.0, standardUncertaintyUm, reason: null } }));
    expect(agreement(off(0.05), 100.37, 0.11)).toBe('Transform lies 0.37 µm off, outside the stated uncertainty.');
    expect(agreement(off(0.3), 100.37, 0.11)).toContain('within twice its own');
  });

  it('say nothing when there is but one', () => {
    const alone = sampleResult({
      ringSizeUm: null,
      secondOpinion: { sizeUm: null, standardUncertaintyUm: null, reason: 'the pattern is cropped' },
    });
    expect(agreement(waysOf(alone), 100.37, 0.11)).toBeNull();
  });
});

describe('words of a result', () => {
  it('tells what a flag costs where the budget knows it, warnings first', () => {
    const said = sayFlags(['no-flat', 'dust'], sampleResult().budget);
    expect(said.map((flag) => flag.name)).toEqual(['Dust', 'No flat frame']);
    expect(said[1]?.text).toBe('Pixel response is taken as even. Its part of the uncertainty is 0.010\u202fµm.');
    expect(sayFlags(['no-flat'], [])[0]?.text).toBe('Pixel response is taken as even.');
  });

  it('has words for every flag, refusal and failure', () => {
    expect(sayFlags(flags, []).every((flag) => flag.name.length > 0 && flag.text.endsWith('.'))).toBe(true);
    for (const reason of [...refusalReasons, ...failureReasons]) {
      expect(refusalWords(reason).steps.length).toBeGreaterThan(0);
      expect(refusalName(reason)).not.toBe('No size');
    }
  });

  it('names the cause that rules, and whether more frames help', () => {
    expect(leadSentence(sampleResult().budget, 0.0544)).toBe(
      'Distance makes 85\u202f% of it. More frames change nothing here.',
    );
    const [fit] = sampleResult().budget;
    expect(leadSentence([fit!], 0.006)).toBe('Fit makes 100\u202f% of it.');
    expect(leadSentence(sampleResult().budget, 0.2)).toBeNull();
  });

  it('puts the stage in words while it runs', () => {
    expect(stateWord('measuring', 'centre')).toBe('finding the centre');
    expect(stateWord('measuring', null)).toBe('measuring');
    expect(stateWord('waiting', null)).toBe('waits its turn');
  });

  it.each([
    [632.8, '632.8'],
    [500, '500'],
    [0.1 + 0.2, '0.3'],
    [12_500, '12\u202f500'],
  ])('writes %p as it was entered', (value, text) => expect(asEntered(value)).toBe(text));

  it.each([
    [0.22, 2],
    [0.0996, 2],
    [0.109, 2],
    [2.2, 1],
    [22, 0],
    [220, 0],
  ])('ends a number with the uncertainty %p on decimal place %p', (uncertainty, places) =>
    expect(placesOfUncertainty(uncertainty)).toBe(places),
  );
});
