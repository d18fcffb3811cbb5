import { FormArray, FormControl, FormGroup } from '@angular/forms';
import { type Mount, type Rig } from '@stillpier/contract';

/** The controls of a rig, named as in the contract, so that its faults find their fields. */
export function rigFormGroup() {
  return new FormGroup({
    name: text(''),
    mount: new FormGroup({
      kind: new FormControl<Mount['kind']>('worm', { nonNullable: true }),
      wormTeeth: number(null),
      wormPeriodSeconds: number(null),
      gearStages: new FormArray<GearStageGroup>([]),
      guideRateSidereal: number(0.5),
    }),
    site: new FormGroup({
      latitudeDegrees: number(null),
      longitudeDegrees: number(null),
      timeZone: text(Intl.DateTimeFormat().resolvedOptions().timeZone),
    }),
  });
}
export type RigFormGroup = ReturnType<typeof rigFormGroup>;

export function gearStageGroup(stage: { name: string; periodSeconds: number | null }) {
  return new FormGroup({ name: text(stage.name), periodSeconds: number(stage.periodSeconds) });
}
export type GearStageGroup = ReturnType<typeof gearStageGroup>;

/** Puts a rig into the form, as loaded: nothing is edited. */
export function showRig(form: RigFormGroup, { name, mount, site }: Rig): void {
  const stages = form.controls.mount.controls.gearStages;
  stages.clear();
  mount.gearStages.forEach((stage) => {
    stages.push(gearStageGroup(stage));
  });
  form.reset({ name, mount, site });
}

function text(start: string): FormControl<string> {
  return new FormControl(start, { nonNullable: true });
}

function number(start: number | null): FormControl<number | null> {
  return new FormControl(start);
}
