import { View } from 'react-native';
import { dueWords } from '@/components/lots/apertureWords';
import { BenchSummary } from '@/components/today/BenchSummary';
import { LotTray } from '@/components/today/LotTray';
import { NextAperture } from '@/components/today/NextAperture';
import { OpenLotRows, RecentRows, WaitingRows } from '@/components/today/TodayRows';
import { Awaited } from '@/components/ui/Awaited';
import { Button } from '@/components/ui/Button';
import { EmptyState } from '@/components/ui/EmptyState';
import { KeyValueList } from '@/components/ui/KeyValueList';
import { Screen } from '@/components/ui/Screen';
import { Section } from '@/components/ui/Section';
import { Text } from '@/components/ui/Text';
import { space } from '@/components/ui/tokens';
import { useLook } from '@/components/ui/useLook';
import { useNow } from '@/components/ui/useNow';
import { useChosenBench } from '@/hooks/queries/chosenBench';
import { useLot } from '@/hooks/queries/lots';
import { useToday } from '@/hooks/queries/today';
import { useRole } from '@/hooks/session/SessionProvider';
import { BENCH } from '@/shared/contracts/roles';
import type { Today } from '@/shared/contracts/today';

export default function TodayScreen() {
  const role = useRole();
  return role === 'client' ? <ClientToday /> : <StaffToday />;
}

function ClientToday() {
  const today = useToday();
  const now = useNow();
  return (
    <Screen title="Today" subtitle={now}>
      <Awaited
        result={today}
        what="your lots"
        isEmpty={(data) => data.lots.length === 0}
        whenEmpty={
          <EmptyState
            sentence="Nothing of yours is being measured now. Earlier lots stand under Lots."
            action={<Button label="Look at the lots" href="/lots" />}
          />
        }
      >
        {(data) => <OpenLotRows lots={data.lots} />}
      </Awaited>
    </Screen>
  );
}

function StaffToday() {
  const { desk } = useLook();
  const now = useNow();
  const today = useToday();
  const { bench, benches, choose, light } = useChosenBench();
  const summary = (short: boolean) =>
    bench ? (
      <BenchSummary bench={bench} benches={benches.data ?? []} onChoose={choose} short={short} />
    ) : (
      <Awaited result={benches} what="the benches">
        {() => (
          <EmptyState
            sentence="No bench yet. It holds laser, camera and distance; without it nothing can be measured."
            action={<Button label="Look at Bench" href="/bench" />}
          />
        )}
      </Awaited>
    );

  if (!desk) {
    return (
      <Screen title="Today" subtitle={now} {...light} evidence={{ content: summary(true), width: 400 }}>
        <Awaited result={today} what="what waits">
          {(data) => (
            <View style={{ gap: space.blocks }}>
              <Next data={data} />
              <WaitingRows today={data} />
              {data.recent.length > 0 ? <Recent data={data} /> : null}
              <OpenLotRows lots={data.lots} />
            </View>
          )}
        </Awaited>
      </Screen>
    );
  }
  return (
    <Screen
      title="Today"
      headless
      {...light}
      list={{
        title: 'Today',
        note: now,
        width: 392,
        content: (
          <Awaited result={today} what="what waits">
            {(data) => (
              <>
                <WaitingRows today={data} />
                {data.refusals.length + data.running > 0 ? <View style={{ height: space.s }} /> : null}
                <OpenLotRows lots={data.lots} />
                <Section title="Last seven days">
                  <KeyValueList
                    entries={[
                      ['Sizes measured', String(data.week.measured)],
                      ['Refused', String(data.week.refused)],
                    ]}
                  />
                </Section>
              </>
            )}
          </Awaited>
        ),
      }}
      evidence={{
        title: bench?.name ?? 'Bench',
        note: bench ? `revision ${bench.current.revision}` : undefined,
        width: 368,
        content: summary(false),
      }}
    >
      <Awaited result={today} what="what waits">
        {(data) => (
          <>
            <Next data={data} />
            {data.recent.length > 0 ? <Recent data={data} /> : null}
          </>
        )}
      </Awaited>
    </Screen>
  );
}

function Recent({ data }: { data: Today }) {
  return (
    <View>
      <View style={{ paddingHorizontal: 20, paddingVertical: space.s }}>
        <Text variant="section" level={2}>
          Newest sizes, µm
        </Text>
      </View>
      <RecentRows recent={data.recent} />
    </View>
  );
}

function Next({ data }: { data: Today }) {
  const mayCapture = BENCH.includes(useRole());
  if (data.next === null) {
    return data.lots.length === 0 ? (
      <EmptyState
        sentence="No piece waits to be measured. Add a lot when pieces have arrived."
        action={<Button label="Add a lot" kind="primary" href="/lots/new" />}
      />
    ) : (
      <EmptyState
        sentence="Every piece has been on the bench once. Look at the refusals and at the lots that are not whole."
        action={<Button label="Look at the lots" href="/lots" />}
      />
    );
  }
  return <NextOfLot next={data.next} mayCapture={mayCapture} />;
}

function NextOfLot({ next, mayCapture }: { next: NonNullable<Today['next']>; mayCapture: boolean }) {
  const { desk } = useLook();
  const lot = useLot(next.lotId);
  return (
    <>
      <NextAperture
        next={next}
        apertures={lot.data?.apertures ?? []}
        clientName={lot.data?.clientName ?? null}
        due={lot.data ? dueWords(lot.data.dueOn) : null}
        mayCapture={mayCapture}
      />
      {desk && lot.data ? (
        <Section title={`Lot ${lot.data.number}, ${lot.data.apertures.length} places`}>
          <LotTray lotId={lot.data.id} apertures={lot.data.apertures} nextId={next.apertureId} />
        </Section>
      ) : null}
    </>
  );
}
