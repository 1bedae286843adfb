import { Section } from '@/components/ui/Section';
import { Text } from '@/components/ui/Text';
import { serialSeries } from './serialSeries';

/** The serials that a pattern gives, before they are added. */
export function SeriesPreview({ serial, count }: { serial: string; count: number }) {
  if (serial.trim() === '' || !Number.isInteger(count) || count < 2 || count > 500) return null;
  const serials = serialSeries(serial, count);
  if (serials === null) return null;
  const shown = serials.length <= 24 ? serials : [...serials.slice(0, 20), '…', serials[serials.length - 1]];
  return (
    <Section title={`${serials.length} serials`}>
      <Text>{shown.join('   ')}</Text>
    </Section>
  );
}
