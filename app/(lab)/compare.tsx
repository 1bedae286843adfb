import { router, useLocalSearchParams } from 'expo-router';
import { useMemo, useState } from 'react';
import { View } from 'react-native';
import { CompareChart } from '@/components/charts/CompareChart';
import { ResidualStrip } from '@/components/charts/ResidualStrip';
import { slopeSays } from '@/components/compare/benchSays';
import { compareLine, type SizeBasis } from '@/components/compare/compareLine';
import { darkRingFactor } from '@/components/compare/darkRingFactor';
import { LineFacts } from '@/components/compare/LineFacts';
import { MeasurementPicker } from '@/components/compare/MeasurementPicker';
import { OutlierFlags } from '@/components/compare/OutlierFlags';
import { RadiusTable } from '@/components/compare/RadiusTable';
import { residualLimit } from '@/components/compare/residualLimit';
import { SlopeAnswer } from '@/components/compare/SlopeAnswer';
import { asEntered } from '@/components/measurement/asEntered';
import { Awaited } from '@/components/ui/Awaited';
import { Button } from '@/components/ui/Button';
import { EmptyState } from '@/components/ui/EmptyState';
import { Plate } from '@/components/ui/Plate';
import { Screen } from '@/components/ui/Screen';
import { Text } from '@/components/ui/Text';
import { space } from '@/components/ui/tokens';
import { useLook } from '@/components/ui/useLook';
import { ViewSwitch } from '@/components/ui/ViewSwitch';
import { useBenches } from '@/hooks/queries/benches';
import { useComparison } from '@/hooks/queries/comparison';
import { useMeasurements } from '@/hooks/queries/measurements';
import type { Compared } from '@/shared/contracts/measurements';
import { formatNumber } from '@/shared/units/format';
import { OpenTo } from '@/components/ui/OpenTo';
import { useRole } from '@/hooks/session/SessionProvider';
import { STAFF } from '@/shared/contracts/roles';

/** The most that one comparison takes, by the contract. */
const MOST = 100;

/** Measurements side by side: ring radius against 1/size, the straight line through it and what it says of the bench. */
export default function CompareScreen() {
  return (
    <OpenTo roles={STAFF} role={useRole()}>
      <Comparison />
    </OpenTo>
  );
}

function Comparison() {
  const { ids = '' } = useLocalSearchParams<{ ids?: string }>();
  const { desk } = useLook();
  const [picking, setPicking] = useState(false);
  const [basis, setBasis] = useState<SizeBasis | null>(null);
  const chosenIds = useMemo(() => ids.split(',').filter(Boolean).slice(0, MOST), [ids]);
  const measurements = useMeasurements({ state: 'measured', limit: 200 });
  const comparison = useComparison(chosenIds);
  const compared = useMemo(
    () => (comparison.data ?? []).filter((one) => chosenIds.includes(one.measurementId)),
    [comparison.data, chosenIds],
  );
  const varied = new Set(compared.map((one) => one.nominalSizeUm)).size > 1;
  const shownBasis = basis ?? (varied ? 'nominal' : 'measured');
  const line = useMemo(() => compareLine(compared, shownBasis), [compared, shownBasis]);
  const odd = [...line.outliers, ...line.strangers].map((one) => one.measurementId);
  const choose = (next: string[]) => router.setParams({ ids: next.slice(0, MOST).join(',') });
  const first = compared[0];
  const rings = line.points.length;

  const picker = (
    <Awaited
      result={measurements}
      what="the measured sizes"
      isEmpty={(list) => list.length === 0}
      whenEmpty={
        <EmptyState
          sentence="No sizes yet. Take frames of a piece first."
          action={<Button label="Take frames" href="/capture" />}
        />
      }
    >
      {(list) => <MeasurementPicker measurements={list} chosenIds={chosenIds} onChange={choose} oddIds={odd} />}
    </Awaited>
  );
  const pick = (
    <Button
      label={picking ? 'Show the comparison' : 'Choose sizes'}
      icon={picking ? 'compare' : 'plus'}
      kind={picking ? 'primary' : 'plain'}
      trailing={null}
      fullBleed
      onPress={() => setPicking(!picking)}
      style={{ flex: 1, minHeight: 68 }}
    />
  );
  const worst = line.outliers[0];
  // While there is nothing to do here but choose, the places keep the foot.
  const foot =
    desk || (chosenIds.length === 0 && !picking) ? undefined : (
      <View style={{ flexDirection: 'row', gap: space.hair, paddingTop: space.hair }}>
        {pick}
        {worst && !picking ? (
          <Button
            label={`Look at ${worst.serial}`}
            kind="primary"
            fullBleed
            href={`/measurements/${worst.measurementId}`}
            style={{ flex: 1.3, minHeight: 68 }}
          />
        ) : null}
      </View>
    );
  const facts = compared.length === 0 ? null : <Facts line={line} compared={compared} basis={shownBasis} />;

  return (
    <Screen
      title="Compare"
      subtitle={
        compared.length === 0
          ? undefined
          : `${compared.length} ${compared.length === 1 ? 'size' : 'sizes'}, ${rings} ring radii`
      }
      wavelengthNm={first?.wavelengthNm ?? null}
      benchLabel={first?.benchName ?? null}
      foot={foot}
      list={
        desk
          ? {
              title: 'Measured sizes',
              note: chosenIds.length > 0 ? `${chosenIds.length} chosen` : undefined,
              width: 320,
              content: picker,
            }
          : undefined
      }
      evidence={
        desk && facts
          ? {
              title: 'What it says of the bench',
              width: 336,
              content: facts,
              foot: worst ? (
                <Button
                  label={`Look at ${worst.serial}`}
                  kind="primary"
                  href={`/measurements/${worst.measurementId}`}
                  style={{ minHeight: 60 }}
                />
              ) : undefined,
            }
          : undefined
      }
    >
      {!desk && picking ? (
        picker
      ) : chosenIds.length === 0 ? (
        <EmptyState
          sentence="Choose three sizes or more. Their ring radii are drawn against 1/size, and the straight line through them tests the bench."
          action={
            desk ? undefined : (
              <Button label="Choose sizes" icon="plus" kind="primary" onPress={() => setPicking(true)} />
            )
          }
        />
      ) : (
        <Awaited result={comparison} what="the rings">
          {() => (
            <>
              <Drawing line={line} basis={shownBasis} varied={varied} onBasis={setBasis} />
              {desk ? null : facts}
              <RadiusTable points={line.points} />
            </>
          )}
        </Awaited>
      )}
    </Screen>
  );
}

interface DrawingProps {
  line: ReturnType<typeof compareLine>;
  basis: SizeBasis;
  varied: boolean;
  onBasis: (basis: SizeBasis) => void;
}

function Drawing({ line, basis, varied, onBasis }: DrawingProps) {
  const { desk } = useLook();
  const [chosenId, chooseId] = useState<string | null>(null);
  const { fit, points } = line;
  const orders = [...new Set(points.map((point) => point.order))].sort((a, b) => a - b);
  const xs = [...new Set(points.map((point) => point.x))];
  const used = points.flatMap(({ leftOut, residual }) => (leftOut || residual === null ? [] : [residual * 100]));
  const chosen = points.find((point) => point.measurementId === chosenId);
  return (
    <>
      <ViewSwitch
        label="Size that stands below"
        views={[
          { value: 'nominal', label: 'Nominal size' },
          { value: 'measured', label: 'Measured size' },
        ]}
        value={basis}
        onChange={onBasis}
      />
      <Plate padding="none">
        <CompareChart
          lines={
            fit
              ? orders.map((order) => ({
                  order,
                  intercept: fit.intercept * darkRingFactor(order),
                  slope: fit.slope * darkRingFactor(order),
                }))
              : []
          }
          points={points.map((point) => ({ ...point, id: point.measurementId, label: point.serial }))}
          xTicks={thinned(xs).map((x) => ({
            x,
            label: basis === 'nominal' ? asEntered(1 / x) : formatNumber(1 / x, { significant: 4 }),
          }))}
          xTitle="Size, µm, spaced as 1 / size"
          yTitle="Ring radius, mm"
          edgeY={null}
          chosenId={chosenId}
          onChoose={chooseId}
          heightPx={desk ? 520 : 320}
        />
      </Plate>
      {fit ? (
        <Plate padding="none">
          <Text variant="label" style={{ paddingHorizontal: 16, paddingTop: 8 }}>
            Distance from the line, %
          </Text>
          <ResidualStrip
            points={points.map((point) => ({
              id: point.measurementId,
              label: point.serial,
              order: point.order,
              x: point.x,
              residual: (point.residual ?? 0) * 100,
              leftOut: point.leftOut,
            }))}
            xMax={Math.max(...xs)}
            limit={residualLimit(used)}
            unit="%"
            chosenId={chosenId}
            onChoose={chooseId}
          />
        </Plate>
      ) : (
        <Plate surface="lift">
          <Text variant="strong">No line yet</Text>
          <Text variant="small">
            {line.reason === 'too-few'
              ? `${line.usedCount === 1 ? 'One size is' : `${line.usedCount} sizes are`} too few: a line through two fits always. Choose three or more.`
              : `All have the same ${basis} size. ${varied || basis === 'measured' ? 'Choose pieces of other sizes.' : 'Choose pieces of other sizes, or take the measured size.'}`}
          </Text>
        </Plate>
      )}
      {chosen ? (
        <Plate>
          <View style={{ flexDirection: 'row', alignItems: 'center', gap: space.m }}>
            <Text style={{ flex: 1 }}>{`${chosen.serial}, ${formatNumber(1 / chosen.x, { significant: 5 })} µm`}</Text>
            <Button dense label="Go to the measurement" href={`/measurements/${chosen.measurementId}`} />
          </View>
        </Plate>
      ) : null}
    </>
  );
}

/** Sizes closer together than their labels are wide share one mark. */
function thinned(xs: readonly number[]): number[] {
  const most = Math.max(...xs);
  return [...xs]
    .sort((a, b) => a - b)
    .reduce<number[]>(
      (kept, x) => (kept.length > 0 && x - (kept.at(-1) ?? 0) < most * 0.045 ? kept : [...kept, x]),
      [],
    );
}

function Facts({
  line,
  compared,
  basis,
}: {
  line: ReturnType<typeof compareLine>;
  compared: readonly Compared[];
  basis: SizeBasis;
}) {
  const benches = useBenches();
  const first = compared[0];
  const says = slopeSays(line, compared);
  const bench = benches.data?.find((one) => one.name === first?.benchName);
  const current = bench && bench.current.distanceMm === first?.distanceMm ? bench.current : null;
  return (
    <>
      {says && first ? (
        <SlopeAnswer
          says={says}
          basis={basis}
          benchName={first.benchName}
          benchUncertaintyMm={current?.distanceUncertaintyMm ?? null}
        />
      ) : null}
      <LineFacts line={line} chosen={compared} basis={basis} />
      <OutlierFlags line={line} basis={basis} />
    </>
  );
}
