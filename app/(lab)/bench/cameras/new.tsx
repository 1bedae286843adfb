import { router } from 'expo-router';
import { benchSide } from '@/components/benches/benchSide';
import { CameraForm } from '@/components/benches/CameraForm';
import { useNotice } from '@/components/ui/NoticeProvider';
import { useSaveCamera } from '@/hooks/queries/cameras';
import { useEquipment } from '@/hooks/queries/equipment';
import { useRole } from '@/hooks/session/SessionProvider';

export default function NewCameraScreen() {
  const equipment = useEquipment();
  const mayEdit = useRole() === 'manager';
  const save = useSaveCamera(null);
  const { say } = useNotice();
  return (
    <CameraForm
      camera={null}
      list={benchSide(equipment, mayEdit)}
      onSave={async (body) => {
        const camera = await save.mutateAsync(body);
        say(`${camera.name} is added.`);
        router.replace('/bench');
      }}
    />
  );
}
