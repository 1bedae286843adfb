import { router, useLocalSearchParams } from 'expo-router';
import { benchSide } from '@/components/benches/benchSide';
import { LaserForm } from '@/components/benches/LaserForm';
import { LaserRecord } from '@/components/benches/LaserRecord';
import { AwaitedScreen } from '@/components/ui/AwaitedScreen';
import { EmptyState } from '@/components/ui/EmptyState';
import { useNotice } from '@/components/ui/NoticeProvider';
import { Screen } from '@/components/ui/Screen';
import { useSaveLaser, useLasers } from '@/hooks/queries/lasers';
import { useEquipment } from '@/hooks/queries/equipment';
import { useRole } from '@/hooks/session/SessionProvider';

export default function LaserScreen() {
  const { laserId } = useLocalSearchParams<{ laserId: string }>();
  const lasers = useLasers();
  const equipment = useEquipment();
  const mayEdit = useRole() === 'manager';
  const save = useSaveLaser(laserId);
  const { say } = useNotice();
  const list = benchSide(equipment, mayEdit, laserId);
  return (
    <AwaitedScreen result={lasers} what="the laser" title="Laser" back="/bench">
      {(all) => {
        const laser = all.find((one) => one.id === laserId);
        if (!laser) {
          return (
            <Screen title="Laser" back="/bench" list={list}>
              <EmptyState sentence="The laboratory has no such laser. Choose one from the list." />
            </Screen>
          );
        }
        if (!mayEdit) return <LaserRecord laser={laser} list={list} />;
        return (
          <LaserForm
            key={laser.id}
            laser={laser}
            list={list}
            onSave={async (body) => {
              await save.mutateAsync(body);
              say(`${body.name} is saved.`);
              router.replace('/bench');
            }}
          />
        );
      }}
    </AwaitedScreen>
  );
}
