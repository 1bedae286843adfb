import { router, useLocalSearchParams } from 'expo-router';
import { useDeferredValue, useRef, useState } from 'react';
import { View } from 'react-native';
import { BenchPicker } from '@/components/capture/BenchPicker';
import { CaptureCautions } from '@/components/capture/CaptureCautions';
import { PiecePicker } from '@/components/capture/PiecePicker';
import { RecentCaptures } from '@/components/capture/RecentCaptures';
import { Awaited } from '@/components/ui/Awaited';
import { Button } from '@/components/ui/Button';
import { useNotice } from '@/components/ui/NoticeProvider';
import { Screen } from '@/components/ui/Screen';
import { SearchField } from '@/components/ui/SearchField';
import { Text } from '@/components/ui/Text';
import { space } from '@/components/ui/tokens';
import { useLook } from '@/components/ui/useLook';
import { useApertures } from '@/hooks/queries/apertures';
import { useCaptures, useCreateCapture } from '@/hooks/queries/captures';
import { useChosenBench } from '@/hooks/queries/chosenBench';
import { OpenTo } from '@/components/ui/OpenTo';
import { useRole } from '@/hooks/session/SessionProvider';
import { BENCH } from '@/shared/contracts/roles';

/** Chooses bench and piece, then begins a capture; or goes on with one of the last. */
export default function BeginCaptureScreen() {
  return (
    <OpenTo roles={BENCH} role={useRole()}>
      <BeginCapture />
    </OpenTo>
  );
}

function BeginCapture() {
  const { aperture: askedId } = useLocalSearchParams<{ aperture?: string }>();
  const { desk } = useLook();
  const { warn } = useNotice();
  const { bench, benches, choose, light } = useChosenBench();
  const [search, setSearch] = useState('');
  const asked = useDeferredValue(search.trim());
  const apertures = useApertures(asked);
  const captures = useCaptures();
  const begin = useCreateCapture();
  const beginning = useRef(false);
  const chosenId = askedId ?? null;
  const chosen = apertures.data?.find((aperture) => aperture.id === chosenId);

  const start = () => {
    // A second press may come before the first one is drawn.
    if (!bench || chosenId === null || beginning.current) return;
    beginning.current = true;
    begin.mutate(
      { apertureId: chosenId, benchId: bench.id },
      {
        onSuccess: (capture) => router.push(`/captures/${capture.id}`),
        onError: (error) => warn(error.message),
        onSettled: () => {
          beginning.current = false;
        },
      },
    );
  };
  const reason = !bench ? 'Choose a bench.' : chosenId === null ? 'Choose a piece.' : undefined;
  const button = (
    <Button
      label={chosen ? `Take frames of ${chosen.serial}` : 'Take frames'}
      kind="primary"
      fullBleed={!desk}
      disabled={reason !== undefined}
      reason={reason}
      busy={begin.isPending}
      onPress={start}
      style={{ minHeight: 68 }}
    />
  );

  const recent = (
    <Awaited result={captures} what="the last captures">
      {(list) => <RecentCaptures captures={list} />}
    </Awaited>
  );
  return (
    <Screen
      title="Capture"
      foot={chosenId !== null || desk ? button : undefined}
      {...light}
      list={
        desk
          ? {
              title: 'Bench',
              width: 336,
              content: (
                <>
                  <Awaited result={benches} what="the benches">
                    {(list) => <BenchPicker benches={list} chosenId={bench?.id ?? null} onChoose={choose} />}
                  </Awaited>
                  <CaptureCautions laserClass={bench?.current.laser.laserClass} />
                </>
              ),
            }
          : undefined
      }
      evidence={{ title: 'Last captures', width: 420, content: recent }}
    >
      {desk ? null : (
        <>
          <Awaited result={benches} what="the benches">
            {(list) => <BenchPicker benches={list} chosenId={bench?.id ?? null} onChoose={choose} />}
          </Awaited>
          <CaptureCautions laserClass={bench?.current.laser.laserClass} />
        </>
      )}
      <View style={{ paddingHorizontal: desk ? 12 : space.l, paddingTop: 12, paddingBottom: 8, gap: space.s }}>
        <Text variant="section" level={2}>
          Piece
        </Text>
        <SearchField label="Search pieces" placeholder="Serial or lot" value={search} onChange={setSearch} />
      </View>
      <Awaited result={apertures} what="the pieces">
        {(list) => (
          <PiecePicker
            apertures={list.filter((aperture) => aperture.kind === 'pinhole')}
            chosenId={chosenId}
            onChoose={(id) => router.setParams({ aperture: id })}
            search={asked}
          />
        )}
      </Awaited>
    </Screen>
  );
}
