import { FormArray, FormControl, FormGroup } from '@angular/forms';
import { type Filter, type Setup } from '@stillpier/contract';

/** The controls of a setup, named as in the contract, so that its faults find their fields. */
export function setupFormGroup() {
  return new FormGroup({
    name: new FormControl('', { nonNullable: true }),
    imaging: new FormGroup({
      ...opticsControls(),
      sensor: new FormControl<Setup['imaging']['sensor']>('mono', { nonNullable: true }),
    }),
    filters: new FormArray<FilterGroup>([]),
    guiding: new FormGroup(opticsControls()),
    seeingFwhmArcsec: number(null),
    subSeconds: number(300),
    keepAspect: number(1.15),
  });
}
export type SetupFormGroup = ReturnType<typeof setupFormGroup>;

export function filterGroup(filter: { name: string; subSeconds: number | null }) {
  return new FormGroup({
    name: new FormControl(filter.name, { nonNullable: true }),
    subSeconds: number(filter.subSeconds),
  });
}
export type FilterGroup = ReturnType<typeof filterGroup>;

/** Usual sets of filters. Subs of minutes through broadband, up to half an hour through narrowband: common practice. */
export const USUAL_FILTERS: readonly { readonly name: string; readonly filters: Filter[] }[] = [
  {
    name: 'Luminance, red, green, blue',
    filters: ['Luminance', 'Red', 'Green', 'Blue'].map((name) => ({ name, subSeconds: 180 })),
  },
  {
    name: 'H-alpha, O III, S II',
    filters: ['H-alpha', 'O III', 'S II'].map((name) => ({ name, subSeconds: 1200 })),
  },
];

/** Puts a setup into the form, as loaded: nothing is edited. */
export function showSetup(form: SetupFormGroup, setup: Setup): void {
  const { name, imaging, filters, guiding, seeingFwhmArcsec, subSeconds, keepAspect } = setup;
  form.controls.filters.clear();
  filters.forEach((filter) => {
    form.controls.filters.push(filterGroup(filter));
  });
  form.reset({ name, imaging, filters, guiding, seeingFwhmArcsec, subSeconds, keepAspect });
}

function opticsControls() {
  return {
    focalLengthMm: number(null),
    apertureMm: number(null),
    pixelUm: number(null),
    binning: number(1),
  };
}

function number(start: number | null): FormControl<number | null> {
  return new FormControl(start);
}
