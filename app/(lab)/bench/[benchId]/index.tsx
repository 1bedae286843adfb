import { useLocalSearchParams } from 'expo-router';
import { BenchDetail } from '@/components/benches/BenchDetail';
import { benchSide } from '@/components/benches/benchSide';
import { useBench } from '@/hooks/queries/benches';
import { useChosenBench } from '@/hooks/queries/chosenBench';
import { useEquipment } from '@/hooks/queries/equipment';
import { useRole } from '@/hooks/session/SessionProvider';

export default function BenchDetailScreen() {
  const { benchId } = useLocalSearchParams<{ benchId: string }>();
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
