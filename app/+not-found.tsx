import { View } from 'react-native';
import { Button } from '@/components/ui/Button';
import { DocumentTitle } from '@/components/ui/DocumentTitle';
import { EmptyState } from '@/components/ui/EmptyState';
import { ScreenHead } from '@/components/ui/ScreenHead';
import { useLook } from '@/components/ui/useLook';

export default function NotFoundScreen() {
  const { colours } = useLook();
  return (
    <View role="main" style={{ flex: 1, backgroundColor: colours.gap }}>
      <DocumentTitle title="No such page" />
      <ScreenHead title="No such page" back="/" level={1} />
      <EmptyState
        sentence="There is nothing at this address. It may have been mistyped, or belong to another laboratory."
        action={<Button label="Go to Today" icon="today" href="/" />}
      />
    </View>
  );
}
