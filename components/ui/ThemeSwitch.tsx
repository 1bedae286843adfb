import { View } from 'react-native';
import { useThemeState } from '@/hooks/theme/ThemeProvider';
import { Plate } from './Plate';
import { Text } from './Text';
import { space } from './tokens';
import { ViewSwitch } from './ViewSwitch';

/** Dark for the bench with the lights off, light for the desk; remembered on this device. */
export function ThemeSwitch() {
  const { theme, setTheme } = useThemeState();
  return (
    <Plate>
      <View style={{ gap: space.s }}>
        <Text variant="small" tone="ink2">
          Theme on this device
        </Text>
        <ViewSwitch
          label="Theme"
          views={[
            { value: 'dark', label: 'Dark bench' },
            { value: 'light', label: 'Light desk' },
          ]}
          value={theme}
          onChange={setTheme}
        />
      </View>
    </Plate>
  );
}
