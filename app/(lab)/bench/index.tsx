import { BenchSideList } from '@/components/benches/BenchSideList';
import { benchSide } from '@/components/benches/benchSide';
import { Awaited } from '@/components/ui/Awaited';
import { Screen } from '@/components/ui/Screen';
import { useLook } from '@/components/ui/useLook';
import { BenchDetail } from '@/components/benches/BenchDetail';
import { useBench } from '@/hooks/queries/benches';
import { useChosenBench } from '@/hooks/queries/chosenBench';
import { useEquipment } from '@/hooks/queries/equipment';
import { useRole } from '@/hooks/session/SessionProvider';
import { EmptyState } from '@/components/ui/EmptyState';
import { Button } from '@/components/ui/Button';
import { OpenTo } from '@/components/ui/OpenTo';
import { STAFF } from '@/shared/contracts/roles';

/** A phone shows the list; a desk shows the bench of this device beside it. */
export default function BenchScreen() {
  return (
    <OpenTo roles={STAFF} role={useRole()}>
      <Benches />
    </OpenTo>
  );
}

function Benches() {
  const { desk } = useLook();
  const equipment = useEquipment();
  const { bench, light } = useChosenBench();
  const mayEdit = useRole() === 'manager';
  if (desk && bench) return <ChosenBench benchId={bench.id} />;
  if (desk) {
    return (
      <Screen title="Benches" list={benchSide(equipment, mayEdit)}>
        <Awaited result={equipment} what="the benches">
          {({ lasers, cameras }) => (
            <EmptyState
              sentence={
                mayEdit
                  ? 'No bench yet. A bench is a laser and a camera with the distance between aperture and sensor.'
                  : 'No bench yet. A manager of the laboratory adds it.'
              }
              action={
                !mayEdit ? undefined : lasers.length === 0 ? (
                  <Button label="Add a laser" kind="primary" href="/bench/lasers/new" />
                ) : cameras.length === 0 ? (
                  <Button label="Add a camera" kind="primary" href="/bench/cameras/new" />
                ) : (
                  <Button label="Add a bench" kind="primary" href="/bench/new" />
                )
              }
            />
          )}
        </Awaited>
      </Screen>
    );
  }
  return (
    <Screen title="Bench" {...light}>
      <Awaited result={equipment} what="benches, lasers and cameras">
        {(data) => <BenchSideList {...data} mayEdit={mayEdit} />}
      </Awaited>
    </Screen>
  );
}

function ChosenBench({ benchId }: { benchId: string }) {
  const detail = useBench(benchId);
  const equipment = useEquipment();
  const { bench, choose } = useChosenBench();
  const mayEdit = useRole() === 'manager';
  return (
    <BenchDetail
      detail={detail}
      benchId={benchId}
      list={benchSide(equipment, mayEdit, benchId)}
      mayEdit={mayEdit}
      here={bench?.id === benchId}
      onChoose={() => choose(benchId)}
    />
  );
}
