import { View } from 'react-native';
import { Button } from './Button';
import { Text } from './Text';
import { space } from './tokens';

/** Plain text of a mail; every address in it can be pressed. */
export function MailText({ text, onOpen }: { text: string; onOpen: (address: string) => void }) {
  const parts = text.split(/(https?:\/\/[^\s<>"]+)/);
  return (
    <View style={{ gap: space.s }}>
      {parts.map((part, i) =>
        i % 2 === 1 ? (
          <View key={i} style={{ gap: space.xs, alignItems: 'flex-start' }}>
            <Text variant="small" tone="ink2" selectable>
              {part}
            </Text>
            <Button label="Open this link" icon="link" onPress={() => onOpen(part)} />
          </View>
        ) : part.trim() ? (
          <Text key={i} selectable>
            {part.trim()}
          </Text>
        ) : null,
      )}
    </View>
  );
}
