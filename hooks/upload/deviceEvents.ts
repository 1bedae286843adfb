import { AppState } from 'react-native';

/** Calls back when the network may be back; a native device says so when the application comes to the front. */
export function onNetworkBack(listener: () => void): () => void {
  const subscription = AppState.addEventListener('change', (state) => {
    if (state === 'active') listener();
  });
  return () => subscription.remove();
}

type GuardLeaving = (isBusy: () => boolean) => () => void;

/** Asks before the page is left while `isBusy`; a native application has no page to leave. */
export const guardLeaving: GuardLeaving = () => () => undefined;
