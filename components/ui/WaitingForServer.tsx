import { View } from 'react-native';
import { LoadingLine } from './LoadingLine';
import { ProblemPlate, type ShownProblem } from './ProblemPlate';
import { useLook } from './useLook';

/** Before it is known who is signed in: waiting, or the server does not answer. */
export function WaitingForServer({ problem, onRetry }: { problem: ShownProblem | null; onRetry: () => void }) {
  const { colours } = useLook();
  return (
    <View role="main" style={{ flex: 1, backgroundColor: colours.gap, padding: 24, justifyContent: 'center' }}>
      {problem ? (
        <ProblemPlate
          title="The laboratory’s server does not answer."
          problem={problem}
          action={{ label: 'Try again', onPress: onRetry }}
        />
      ) : (
        <LoadingLine width={180} awaited="the laboratory’s server" />
      )}
    </View>
  );
}
