import { router } from 'expo-router';
import { benchSide } from '@/components/benches/benchSide';
import { LaserForm } from '@/components/benches/LaserForm';
import { useNotice } from '@/components/ui/NoticeProvider';
import { useSaveLaser } from '@/hooks/queries/lasers';
import { useEquipment } from '@/hooks/queries/equipment';
import { useRole } from '@/hooks/session/SessionProvider';

export default function NewLaserScreen() {
  const equipment = useEquipment();
  const mayEdit = useRole() === 'manager';
  const save = useSaveLaser(null);
  const { say } = useNotice();
  return (
    <LaserForm
      laser={null}
      list={benchSide(equipment, mayEdit)}
      onSave={async (body) => {
        const laser = await save.mutateAsync(body);
        say(`${laser.name} is added.`);
        router.replace('/bench');
      }}
    />
  );
}
