import { View } from 'react-native';
import { EmptyState } from '@/components/ui/EmptyState';
import { Row } from '@/components/ui/Row';
import { StageGlyph } from '@/components/ui/StageGlyph';
import { Text } from '@/components/ui/Text';
import { space } from '@/components/ui/tokens';
import { useLook } from '@/components/ui/useLook';
import type { Aperture } from '@/shared/contracts/lots';
import { formatMeasured, formatMeasuredText } from '@/shared/units/format';
import { asEntered } from '@/components/measurement/asEntered';

export interface PiecePickerProps {
  apertures: readonly Aperture[];
  chosenId: string | null;
  onChoose: (apertureId: string) => void;
  /** What was searched for, to be named when nothing fits. */
  search: string;
}

/** Rows that are drawn at once; the search narrows the rest down. */
const MOST = 60;

const nominal = (aperture: Aperture) =>
  `${asEntered(aperture.nominalSizeUm)}${aperture.toleranceUm === null ? '' : ` ± ${asEntered(aperture.toleranceUm)}`} µm ${aperture.kind}`;

/** The pieces to choose from, those without a size first. */
export function PiecePicker({ apertures, chosenId, onChoose, search }: PiecePickerProps) {
  const { desk } = useLook();
  if (apertures.length === 0) {
    return search === '' ? (
      <EmptyState sentence="No pieces yet. Add a lot with its pieces under Lots." />
    ) : (
      <EmptyState sentence={`No piece or lot fits “${search}”. Search for a part of a serial or lot number.`} />
    );
  }
  const shown = apertures.slice(0, MOST);
  return (
    <View>
      <View role="radiogroup" aria-label="Piece" style={{ gap: space.hair }}>
        {shown.map((aperture) => {
          const found = result(aperture, desk);
          return (
            <Row
              key={aperture.id}
              dense={desk}
              leading={<StageGlyph stage={aperture.newest?.state ?? 'waiting'} />}
              title={aperture.serial}
              aside={desk ? nominal(aperture) : undefined}
              subtitle={desk ? undefined : `${nominal(aperture)}, lot ${aperture.lotNumber}`}
              choice
              selected={aperture.id === chosenId}
              onPress={() => onChoose(aperture.id)}
              label={[aperture.serial, nominal(aperture), ...(desk ? [] : [`lot ${aperture.lotNumber}`]), found]
                .filter(Boolean)
                .join(', ')}
              trailing={
                <Text variant="small" tone="ink2" lines={1}>
                  {found}
                </Text>
              }
            />
          );
        })}
      </View>
      {apertures.length > MOST ? (
        <View style={{ padding: space.l }}>
          <Text variant="small" tone="ink2">
            {`${apertures.length - MOST} more. Search to find them.`}
          </Text>
        </View>
      ) : null}
    </View>
  );
}

/** The newest size, short on a phone; where there is none, the lot on a desk and what became of the frame on a phone. */
function result({ newest, lotNumber }: Aperture, desk: boolean): string {
  if (newest?.sizeUm != null) {
    return desk
      ? formatMeasuredText(newest.sizeUm, newest.expandedUncertaintyUm, 'µm')
      : formatMeasured(newest.sizeUm, newest.expandedUncertaintyUm).value;
  }
  return desk ? `lot ${lotNumber}` : (newest?.state ?? '');
}
