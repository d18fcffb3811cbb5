import { type Mount } from '@stillpier/contract';

/** The kinds of mount, as people call them. */
export const MOUNT_KIND_NAMES: readonly { readonly kind: Mount['kind']; readonly name: string }[] =
  [
    { kind: 'worm', name: 'Worm gear' },
    { kind: 'strain wave', name: 'Strain wave gear' },
    { kind: 'friction', name: 'Friction drive' },
    { kind: 'direct drive', name: 'Direct drive' },
    { kind: 'other', name: 'Another kind' },
  ];
