import type { ReactNode } from 'react';
import { View } from 'react-native';
import { Flag } from '@/components/ui/Flag';
import { Plate } from '@/components/ui/Plate';
import { space } from '@/components/ui/tokens';
import { useLook } from '@/components/ui/useLook';
import type { Measured } from '@/shared/contracts/measureResult';
import type { MeasurementDetail } from '@/shared/contracts/measurements';
import { BudgetBars } from './BudgetBars';
import { ShapeSection } from './ShapeSection';
import { ThreeWays } from './ThreeWays';
import { sayFlags } from './words/flagWords';

export interface BeliefProps {
  measurement: MeasurementDetail;
  measured: Measured;
  /** On a phone it stands among these; elsewhere beside the frame. */
  ringTable: ReactNode;
}

/** Why the number can be believed, and what speaks against it: flags, the three ways, the budget, the shape. */
export function Belief({ measurement, measured, ringTable }: BeliefProps) {
  const { desk } = useLook();
  const flags = sayFlags(measurement.flags, measured.budget);
  const { standardUncertaintyUm, expandedUncertaintyUm, coverageFactor } = measured;
  const budget =
    standardUncertaintyUm !== null && expandedUncertaintyUm !== null && coverageFactor !== null ? (
      <BudgetBars
        budget={measured.budget}
        standardUncertaintyUm={standardUncertaintyUm}
        expandedUncertaintyUm={expandedUncertaintyUm}
        coverageFactor={coverageFactor}
        effectiveDegreesOfFreedom={measured.effectiveDegreesOfFreedom}
      />
    ) : null;
  const said =
    flags.length > 0 ? (
      <Plate>
        <View
          role="list"
          aria-label="Flags"
          style={desk ? { flexDirection: 'row', flexWrap: 'wrap', columnGap: 24 } : null}
        >
          {flags.map((flag) => (
            <View key={flag.flag} role="listitem" style={desk ? { flexBasis: '45%', flexGrow: 1 } : null}>
              <Flag title={flag.warning ? `Look: ${flag.name.toLowerCase()}` : flag.name} detail={flag.text} />
            </View>
          ))}
        </View>
      </Plate>
    ) : null;
  if (!desk) {
    return (
      <>
        {said}
        <ThreeWays result={measured} />
        {ringTable}
        {budget}
        <ShapeSection result={measured} />
      </>
    );
  }
  return (
    <>
      {said}
      <View style={{ flexDirection: 'row', gap: space.hair, alignItems: 'stretch' }}>
        <View style={{ flex: 1 }}>{budget}</View>
        <View style={{ flex: 1, gap: space.hair }}>
          <ThreeWays result={measured} />
          <ShapeSection result={measured} />
          <Plate padding="none" style={{ flexGrow: 1 }} />
        </View>
      </View>
    </>
  );
}
