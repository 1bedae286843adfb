import type { Href } from 'expo-router';
import { Icon } from './Icon';
import type { IconName } from './iconDrawings';
import { radius, target } from './tokens';
import { Touch } from './Touch';
import { useLook } from './useLook';

export interface IconButtonProps {
  icon: IconName;
  /** What it does, for those who do not see the drawing. */
  label: string;
  onPress?: () => void;
  href?: Href;
  disabled?: boolean;
  /** On: drawn in ink0 on lift. */
  on?: boolean;
}

/** A drawing that does something, 48 px square. */
export function IconButton({ icon, label, onPress, href, disabled, on }: IconButtonProps) {
  const { colours } = useLook();
  return (
    <Touch
      onPress={onPress}
      href={href}
      label={label}
      disabled={disabled}
      style={({ pressed }) => ({
        width: target.min,
        height: target.min,
        alignItems: 'center',
        justifyContent: 'center',
        borderRadius: radius.plate,
        backgroundColor: pressed || on ? colours.lift : 'transparent',
      })}
    >
      <Icon name={icon} colour={disabled ? colours.ink3 : on ? colours.ink0 : colours.ink1} />
    </Touch>
  );
}
