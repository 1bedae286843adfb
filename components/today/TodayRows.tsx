import { View } from 'react-native';
import { refusalName } from '@/components/measurement/words/refusalWords';
import { LotStrip } from '@/components/lots/LotStrip';
import { dueWords } from '@/components/lots/apertureWords';
import { Row } from '@/components/ui/Row';
import { StageGlyph } from '@/components/ui/StageGlyph';
import { Text } from '@/components/ui/Text';
import { space } from '@/components/ui/tokens';
import type { Today } from '@/shared/contracts/today';
import { formatMeasured, formatTime } from '@/shared/units/format';

/** Refusals, what runs, and lots that are not whole: one row each, those that need a person first. */
export function WaitingRows({ today }: { today: Today }) {
  return (
    <View style={{ gap: space.hair }}>
      {today.refusals.slice(0, 5).map((one) => (
        <Row
          key={one.id}
          first
          leading={<StageGlyph stage={one.state === 'failed' ? 'failed' : 'refused'} size={24} />}
          title={`${one.apertureSerial}: ${refusalName(one.reason).toLowerCase()}`}
          subtitle={`${one.state === 'failed' ? 'Failed' : 'Refused'} ${formatTime(one.finishedAt ?? one.createdAt)}, lot ${one.lotNumber}, ${one.frameName}`}
          href={`/measurements/${one.id}`}
        />
      ))}
      {today.refusals.length > 5 ? (
        <Row
          leading={<StageGlyph stage="refused" size={24} />}
          title={`${today.refusals.length - 5} more refusals`}
          subtitle="They stand in their lots"
          href="/lots"
        />
      ) : null}
      {today.running > 0 ? (
        <Row
          leading={<StageGlyph stage="measuring" size={24} />}
          title={today.running === 1 ? '1 frame is being measured' : `${today.running} frames are being measured`}
          subtitle="Sizes appear below by themselves"
        />
      ) : null}
    </View>
  );
}

export function OpenLotRows({ lots }: { lots: Today['lots'] }) {
  return (
    <View style={{ gap: space.hair }}>
      {lots.map((lot) => (
        <Row
          key={lot.id}
          icon="lots"
          title={lot.number}
          aside={lot.clientName}
          subtitle={`${lot.apertureCount} ${lot.apertureCount === 1 ? 'piece' : 'pieces'}, ${dueWords(lot.dueOn)}`}
          href={`/lots/${lot.id}`}
          trailing={
            <LotStrip
              apertureCount={lot.apertureCount}
              measuredCount={lot.measuredCount}
              refusedCount={lot.refusedCount}
              style={{ width: 104 }}
            />
          }
        />
      ))}
    </View>
  );
}

/** Newest sizes, as they came. */
export function RecentRows({ recent }: { recent: Today['recent'] }) {
  return (
    <View style={{ gap: space.hair }}>
      {recent.slice(0, 8).map((one) => {
        const text = formatMeasured(one.sizeUm, one.expandedUncertaintyUm);
        return (
          <Row
            key={one.id}
            dense
            leading={<StageGlyph stage="measured" />}
            title={one.apertureSerial}
            subtitle={`${formatTime(one.finishedAt ?? one.createdAt)}, ${one.benchName}`}
            href={`/measurements/${one.id}`}
            trailing={
              <View style={{ flexDirection: 'row', alignItems: 'baseline', gap: space.s }}>
                <Text variant="medium" style={{ fontSize: 20, lineHeight: 24 }}>
                  {text.value}
                </Text>
                {text.uncertainty === null ? null : (
                  <Text variant="small" tone="ink2">
                    {`± ${text.uncertainty}`}
                  </Text>
                )}
              </View>
            }
          />
        );
      })}
    </View>
  );
}
