import type { ReactNode } from 'react';
import { LoadingLine } from './LoadingLine';
import { Plate } from './Plate';
import { ProblemPlate } from './ProblemPlate';

/** The part of a query that the four states of a screen need. */
export interface AwaitedResult<T> {
  data: T | undefined;
  error: Error | null;
  refetch: () => unknown;
}

export interface AwaitedProps<T> {
  result: AwaitedResult<T>;
  /** “the lots”; stands in “Waiting for …” and “Could not read …”. */
  what: string;
  isEmpty?: (data: T) => boolean;
  whenEmpty?: ReactNode;
  /** In place of the plain hairline: plates at their final size. */
  whenLoading?: ReactNode;
  children: (data: T) => ReactNode;
}

/** The four states of everything that is read: loading, problem with a way on, empty, content. */
export function Awaited<T>({ result, what, isEmpty, whenEmpty, whenLoading, children }: AwaitedProps<T>) {
  if (result.data !== undefined) {
    return <>{isEmpty?.(result.data) && whenEmpty !== undefined ? whenEmpty : children(result.data)}</>;
  }
  if (result.error) {
    const id = 'id' in result.error && typeof result.error.id === 'string' ? result.error.id : null;
    return (
      <ProblemPlate
        title={`Could not read ${what}.`}
        problem={{ message: result.error.message, id }}
        action={{ label: 'Try again', onPress: () => void result.refetch() }}
      />
    );
  }
  return (
    whenLoading ?? (
      <Plate>
        <LoadingLine width={220} awaited={what} />
      </Plate>
    )
  );
}
