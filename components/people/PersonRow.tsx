import { useState } from 'react';
import { View } from 'react-native';
import { Button } from '@/components/ui/Button';
import { ChoiceField } from '@/components/ui/ChoiceField';
import { Plate } from '@/components/ui/Plate';
import { Row } from '@/components/ui/Row';
import { ProblemPlate, type ShownProblem } from '@/components/ui/ProblemPlate';
import { roleMeaning, roleWords } from '@/components/ui/roleWords';
import { Text } from '@/components/ui/Text';
import { space } from '@/components/ui/tokens';
import { STAFF, type Role } from '@/shared/contracts/roles';

export interface PersonRowProps {
  name: string;
  email: string;
  role: Role;
  active: boolean;
  clientName: string | null;
  /** The person signed in: nobody locks themselves out. */
  self: boolean;
  busy: boolean;
  problem: ShownProblem | null;
  onChange: (change: { role?: Role; active?: boolean }) => void;
}

/** A person of the laboratory; opens to change the role or to end the access. */
export function PersonRow({ name, email, role, active, clientName, self, busy, problem, onChange }: PersonRowProps) {
  const [open, setOpen] = useState(false);
  const [ending, setEnding] = useState(false);
  const words = role === 'client' && clientName ? `Client, ${clientName}` : roleWords[role];
  return (
    <View style={{ gap: space.hair }}>
      <Row
        icon="people"
        title={name}
        aside={self ? 'you' : undefined}
        subtitle={`${words}, ${email}`}
        selected={open}
        onPress={() => setOpen(!open)}
        trailing={active ? undefined : <Text tone="ink2">access ended</Text>}
      />
      {open ? (
        <Plate surface="lift">
          <View style={{ gap: space.s, maxWidth: 560 }}>
            {self ? (
              <Text>Your own role and access are changed by another manager.</Text>
            ) : role === 'client' ? (
              <Text>{`A client ${roleMeaning.client}.`}</Text>
            ) : (
              <ChoiceField
                label="Role"
                value={role}
                choices={STAFF.map((one) => ({ value: one, label: roleWords[one] }))}
                hint={`${roleMeaning[role].charAt(0).toUpperCase()}${roleMeaning[role].slice(1)}.`}
                onChange={(next) => onChange({ role: next })}
                disabled={busy}
              />
            )}
            {self ? null : active ? (
              ending ? (
                <View style={{ gap: space.s }}>
                  <Text variant="strong">{`End the access of ${name}? It ends at once; what they measured stays.`}</Text>
                  <View style={{ flexDirection: 'row', gap: space.hair }}>
                    <Button
                      label="End the access"
                      icon="lock"
                      busy={busy}
                      onPress={() => {
                        onChange({ active: false });
                        setEnding(false);
                      }}
                    />
                    <Button label="Leave it" kind="quiet" onPress={() => setEnding(false)} />
                  </View>
                </View>
              ) : (
                <View style={{ alignSelf: 'flex-start' }}>
                  <Button label="End the access" icon="lock" kind="quiet" onPress={() => setEnding(true)} />
                </View>
              )
            ) : (
              <View style={{ alignSelf: 'flex-start' }}>
                <Button
                  label="Give access again"
                  icon="people"
                  busy={busy}
                  onPress={() => onChange({ active: true })}
                />
              </View>
            )}
            {problem ? <ProblemPlate title="Nothing is changed." problem={problem} /> : null}
          </View>
        </Plate>
      ) : null}
    </View>
  );
}
