import { View } from 'react-native';
import { ActionFoot } from '@/components/ui/ActionFoot';
import { Awaited, type AwaitedResult } from '@/components/ui/Awaited';
import { Button } from '@/components/ui/Button';
import { Icon } from '@/components/ui/Icon';
import { Plate } from '@/components/ui/Plate';
import { Screen, type ScreenSide } from '@/components/ui/Screen';
import { Text } from '@/components/ui/Text';
import { space } from '@/components/ui/tokens';
import { useLook } from '@/components/ui/useLook';
import type { BenchDetail as BenchRecord } from '@/shared/contracts/benches';
import { BenchPanel } from './BenchPanel';
import { RevisionList } from './RevisionList';

export interface BenchDetailProps {
  detail: AwaitedResult<BenchRecord>;
  benchId: string;
  list?: ScreenSide;
  mayEdit: boolean;
  /** This device stands at this bench. */
  here: boolean;
  onChoose: () => void;
}

/** A bench with its revisions beside it. */
export function BenchDetail({ detail, benchId, list, mayEdit, here, onChoose }: BenchDetailProps) {
  const { desk } = useLook();
  const bench = detail.data;
  return (
    <Screen
      title={bench?.name ?? 'Bench'}
      subtitle={bench ? `revision ${bench.current.revision}` : undefined}
      back={desk ? undefined : '/bench'}
      list={list}
      wavelengthNm={bench?.current.laser.wavelengthNm ?? null}
      benchLabel={bench?.name ?? null}
      foot={
        mayEdit ? (
          <ActionFoot
            primary={<Button label="Revise this bench" icon="note" kind="primary" href={`/bench/${benchId}/revise`} />}
          />
        ) : undefined
      }
      evidence={
        bench
          ? {
              title: 'Revisions',
              width: 380,
              content: <RevisionList revisions={bench.revisions} />,
            }
          : undefined
      }
    >
      <Awaited result={detail} what="the bench">
        {(data) => (
          <>
            <BenchPanel revision={data.current} />
            {here ? (
              <Plate>
                <View style={{ flexDirection: 'row', alignItems: 'center', gap: space.m }}>
                  <Icon name="tick" />
                  <Text style={{ flex: 1 }}>This device stands at this bench: Today, Lots and Capture use it.</Text>
                </View>
              </Plate>
            ) : (
              <Button label="This device stands at this bench" icon="tick" onPress={onChoose} />
            )}
          </>
        )}
      </Awaited>
    </Screen>
  );
}
