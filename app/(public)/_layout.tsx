import { Slot } from 'expo-router';
import { View } from 'react-native';
import { NoticeLine } from '@/components/ui/NoticeLine';
import { useLook } from '@/components/ui/useLook';

/** Pages that anybody may open. */
export default function PublicLayout() {
  const { colours } = useLook();
  return (
    <View style={{ flex: 1, backgroundColor: colours.gap }}>
      <NoticeLine />
      <Slot />
    </View>
  );
}
