import { LotList } from '@/components/lots/LotList';
import { Awaited } from '@/components/ui/Awaited';
import { Button } from '@/components/ui/Button';
import { EmptyState } from '@/components/ui/EmptyState';
import { Screen } from '@/components/ui/Screen';
import { useLook } from '@/components/ui/useLook';
import { IconButton } from '@/components/ui/IconButton';
import { useChosenBench } from '@/hooks/queries/chosenBench';
import { useLots } from '@/hooks/queries/lots';
import { useRole } from '@/hooks/session/SessionProvider';
import { STAFF } from '@/shared/contracts/roles';

export default function LotsScreen() {
  const lots = useLots();
  const { desk } = useLook();
  const { light } = useChosenBench();
  const staff = STAFF.includes(useRole());
  const add = desk ? (
    <Button label="Add a lot" icon="plus" dense href="/lots/new" />
  ) : (
    <IconButton icon="plus" label="Add a lot" href="/lots/new" />
  );
  return (
    <Screen title="Lots" action={staff ? add : undefined} {...light}>
      <Awaited
        result={lots}
        what="the lots"
        isEmpty={(list) => list.length === 0}
        whenEmpty={
          staff ? (
            <EmptyState
              sentence="No lots yet. Add the first one with its client and its pieces."
              action={<Button label="Add a lot" kind="primary" href="/lots/new" />}
            />
          ) : (
            <EmptyState sentence="No lots of your company yet. They appear here as soon as the laboratory has taken them in." />
          )
        }
      >
        {(list) => <LotList lots={list} />}
      </Awaited>
    </Screen>
  );
}
