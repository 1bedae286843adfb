import { createContext, useCallback, useContext, useMemo, useState, type ReactNode } from 'react';
import { readChoice, writeChoice } from '@/hooks/theme/deviceStore';
import { STAFF } from '@/shared/contracts/roles';
import { useRole } from '@/hooks/session/SessionProvider';
import { useBenches } from './benches';

interface BenchChoice {
  chosenId: string | null;
  choose: (benchId: string) => void;
}

const BenchChoiceContext = createContext<BenchChoice>({ chosenId: null, choose: () => undefined });

/** Remembers at which bench this device stands. */
export function BenchChoiceProvider({ children }: { children: ReactNode }) {
  const [chosenId, setChosenId] = useState(() => readChoice('bench'));
  const choose = useCallback((benchId: string) => {
    writeChoice('bench', benchId);
    setChosenId(benchId);
  }, []);
  const value = useMemo(() => ({ chosenId, choose }), [chosenId, choose]);
  return <BenchChoiceContext.Provider value={value}>{children}</BenchChoiceContext.Provider>;
}

/** The bench of this device: the one chosen last, else the first; null while there is none. */
export function useChosenBench() {
  const staff = STAFF.includes(useRole());
  const benches = useBenches(staff);
  const { chosenId, choose } = useContext(BenchChoiceContext);
  const list = benches.data ?? [];
  const bench = list.find((one) => one.id === chosenId) ?? list[0] ?? null;
  return {
    bench,
    benches,
    choose,
    /** For Screen: the laser of the bench, and its name. */
    light: { wavelengthNm: bench?.current.laser.wavelengthNm ?? null, benchLabel: bench?.name ?? null },
  };
}
