import { useEffect, useState } from 'react';
import { formatDate, formatTime } from '@/shared/units/format';

function text(): string {
  const now = new Date();
  const weekday = now.toLocaleDateString('en-GB', { weekday: 'short' });
  return `${weekday} ${formatDate(now.toISOString()).replace(/ \d{4}$/, '')}, ${formatTime(now.toISOString())}`;
}

/** “Wed 4 March, 07:12”, kept right by the minute. */
export function useNow(): string {
  const [now, setNow] = useState(text);
  useEffect(() => {
    const timer = setInterval(() => setNow(text()), 10_000);
    return () => clearInterval(timer);
  }, []);
  return now;
}
