import { View, type StyleProp, type ViewStyle } from 'react-native';
import { Text } from './Text';
import { fontFamily, radius, space, stroke, target } from './tokens';
import { Touch } from './Touch';
import { useLook } from './useLook';

export interface ViewSwitchProps<V extends string> {
  /** What is switched, for screen readers. */
  label: string;
  views: readonly { value: V; label: string }[];
  value: V;
  onChange: (value: V) => void;
  style?: StyleProp<ViewStyle>;
}

/** Plates side by side; the one chosen is lifted, bold and carries a bar. */
export function ViewSwitch<V extends string>({ label, views, value, onChange, style }: ViewSwitchProps<V>) {
  const { colours, desk } = useLook();
  return (
    <View role="tablist" aria-label={label} style={[{ flexDirection: 'row', gap: space.hair }, style]}>
      {views.map((view) => {
        const chosen = view.value === value;
        return (
          <Touch
            key={view.value}
            role="tab"
            selected={chosen}
            onPress={() => onChange(view.value)}
            style={({ pressed }) => ({
              flexGrow: 1,
              minHeight: desk ? 40 : target.min,
              paddingHorizontal: space.l,
              alignItems: 'center',
              justifyContent: 'center',
              borderRadius: radius.plate,
              backgroundColor: chosen || pressed ? colours.lift : colours.plate,
            })}
          >
            <Text
              tone={chosen ? 'ink0' : 'ink2'}
              style={[{ fontSize: desk ? 13 : 15 }, chosen ? { fontFamily: fontFamily.textBold } : null]}
            >
              {view.label}
            </Text>
            {chosen ? (
              <View
                style={{
                  position: 'absolute',
                  left: 0,
                  right: 0,
                  bottom: 0,
                  height: stroke.bar,
                  backgroundColor: colours.accent,
                }}
              />
            ) : null}
          </Touch>
        );
      })}
    </View>
  );
}
