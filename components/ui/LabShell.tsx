import type { ReactNode } from 'react';
import { View } from 'react-native';
import { useSafeAreaInsets } from 'react-native-safe-area-context';
import { useThemeState } from '@/hooks/theme/ThemeProvider';
import { Icon } from './Icon';
import { NoticeLine } from './NoticeLine';
import { OfflineLine } from './OfflineLine';
import { Rail } from './Rail';
import { ShellPlacesProvider, type ShellPlaces } from './ShellContext';
import { Text } from './Text';
import { radius, space, stroke } from './tokens';
import { Touch } from './Touch';
import { useLook } from './useLook';
import { WavelengthRule } from './WavelengthRule';

export interface LabShellProps {
  places: ShellPlaces;
  online: boolean;
  userName: string;
  children: ReactNode;
}

/** Around every screen behind the sign-in: the wavelength rule on top, what is to be said under it, the rail on a desk. */
export function LabShell({ places, online, userName, children }: LabShellProps) {
  const { colours, desk } = useLook();
  const { light } = useThemeState();
  const insets = useSafeAreaInsets();
  return (
    <ShellPlacesProvider places={places}>
      <View
        style={{
          flex: 1,
          minHeight: 0,
          backgroundColor: colours.gap,
          paddingTop: insets.top,
          paddingBottom: insets.bottom,
        }}
      >
        <View role="banner">
          <WavelengthRule wavelengthNm={light.wavelengthNm} benchLabel={light.label} />
          <OfflineLine online={online} />
          <NoticeLine />
        </View>
        <View style={{ flex: 1, minHeight: 0, flexDirection: 'row' }}>
          {desk ? <Rail tools={<RailTools userName={userName} here={places.current === 'account'} />} /> : null}
          <View style={{ flex: 1, minWidth: 0, minHeight: 0 }}>{children}</View>
        </View>
      </View>
    </ShellPlacesProvider>
  );
}

function initialsOf(name: string): string {
  const words = name.trim().split(/\s+/);
  return `${words[0]?.charAt(0) ?? ''}${words.length > 1 ? (words[words.length - 1]?.charAt(0) ?? '') : ''}`.toUpperCase();
}

function RailTools({ userName, here }: { userName: string; here: boolean }) {
  const { colours, theme } = useLook();
  const { setTheme } = useThemeState();
  const corner = { borderTopRightRadius: radius.plate, borderBottomRightRadius: radius.plate };
  const other = theme === 'dark' ? 'light' : 'dark';
  return (
    <View style={{ gap: space.hair }}>
      <Touch
        label={`${theme === 'dark' ? 'Dark' : 'Light'} theme. Change to ${other}`}
        onPress={() => setTheme(other)}
        style={({ pressed }) => ({
          height: 68,
          alignItems: 'center',
          justifyContent: 'center',
          gap: 4,
          backgroundColor: pressed ? colours.lift : colours.plate,
          ...corner,
        })}
      >
        <Icon name="night" colour={colours.ink2} />
        <Text variant="label">{theme === 'dark' ? 'Dark' : 'Light'}</Text>
      </Touch>
      <Touch
        href="/account"
        label={`${initialsOf(userName)}, account of ${userName}`}
        current={here}
        style={({ pressed }) => ({
          height: 60,
          alignItems: 'center',
          justifyContent: 'center',
          backgroundColor: here || pressed ? colours.lift : colours.plate,
          ...corner,
        })}
      >
        {here ? (
          <View
            style={{
              position: 'absolute',
              top: 0,
              bottom: 0,
              left: 0,
              width: stroke.bar,
              backgroundColor: colours.accent,
            }}
          />
        ) : null}
        <Text variant="strong">{initialsOf(userName)}</Text>
      </Touch>
    </View>
  );
}
