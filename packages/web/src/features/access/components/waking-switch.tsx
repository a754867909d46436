import { useMutation, useQuery } from '@tanstack/react-query';
import { CheckField } from '../../../components/field.tsx';
import { canBeWoken, isWoken, startWaking, stopWaking } from '../../../lib/waking.ts';

/** Whether this phone says so when the run sheet changes while the app is closed. */
export function WakingSwitch() {
  const woken = useQuery({ queryKey: ['waking'], queryFn: isWoken, enabled: canBeWoken(), networkMode: 'always' });
  const change = useMutation({
    mutationFn: (on: boolean) => (on ? startWaking() : stopWaking()),
    onSettled: () => woken.refetch(),
  });
  if (!canBeWoken()) return null;
  return (
    <section className="grid gap-2">
      <h2 className="sec">This phone</h2>
      <CheckField
        label="Tell me when my run sheet changes, also when this is closed"
        checked={change.isPending ? change.variables : (woken.data ?? false)}
        disabled={change.isPending}
        onChange={(event) => change.mutate(event.target.checked)}
      />
      <p className="t-2">The message says only that it changed, since a locked screen shows it to anybody.</p>
      {change.error ? (
        <p className="tape" role="alert">
          {change.error.message}
        </p>
      ) : null}
    </section>
  );
}
