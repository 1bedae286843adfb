import { Awaited, type AwaitedResult } from '@/components/ui/Awaited';
import type { ScreenSide } from '@/components/ui/Screen';
import type { Bench, Camera, Laser } from '@/shared/contracts/benches';
import { BenchSideList } from './BenchSideList';

export interface Equipment {
  benches: readonly Bench[];
  lasers: readonly Laser[];
  cameras: readonly Camera[];
}

/** The left panel of every Bench screen on a desk. */
export function benchSide(equipment: AwaitedResult<Equipment>, mayEdit: boolean, selectedId?: string): ScreenSide {
  return {
    title: 'Bench',
    width: 320,
    content: (
      <Awaited result={equipment} what="benches, lasers and cameras">
        {(data) => <BenchSideList {...data} mayEdit={mayEdit} selectedId={selectedId} />}
      </Awaited>
    ),
  };
}
