import { View } from 'react-native';
import { Icon } from '@/components/ui/Icon';
import type { IconName } from '@/components/ui/iconDrawings';
import { Text } from '@/components/ui/Text';
import { fontFamily, radius, space, stroke } from '@/components/ui/tokens';
import { Touch } from '@/components/ui/Touch';
import { useLook } from '@/components/ui/useLook';
import type { Tool } from './useViewerState';

const tools: readonly { value: Tool; label: string; icon: IconName }[] = [
  { value: 'tone', label: 'Tone', icon: 'tone' },
  { value: 'levels', label: 'Levels', icon: 'levels' },
  { value: 'rings', label: 'Rings', icon: 'rings' },
  { value: 'line', label: 'Line', icon: 'line' },
  { value: 'mask', label: 'Mask', icon: 'mask' },
];

/** The tools of the viewer at the foot of a phone; the one chosen fills the panel above. */
export function ToolFoot({ tool, onChange }: { tool: Tool; onChange: (tool: Tool) => void }) {
  const { colours } = useLook();
  return (
    <View role="tablist" aria-label="Tools" style={{ flexDirection: 'row', gap: space.hair }}>
      {tools.map(({ value, label, icon }) => {
        const chosen = value === tool;
        return (
          <Touch
            key={value}
            role="tab"
            selected={chosen}
            onPress={() => onChange(value)}
            style={({ pressed }) => ({
              flex: 1,
              height: 66,
              alignItems: 'center',
              justifyContent: 'center',
              gap: 4,
              borderRadius: radius.plate,
              backgroundColor: chosen || pressed ? colours.lift : colours.plate,
            })}
          >
            {chosen ? (
              <View
                style={{
                  position: 'absolute',
                  top: 0,
                  left: 0,
                  right: 0,
                  height: stroke.bar,
                  backgroundColor: colours.accent,
                }}
              />
            ) : null}
            <Icon name={icon} colour={chosen ? colours.ink0 : colours.ink2} />
            <Text
              variant="label"
              tone={chosen ? 'ink0' : 'ink2'}
              style={chosen ? { fontFamily: fontFamily.textBold } : null}
            >
              {label}
            </Text>
          </Touch>
        );
      })}
    </View>
  );
}
