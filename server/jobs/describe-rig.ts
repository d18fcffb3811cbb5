import type { RigDescription } from '@stillpier/analysis';
import type { RigModel } from '../rigs/rig-model';
import type { SetupModel } from '../setups/setup-model';

/** What the analysis may know of a rig and the setup that guided on it. */
export function describeRig(rig: RigModel, setup: SetupModel | null): RigDescription {
  const { mount, site } = rig;
  return {
    name: rig.name,
    mount: {
      kind: mount.kind,
      wormTeeth: mount.wormTeeth ?? undefined,
      wormPeriodSeconds: mount.wormPeriodSeconds ?? undefined,
      gearStages: mount.gearStages,
      guideRateSidereal: mount.guideRateSidereal ?? undefined,
    },
    site: {
      latitudeDegrees: site.latitudeDegrees ?? undefined,
      longitudeDegrees: site.longitudeDegrees ?? undefined,
      timeZone: site.timeZone,
    },
    ...(setup && {
      imaging: setup.imaging,
      filters: setup.filters,
      guiding: setup.guiding,
      seeingFwhmArcsec: setup.seeingFwhmArcsec ?? undefined,
      subSeconds: setup.subSeconds,
      keepAspect: setup.keepAspect,
    }),
  };
}
