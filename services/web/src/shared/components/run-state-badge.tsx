import { Badge, type BadgeProps } from '@fluentui/react-components';
import type { RunState } from '@noonwell/schema';

const looks: Readonly<
  Record<RunState, { label: string; color: BadgeProps['color']; appearance: BadgeProps['appearance'] }>
> = {
  queued: { label: 'Queued', color: 'informative', appearance: 'outline' },
  running: { label: 'Running', color: 'brand', appearance: 'tint' },
  done: { label: 'Done', color: 'success', appearance: 'tint' },
  failed: { label: 'Failed', color: 'danger', appearance: 'tint' },
  cancelled: { label: 'Cancelled', color: 'subtle', appearance: 'outline' },
};

interface RunStateBadgeProps {
  /** null: the newest version was never run on its weather year. */
  state: RunState | null;
  /** 0 … 1, shown while it runs. */
  progress?: number;
}

/** The state of a run in a word, never by colour alone. */
export function RunStateBadge({ state, progress }: RunStateBadgeProps) {
  if (state === null) return <Badge appearance="outline">Not run yet</Badge>;
  const { label, color, appearance } = looks[state];
  const percent =
    state === 'running' && progress !== undefined ? ` ${Math.floor(progress * 100)}\u00a0%` : '';
  return (
    <Badge color={color} appearance={appearance}>
      {label}
      {percent}
    </Badge>
  );
}
