import { cloneElement, type ReactElement } from 'react';
import { View } from 'react-native';
import type { ButtonProps } from './Button';
import { Plate } from './Plate';
import { space } from './tokens';
import { useLook } from './useLook';

export interface ActionFootProps {
  /** At the left, plain. */
  secondary?: ReactElement<ButtonProps>;
  /** The one lit button. */
  primary: ReactElement<ButtonProps>;
}

/** The foot of a screen: from edge to edge under the thumb on a phone, at the right on a desk. */
export function ActionFoot({ secondary, primary }: ActionFootProps) {
  const { desk } = useLook();
  const height = { minHeight: desk ? 60 : 68 };
  return (
    <View style={{ flexDirection: 'row', gap: space.hair }}>
      {desk ? <Plate style={{ flex: 1 }} /> : null}
      {secondary
        ? cloneElement(secondary, { fullBleed: !desk, style: [height, desk ? { minWidth: 150 } : null] })
        : null}
      {cloneElement(primary, { fullBleed: !desk, style: [height, desk ? { minWidth: 280 } : { flex: 1 }] })}
    </View>
  );
}
