import { useChangeDigest, useSession } from '@/features/api/session';
import { Checkbox } from '@/features/ui';

/** Curators choose whether they get a mail a day about what is new in the queue. */
export function DigestSwitch() {
  const digest = useSession().data?.digest ?? null;
  const change = useChangeDigest();
  if (digest === null) return null;
  return (
    <div className="r-item r-item-rule">
      <Checkbox
        label="A daily mail of new submissions"
        checked={change.isPending ? change.variables : digest}
        onChange={(next) => change.mutate(next)}
        error={change.isError ? 'Not changed: the archive cannot be reached.' : null}
      />
    </div>
  );
}
