import type { BY_HAND_ACTIONS } from '@stillpier/contract';

/** From `fromSeconds` (included) to `toSeconds` (not included). */
export interface Stretch {
  readonly fromSeconds: number;
  readonly toSeconds: number;
}

/** What is set aside after entries in the order in which they were made: apart from each other, in order of time. */
export function stretchesAfter(
  entries: readonly (Stretch & { readonly action: (typeof BY_HAND_ACTIONS)[number] })[],
): Stretch[] {
  return entries.reduce<Stretch[]>(
    (stretches, { action, ...stretch }) =>
      action === 'set aside' ? withStretch(stretches, stretch) : withoutStretch(stretches, stretch),
    [],
  );
}

export function overlaps(one: Stretch, other: Stretch): boolean {
  return one.fromSeconds < other.toSeconds && other.fromSeconds < one.toSeconds;
}

function withStretch(stretches: readonly Stretch[], added: Stretch): Stretch[] {
  const touches = ({ fromSeconds, toSeconds }: Stretch) =>
    fromSeconds <= added.toSeconds && added.fromSeconds <= toSeconds;
  const joined = [added, ...stretches.filter(touches)];
  const whole = {
    fromSeconds: Math.min(...joined.map(({ fromSeconds }) => fromSeconds)),
    toSeconds: Math.max(...joined.map(({ toSeconds }) => toSeconds)),
  };
  const apart = stretches.filter((stretch) => !touches(stretch));
  return [...apart, whole].sort((a, b) => a.fromSeconds - b.fromSeconds);
}

function withoutStretch(stretches: readonly Stretch[], removed: Stretch): Stretch[] {
  return stretches.flatMap((stretch) => {
    const before = { ...stretch, toSeconds: Math.min(stretch.toSeconds, removed.fromSeconds) };
    const after = { ...stretch, fromSeconds: Math.max(stretch.fromSeconds, removed.toSeconds) };
    const rest = overlaps(stretch, removed) ? [before, after] : [stretch];
    return rest.filter(({ fromSeconds, toSeconds }) => fromSeconds < toSeconds);
  });
}
