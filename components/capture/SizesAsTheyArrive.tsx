import { SizesChart } from '@/components/charts/SizesChart';
import { Section } from '@/components/ui/Section';
import { Text } from '@/components/ui/Text';
import type { CaptureDetail } from '@/shared/contracts/captures';
import { formatQuantity } from '@/shared/units/format';

/** Spread of repeats and what the stated uncertainty makes of it, in words. */
export function scatterWords(sizesUm: readonly number[], mean: NonNullable<CaptureDetail['mean']>): string {
  const walls = 'The walls are the stated uncertainty.';
  if (sizesUm.length < 3) return walls;
  const average = sizesUm.reduce((sum, size) => sum + size, 0) / sizesUm.length;
  const scatter = Math.sqrt(sizesUm.reduce((sum, size) => sum + (size - average) ** 2, 0) / (sizesUm.length - 1));
  const own = scatter / Math.sqrt(sizesUm.length);
  const words = `${walls} ${sizesUm.length} frames scatter by ${formatQuantity(scatter, 'µm', { significant: 2 })}.`;
  return own < 0.3 * mean.standardUncertaintyUm
    ? `${words} More frames will not narrow it: what is common to all of them rules.`
    : `${words} More frames narrow it.`;
}

/** Sizes of a capture in the order of its frames, with what their scatter says. */
export function SizesAsTheyArrive({ capture }: { capture: CaptureDetail }) {
  const { mean } = capture;
  const lights = capture.frames
    .filter((frame) => frame.kind === 'light')
    .sort((a, b) => a.createdAt.localeCompare(b.createdAt) || a.name.localeCompare(b.name, 'en', { numeric: true }));
  if (!mean) return null;
  const sizes = lights.map((frame, i) => ({
    position: i + 1,
    label: frame.name,
    sizeUm: frame.measurement?.sizeUm ?? null,
    uncertaintyUm: frame.measurement?.fitUncertaintyUm ?? null,
    leftOut: frame.leftOut,
  }));
  const used = sizes.flatMap(({ sizeUm, leftOut }) => (sizeUm === null || leftOut ? [] : [sizeUm]));
  return (
    <Section title="Sizes as they arrive">
      <SizesChart
        sizes={sizes}
        total={Math.max(sizes.length, 8)}
        meanUm={mean.sizeUm}
        lowUm={mean.sizeUm - mean.expandedUncertaintyUm}
        highUm={mean.sizeUm + mean.expandedUncertaintyUm}
        heightPx={190}
      />
      <Text variant="small" tone="ink2" style={{ marginTop: 8 }}>
        {scatterWords(used, mean)}
      </Text>
    </Section>
  );
}
