import { View } from 'react-native';
import { Row } from '@/components/ui/Row';
import { Text } from '@/components/ui/Text';
import { space } from '@/components/ui/tokens';
import { roleWords } from '@/components/ui/roleWords';
import type { Role } from '@/shared/contracts/roles';

export interface DemoSignInsProps {
  signIns: readonly { role: Role; name: string; email: string; password: string }[];
  inbox: boolean;
  onChoose: (email: string, password: string) => void;
}

/** The people of the demo laboratory: a tap signs in as one of them. Shown in demo mode only. */
export function DemoSignIns({ signIns, inbox, onChoose }: DemoSignInsProps) {
  return (
    <View role="group" aria-label="Demo laboratory" style={{ marginTop: space.xl, gap: space.hair }}>
      {signIns.length > 0 ? (
        <Text variant="small" tone="ink2" style={{ paddingBottom: space.s }}>
          Demo laboratory, all invented. Sign in as
        </Text>
      ) : null}
      {signIns.map((person) => (
        <Row
          key={person.email}
          title={roleWords[person.role]}
          aside={person.name}
          first
          dense
          label={`Sign in as ${roleWords[person.role]} ${person.name}`}
          testID={`demo-${person.role}`}
          onPress={() => onChoose(person.email, person.password)}
        />
      ))}
      {inbox ? <Row title="Mail sent by this demo" dense href="/inbox" /> : null}
    </View>
  );
}
