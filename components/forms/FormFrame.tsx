import type { ReactNode } from 'react';
import { View } from 'react-native';
import { Button } from '@/components/ui/Button';
import { Plate } from '@/components/ui/Plate';
import { ProblemPlate, type ShownProblem } from '@/components/ui/ProblemPlate';
import { Text } from '@/components/ui/Text';
import { space } from '@/components/ui/tokens';

export interface FormFrameProps {
  /** Why the last attempt did not go through; field errors stand at their fields. */
  problem: ShownProblem | null;
  problemTitle: string;
  /** What was typed before and not saved has been put back. */
  draft?: { restored: boolean; discard: () => void };
  children: ReactNode;
}

/** Around the fields of a form: a draft put back, the fields, the problem. */
export function FormFrame({ problem, problemTitle, draft, children }: FormFrameProps) {
  return (
    <>
      {draft?.restored ? (
        <Plate surface="lift">
          <View style={{ flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', gap: space.m }}>
            <Text style={{ flex: 1, minWidth: 200 }}>What you typed before is back. It is not saved yet.</Text>
            <Button label="Discard it" kind="quiet" dense onPress={draft.discard} />
          </View>
        </Plate>
      ) : null}
      <Plate>
        <View role="form" style={{ gap: space.hair }}>
          {children}
        </View>
      </Plate>
      {problem ? <ProblemPlate title={problemTitle} problem={problem} kept="What you typed is kept." /> : null}
    </>
  );
}
