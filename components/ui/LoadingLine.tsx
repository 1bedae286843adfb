import { useEffect, useState } from 'react';
import { View } from 'react-native';
import { Text } from './Text';
import { space } from './tokens';
import { useLook } from './useLook';

export interface LoadingLineProps {
  /** As wide as the number or name will be, px. */
  width?: number;
  /** After two seconds: “Waiting for the lots.” */
  awaited: string;
}

/** A hairline where the number will be; after two seconds it says what is awaited. */
export function LoadingLine({ width = 120, awaited }: LoadingLineProps) {
  const { colours } = useLook();
  const [late, setLate] = useState(false);
  useEffect(() => {
    const timer = setTimeout(() => setLate(true), 2000);
    return () => clearTimeout(timer);
  }, []);
  return (
    <View aria-busy style={{ gap: space.s, minHeight: 24, justifyContent: 'center' }}>
      <View style={{ height: 1, width, maxWidth: '100%', backgroundColor: colours.rule }} />
      {late ? (
        <Text variant="small" tone="ink2" live>
          {`Waiting for ${awaited}.`}
        </Text>
      ) : null}
    </View>
  );
}
