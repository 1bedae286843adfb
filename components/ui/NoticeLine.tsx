import { View } from 'react-native';
import { Icon } from './Icon';
import { useNotice } from './NoticeProvider';
import { Text } from './Text';
import { space, target } from './tokens';
import { Touch } from './Touch';
import { useLook } from './useLook';

/** The line under the rule. Readers hear it when it appears. */
export function NoticeLine() {
  const { colours, desk } = useLook();
  const { notice, close } = useNotice();
  const ground = notice?.urgent ? colours.ink1 : colours.lift;
  const ink = notice?.urgent ? colours.gap : colours.ink0;
  return (
    <View role="status" aria-live="polite">
      {notice ? (
        <View
          style={{
            flexDirection: 'row',
            alignItems: 'center',
            backgroundColor: ground,
            marginBottom: space.hair,
            paddingLeft: desk ? 24 : space.l,
          }}
        >
          <Text style={{ flex: 1, color: ink, paddingVertical: space.s }}>{notice.text}</Text>
          <Touch
            label="Close this notice"
            onPress={close}
            style={{ width: target.min, height: target.min, alignItems: 'center', justifyContent: 'center' }}
          >
            <Icon name="close" size={20} colour={ink} />
          </Touch>
        </View>
      ) : null}
    </View>
  );
}
