import { Image, View } from 'react-native';
import { Icon } from '@/components/ui/Icon';
import { StageGlyph } from '@/components/ui/StageGlyph';
import { useLook } from '@/components/ui/useLook';
import type { FrameKind } from '@/shared/contracts/captures';

export interface FrameThumbnailProps {
  /** Null: there is no picture yet. */
  address: string | null;
  kind: FrameKind;
  widthPx: number;
  /** `fill`: as high as the row. */
  heightPx: number | 'fill';
}

/** A small picture of a frame; before it comes the plate stands at its size. The name stands beside it. */
export function FrameThumbnail({ address, kind, widthPx, heightPx }: FrameThumbnailProps) {
  const { colours } = useLook();
  return (
    <View
      style={{
        width: widthPx,
        height: heightPx === 'fill' ? undefined : heightPx,
        alignSelf: heightPx === 'fill' ? 'stretch' : undefined,
        backgroundColor: colours.well,
        alignItems: 'center',
        justifyContent: 'center',
        overflow: 'hidden',
      }}
    >
      {address === null ? (
        kind === 'light' ? (
          <StageGlyph stage="waiting" />
        ) : (
          <Icon name="dark" size={20} colour={colours.ink3} />
        )
      ) : (
        <Image
          source={{ uri: address }}
          alt=""
          resizeMode="cover"
          style={{ position: 'absolute', left: 0, top: 0, width: '100%', height: '100%' }}
        />
      )}
    </View>
  );
}
