import { useLocalSearchParams } from 'expo-router';
import { View } from 'react-native';
import { AperturePanel } from '@/components/lots/AperturePanel';
import { ApertureTable } from '@/components/lots/ApertureTable';
import { countOfKind, dueWords } from '@/components/lots/apertureWords';
import { LotSummary } from '@/components/lots/LotSummary';
import { OrderedPieces } from '@/components/lots/OrderedPieces';
import { Awaited } from '@/components/ui/Awaited';
import { Button } from '@/components/ui/Button';
import { EmptyState } from '@/components/ui/EmptyState';
import { IconButton } from '@/components/ui/IconButton';
import { Plate } from '@/components/ui/Plate';
import { Screen } from '@/components/ui/Screen';
import { Text } from '@/components/ui/Text';
import { useLook } from '@/components/ui/useLook';
import { useChosenBench } from '@/hooks/queries/chosenBench';
import { useLot } from '@/hooks/queries/lots';
import { useRole } from '@/hooks/session/SessionProvider';
import { BENCH, STAFF } from '@/shared/contracts/roles';

export default function LotScreen() {
  const { lotId, aperture: apertureId } = useLocalSearchParams<{ lotId: string; aperture?: string }>();
  const { desk } = useLook();
  const role = useRole();
  const staff = STAFF.includes(role);
  const lot = useLot(lotId);
  const { light } = useChosenBench();
  const data = lot.data;
  const chosen = data?.apertures.find((one) => one.id === apertureId) ?? (desk ? data?.apertures[0] : undefined);
  const panel =
    chosen && staff ? <AperturePanel aperture={chosen} mayCapture={BENCH.includes(role)} mayEdit={staff} /> : null;

  if (!desk && apertureId !== undefined) {
    return (
      <Screen
        title={chosen?.serial ?? 'Aperture'}
        subtitle={data ? `Lot ${data.number}, ${data.clientName}` : undefined}
        back={`/lots/${lotId}`}
        {...light}
      >
        <Awaited result={lot} what="the lot">
          {() => panel ?? <EmptyState sentence="This lot has no such aperture. Go back to the lot." />}
        </Awaited>
      </Screen>
    );
  }

  const actions =
    staff && data ? (
      desk ? (
        <View style={{ flexDirection: 'row', gap: 2 }}>
          <IconButton icon="note" label="Change the lot" href={`/lots/${lotId}/edit`} />
          <Button label="Add pieces" icon="plus" dense href={`/lots/${lotId}/add`} />
        </View>
      ) : (
        <View style={{ flexDirection: 'row' }}>
          <IconButton icon="note" label="Change the lot" href={`/lots/${lotId}/edit`} />
          <IconButton icon="plus" label="Add pieces" href={`/lots/${lotId}/add`} />
        </View>
      )
    ) : undefined;
  return (
    <Screen
      title={data ? `${data.number}, ${countOfKind(data.apertures.map((one) => one.kind))}` : 'Lot'}
      subtitle={
        data
          ? desk
            ? `${data.clientName}, ${dueWords(data.dueOn)}`
            : `${dueWords(data.dueOn)}, ${data.clientName}`
          : undefined
      }
      back="/lots"
      action={actions}
      evidence={desk && chosen && panel ? { title: chosen.serial, width: 400, content: panel } : undefined}
      {...light}
    >
      <Awaited result={lot} what="the lot">
        {(one) => (
          <>
            {one.apertures.length === 0 ? (
              <EmptyState
                sentence={staff ? 'No pieces yet. Add them one by one or by a serial pattern.' : 'No pieces yet.'}
                action={staff ? <Button label="Add pieces" kind="primary" href={`/lots/${lotId}/add`} /> : undefined}
              />
            ) : !staff ? (
              <OrderedPieces lot={one} />
            ) : (
              <>
                <LotSummary apertures={one.apertures} />
                <ApertureTable
                  lotId={lotId}
                  apertures={one.apertures}
                  selectedId={desk ? (chosen?.id ?? null) : null}
                />
              </>
            )}
            {one.note || one.orderReference ? (
              <Plate>
                {one.orderReference ? <Text tone="ink2">{`Order ${one.orderReference}`}</Text> : null}
                {one.note ? <Text>{one.note}</Text> : null}
              </Plate>
            ) : null}
          </>
        )}
      </Awaited>
    </Screen>
  );
}
