import { useCallback, useEffect, useState, type ComponentType } from 'react';
import { Pressable, View } from 'react-native';
import { Text } from '@/components/ui/Text';
import { useLook } from '@/components/ui/useLook';
import { loadSkia } from './loadSkia';

type Loader<P> = () => Promise<ComponentType<P>>;
/** Components that are in already, by their loader: a second drawing of a kind stands at once. */
const ready = new Map<unknown, unknown>();

interface Props<P> {
  /** Imports the component that draws; always the same function for the same component. */
  load: Loader<P>;
  componentProps: P;
  /** Height that the drawing will have, px: its place stands from the start. */
  heightPx?: number;
}

/** Holds the place of a drawing until the drawing engine is there, so that nothing else has to carry it. */
export function SkiaGate<P extends object>({ load, componentProps, heightPx }: Props<P>) {
  const { colours, theme } = useLook();
  const [, setArrived] = useState(0);
  const [state, setState] = useState<'loading' | 'slow' | 'failed'>('loading');
  const [attempt, setAttempt] = useState(0);
  const Drawing = ready.get(load) as ComponentType<P> | undefined;

  useEffect(() => {
    if (ready.has(load)) return undefined;
    let live = true;
    const slow = setTimeout(() => setState((now) => (now === 'loading' ? 'slow' : now)), 2000);
    loadSkia()
      .then(load)
      .then((component) => {
        ready.set(load, component);
        if (live) setArrived((n) => n + 1);
      })
      .catch(() => {
        if (live) setState('failed');
      });
    return () => {
      live = false;
      clearTimeout(slow);
    };
  }, [load, attempt]);

  const retry = useCallback(() => {
    setState('loading');
    setAttempt((n) => n + 1);
  }, []);

  if (Drawing) return <Drawing {...componentProps} />;
  return (
    <View
      aria-busy={state !== 'failed'}
      style={{
        height: heightPx,
        flexGrow: heightPx === undefined ? 1 : 0,
        backgroundColor: theme === 'light' ? colours.plate : colours.gap,
        padding: 16,
      }}
    >
      {state === 'slow' && <Text variant="small">Waiting for the drawing engine, 3 MB the first time.</Text>}
      {state === 'failed' && (
        <Pressable role="button" onPress={retry} style={{ minHeight: 48, justifyContent: 'center' }}>
          <Text variant="small">The drawing engine did not arrive. Touch to try again.</Text>
        </Pressable>
      )}
    </View>
  );
}
