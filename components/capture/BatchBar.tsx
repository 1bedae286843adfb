import { View } from 'react-native';
import { Button } from '@/components/ui/Button';
import { Text } from '@/components/ui/Text';
import { radius, space } from '@/components/ui/tokens';
import { useLook } from '@/components/ui/useLook';

const frames = (count: number) => (count === 1 ? '1 frame' : `${count} frames`);

export interface BatchBarProps {
  /** Files still on their way by themselves. */
  workingCount: number;
  /** Of these, kept here because there is no network. */
  keptCount: number;
  onCancelAll: () => void;
  onTryNow: () => void;
}

/** What is on its way as a whole, and how to call it off. Nothing where nothing is. */
export function BatchBar({ workingCount, keptCount, onCancelAll, onTryNow }: BatchBarProps) {
  const { colours, desk } = useLook();
  if (workingCount === 0) return null;
  const device = desk ? 'in this window' : 'on this phone';
  const words =
    keptCount > 0
      ? `No network. ${frames(keptCount)} kept ${device}; ${keptCount === 1 ? 'it goes out by itself' : 'they go out by themselves'}.`
      : `${frames(workingCount)} on the way. Leave this page open until they have arrived.`;
  return (
    <View
      role="status"
      style={{
        backgroundColor: keptCount > 0 ? colours.lift : colours.plate,
        borderRadius: radius.plate,
        flexDirection: 'row',
        alignItems: 'center',
        flexWrap: 'wrap',
        gap: space.s,
        paddingLeft: desk ? 20 : space.l,
        paddingRight: 8,
        paddingVertical: 4,
      }}
    >
      <Text
        variant="small"
        tone="ink0"
        live
        style={{ flexGrow: 1, flexShrink: 1, flexBasis: !desk && keptCount > 0 ? '90%' : 180 }}
      >
        {words}
      </Text>
      <View style={{ flexDirection: 'row', gap: space.hair }}>
        {keptCount > 0 ? <Button dense kind="quiet" label="Try now" onPress={onTryNow} /> : null}
        <Button dense kind="quiet" label="Call off all" onPress={onCancelAll} />
      </View>
    </View>
  );
}
