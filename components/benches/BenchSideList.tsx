import { View } from 'react-native';
import { Icon } from '@/components/ui/Icon';
import { IconButton } from '@/components/ui/IconButton';
import { Row } from '@/components/ui/Row';
import { Text } from '@/components/ui/Text';
import { space } from '@/components/ui/tokens';
import type { Bench, Camera, Laser } from '@/shared/contracts/benches';
import { plainQuantity } from './benchWords';

export interface BenchSideListProps {
  benches: readonly Bench[];
  lasers: readonly Laser[];
  cameras: readonly Camera[];
  selectedId?: string;
  mayEdit: boolean;
}

/** Benches, lasers and cameras of the laboratory, each with the number that matters most. */
export function BenchSideList({ benches, lasers, cameras, selectedId, mayEdit }: BenchSideListProps) {
  return (
    <View style={{ gap: space.hair }}>
      <Head title="Benches" add={mayEdit ? { label: 'Add a bench', href: '/bench/new' } : null} />
      {benches.map((bench) => (
        <Row
          key={bench.id}
          icon="bench"
          title={bench.name}
          subtitle={`${plainQuantity(bench.current.laser.wavelengthNm, 'nm')}, ${plainQuantity(bench.current.distanceMm, 'mm')}, revision ${bench.current.revision}`}
          href={`/bench/${bench.id}`}
          selected={bench.id === selectedId}
        />
      ))}
      {benches.length === 0 ? (
        <None words={mayEdit ? 'No benches yet. Add a laser and a camera first, then the bench.' : 'No benches yet.'} />
      ) : null}
      <Head title="Lasers" add={mayEdit ? { label: 'Add a laser', href: '/bench/lasers/new' } : null} />
      {lasers.map((laser) => (
        <Row
          key={laser.id}
          icon="laser"
          title={laser.name}
          subtitle={`${plainQuantity(laser.wavelengthNm, 'nm')}, class ${laser.laserClass}`}
          href={`/bench/lasers/${laser.id}`}
          selected={laser.id === selectedId}
        />
      ))}
      {lasers.length === 0 ? <None words="No lasers yet." /> : null}
      <Head title="Cameras" add={mayEdit ? { label: 'Add a camera', href: '/bench/cameras/new' } : null} />
      {cameras.map((camera) => (
        <Row
          key={camera.id}
          icon="camera"
          title={camera.name}
          subtitle={`${camera.widthPx} × ${camera.heightPx}, ${plainQuantity(camera.pixelPitchUm, 'µm')}, ${camera.bitDepth} bit`}
          href={`/bench/cameras/${camera.id}`}
          selected={camera.id === selectedId}
        />
      ))}
      {cameras.length === 0 ? <None words="No cameras yet." /> : null}
    </View>
  );
}

function Head({
  title,
  add,
}: {
  title: string;
  add: { label: string; href: '/bench/new' | '/bench/lasers/new' | '/bench/cameras/new' } | null;
}) {
  return (
    <View style={{ minHeight: 48, flexDirection: 'row', alignItems: 'center', paddingLeft: space.l, paddingRight: 4 }}>
      <Text variant="section" level={2} style={{ flex: 1 }}>
        {title}
      </Text>
      {add ? <IconButton icon="plus" label={add.label} href={add.href} /> : null}
    </View>
  );
}

function None({ words }: { words: string }) {
  return (
    <View
      style={{
        flexDirection: 'row',
        alignItems: 'center',
        gap: space.m,
        paddingHorizontal: space.l,
        paddingBottom: space.m,
      }}
    >
      <Icon name="minus" size={18} />
      <Text variant="small" tone="ink2" style={{ flex: 1 }}>
        {words}
      </Text>
    </View>
  );
}
