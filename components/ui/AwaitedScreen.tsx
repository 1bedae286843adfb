import type { Href } from 'expo-router';
import type { ReactNode } from 'react';
import { Awaited, type AwaitedResult } from './Awaited';
import { Screen } from './Screen';

export interface AwaitedScreenProps<T> {
  result: AwaitedResult<T>;
  what: string;
  /** Head of the screen until it is there. */
  title: string;
  back: Href;
  children: (data: T) => ReactNode;
}

/** A screen that cannot be drawn before its record is there, such as a form that changes it. */
export function AwaitedScreen<T>({ result, what, title, back, children }: AwaitedScreenProps<T>) {
  if (result.data !== undefined) return <>{children(result.data)}</>;
  return (
    <Screen title={title} back={back}>
      <Awaited result={result} what={what}>
        {children}
      </Awaited>
    </Screen>
  );
}
