import { router, useLocalSearchParams } from 'expo-router';
import { benchSide } from '@/components/benches/benchSide';
import { CameraForm } from '@/components/benches/CameraForm';
import { CameraRecord } from '@/components/benches/CameraRecord';
import { AwaitedScreen } from '@/components/ui/AwaitedScreen';
import { EmptyState } from '@/components/ui/EmptyState';
import { useNotice } from '@/components/ui/NoticeProvider';
import { Screen } from '@/components/ui/Screen';
import { useSaveCamera, useCameras } from '@/hooks/queries/cameras';
import { useEquipment } from '@/hooks/queries/equipment';
import { useRole } from '@/hooks/session/SessionProvider';

export default function CameraScreen() {
  const { cameraId } = useLocalSearchParams<{ cameraId: string }>();
  const cameras = useCameras();
  const equipment = useEquipment();
  const mayEdit = useRole() === 'manager';
  const save = useSaveCamera(cameraId);
  const { say } = useNotice();
  const list = benchSide(equipment, mayEdit, cameraId);
  return (
    <AwaitedScreen result={cameras} what="the camera" title="Camera" back="/bench">
      {(all) => {
        const camera = all.find((one) => one.id === cameraId);
        if (!camera) {
          return (
            <Screen title="Camera" back="/bench" list={list}>
              <EmptyState sentence="The laboratory has no such camera. Choose one from the list." />
            </Screen>
          );
        }
        if (!mayEdit) return <CameraRecord camera={camera} list={list} />;
        return (
          <CameraForm
            key={camera.id}
            camera={camera}
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
