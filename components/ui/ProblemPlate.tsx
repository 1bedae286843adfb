import { View } from 'react-native';
import { Button } from './Button';
import { Plate } from './Plate';
import { Text } from './Text';
import { space } from './tokens';

export interface ShownProblem {
  message: string;
  /** Number to quote. */
  id?: string | null;
}

export interface ProblemPlateProps {
  /** What did not work: “The lots could not be read.” */
  title: string;
  problem: ShownProblem;
  /** What was kept, or what was lost. */
  kept?: string;
  /** The one button. */
  action?: { label: string; onPress: () => void };
}

/** A fault: what did not work and why, what was kept, a number to quote, one button. */
export function ProblemPlate({ title, problem, kept, action }: ProblemPlateProps) {
  return (
    <Plate surface="lift">
      <View role="alert" style={{ gap: space.s, maxWidth: 520, paddingVertical: space.xs }}>
        <Text variant="strong">{title}</Text>
        <Text>{problem.message}</Text>
        {kept ? <Text>{kept}</Text> : null}
        {problem.id ? (
          <Text variant="small" tone="ink2" selectable>
            {`Number to quote: ${problem.id}`}
          </Text>
        ) : null}
        {action ? (
          <View style={{ alignSelf: 'flex-start', marginTop: space.s }}>
            <Button label={action.label} icon="retry" onPress={action.onPress} />
          </View>
        ) : null}
      </View>
    </Plate>
  );
}
