import { View } from 'react-native';
import { Row } from '@/components/ui/Row';
import { StageGlyph } from '@/components/ui/StageGlyph';
import { Text } from '@/components/ui/Text';
import { space } from '@/components/ui/tokens';
import type { Aperture } from '@/shared/contracts/lots';
import { formatMeasured } from '@/shared/units/format';

export interface LotPiecesProps {
  apertures: readonly Aperture[];
  /** The piece that is shown. */
  chosenId: string;
  /** Said at the right of the chosen piece. */
  chosenWord?: string;
  /** Where a piece leads that has no size yet. */
  beginHref: (aperture: Aperture) => `/capture?aperture=${string}`;
}

/** The pieces of a lot beside the one that is shown: where each stands, and its size. */
export function LotPieces({ apertures, chosenId, chosenWord, beginHref }: LotPiecesProps) {
  return (
    <View role="list" style={{ gap: space.hair }}>
      {apertures.map((aperture) => {
        const { newest } = aperture;
        const chosen = aperture.id === chosenId;
        const size =
          typeof newest?.sizeUm === 'number' ? formatMeasured(newest.sizeUm, newest.expandedUncertaintyUm).value : null;
        const word = size ?? (newest === null || newest.state === 'waiting' ? '' : newest.state);
        return (
          <View key={aperture.id} role="listitem">
            <Row
              dense
              leading={<StageGlyph stage={newest?.state ?? 'waiting'} />}
              title={aperture.serial}
              selected={chosen}
              href={chosen ? undefined : newest ? `/measurements/${newest.measurementId}` : beginHref(aperture)}
              trailing={
                <Text variant="small" tone={chosen && chosenWord ? 'accent' : 'ink2'} lines={1}>
                  {chosen && chosenWord ? chosenWord : word}
                </Text>
              }
            />
          </View>
        );
      })}
    </View>
  );
}
