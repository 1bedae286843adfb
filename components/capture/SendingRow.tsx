import { useState } from 'react';
import { View } from 'react-native';
import { Button } from '@/components/ui/Button';
import { IconButton } from '@/components/ui/IconButton';
import { Text } from '@/components/ui/Text';
import { radius, space } from '@/components/ui/tokens';
import { useLook } from '@/components/ui/useLook';
import type { FrameKind } from '@/shared/contracts/captures';
import { webProps } from '@/components/ui/webProps';
import { sendingWords, type SendingFile } from './captureRows';
import { FrameThumbnail } from './FrameThumbnail';
import { KindSwitch } from './KindSwitch';
import { shortName } from './shortName';

export interface SendingRowProps {
  file: SendingFile;
  onKind: (kind: FrameKind) => void;
  onCancel: () => void;
  onRetry: () => void;
  onDismiss: () => void;
}

const OPEN_KINDS: readonly SendingFile['state'][] = ['hashing', 'hashed', 'ready', 'offline', 'failed'];
const AT_REST: readonly SendingFile['state'][] = ['unfit', 'failed', 'cancelled', 'known', 'stored'];

/** A file on its way: how far it is, or why it does not go and what to send instead. */
export function SendingRow({ file, onKind, onCancel, onRetry, onDismiss }: SendingRowProps) {
  const { colours, desk } = useLook();
  const width = desk ? 64 : 56;
  const stopped = file.state === 'unfit' || file.state === 'failed';
  const moving = file.state === 'sending' || file.state === 'hashing';
  const atRest = AT_REST.includes(file.state);
  const words = sendingWords(file);
  const [open, setOpen] = useState(false);
  const kindOpen = OPEN_KINDS.includes(file.state);
  return (
    <View
      role="listitem"
      style={{
        backgroundColor: stopped ? colours.lift : colours.plate,
        borderRadius: radius.plate,
        flexDirection: 'row',
        alignItems: 'center',
        minHeight: 54,
        overflow: 'hidden',
      }}
    >
      <FrameThumbnail address={null} kind={file.kind} widthPx={width} heightPx="fill" />
      <View style={{ flex: 1, minWidth: 0, paddingLeft: 12, paddingVertical: 6, gap: 4 }}>
        <View style={{ flexDirection: 'row', alignItems: 'center', gap: space.m }}>
          <Text
            variant={stopped ? 'strong' : desk ? 'body' : 'small'}
            tone={moving || stopped ? 'ink0' : 'ink2'}
            lines={1}
            style={{ flex: 1, minWidth: 0 }}
          >
            {shortName(file.name, desk ? 44 : 17)}
          </Text>
          <View style={{ minWidth: moving ? 120 : undefined, paddingRight: atRest ? 0 : 4 }}>
            <Text variant="small" tone={moving ? 'ink1' : 'ink2'} align="right">
              {words}
            </Text>
            {moving ? (
              <View
                role="progressbar"
                aria-label={`${file.name}: ${words}`}
                {...webProps({
                  'aria-valuenow': Math.round(file.part * 100),
                  'aria-valuemin': 0,
                  'aria-valuemax': 100,
                })}
                style={{ height: 4, marginTop: 4, backgroundColor: colours.wall }}
              >
                <View style={{ height: 4, width: `${file.part * 100}%`, backgroundColor: colours.ink1 }} />
              </View>
            ) : null}
          </View>
        </View>
        {file.problem && file.state !== 'offline' ? (
          <Text variant="small" tone={stopped ? 'ink1' : 'ink2'}>
            {file.problem}
          </Text>
        ) : null}
        {open && kindOpen ? (
          <View style={{ alignSelf: 'flex-start' }}>
            <KindSwitch value={file.kind} onChange={onKind} />
          </View>
        ) : null}
      </View>
      {file.state === 'failed' || file.state === 'cancelled' ? (
        <Button dense label="Send again" onPress={onRetry} style={{ backgroundColor: colours.gap }} />
      ) : null}
      {kindOpen ? (
        <IconButton
          icon="more"
          label={`${file.name} goes as a ${file.kind}. Change what it is`}
          on={open}
          onPress={() => setOpen(!open)}
        />
      ) : null}
      <IconButton
        icon="close"
        label={atRest ? `Take ${file.name} off the list` : `Call off ${file.name}`}
        onPress={atRest ? onDismiss : onCancel}
      />
    </View>
  );
}
