import { rigPaths } from '@stillpier/contract';
import { fieldRig } from '../../testing/answers';
import { showComponent } from '../../testing/page-under-test';
import { RigForm } from './rig-form';

describe('the form of a rig', () => {
  it('sends what was typed, with nothing for what is not known', async () => {
    const shown = await showComponent(RigForm, { rig: null });
    shown.type('Name of the rig', 'North pier');
    shown.type('Worm teeth', '180');
    shown.type('Time zone', 'Europe/Vienna');
    shown.press('Make the rig');
    await shown.settle();
    expect(shown.http.expectOne({ method: 'POST', url: rigPaths.all }).request.body).toEqual({
      name: 'North pier',
      mount: {
        kind: 'worm',
        wormTeeth: 180,
        wormPeriodSeconds: null,
        gearStages: [],
        guideRateSidereal: 0.5,
      },
      site: { latitudeDegrees: null, longitudeDegrees: null, timeZone: 'Europe/Vienna' },
    });
  });

  it('says how long a turn of the worm takes while the teeth are typed', async () => {
    const shown = await showComponent(RigForm, { rig: null });
    shown.type('Worm teeth', '180');
    await shown.settle();
    // Mean sidereal day 86164.0905 s / 180: S. Aoki et al., Astron. Astrophys. 105 (1982) 359.
    expect(shown.page.textContent).toContain('one turn of the worm takes 478.7 s');
  });

  it('asks for no worm of a mount that has none, and forgets the one that was typed', async () => {
    const shown = await showComponent(RigForm, { rig: fieldRig({}) });
    shown.type('Kind', 'strain wave');
    await shown.settle();
    expect(shown.page.textContent).not.toContain('Worm teeth');
    expect(shown.fixture.componentInstance.form.getRawValue().mount.wormTeeth).toBeNull();
  });

  it('shows at the fields what is off the contract', async () => {
    const shown = await showComponent(RigForm, { rig: null });
    shown.type('Time zone', 'Atlantis');
    shown.press('Make the rig');
    await shown.settle();
    expect(shown.faultOf('Name of the rig')).toBe('needs a name');
    expect(shown.faultOf('Time zone')).toContain('Europe/Lisbon');
  });

  it('sends the version that it knows, and offers the newer one after a conflict', async () => {
    const rig = fieldRig({ version: 3 });
    const shown = await showComponent(RigForm, { rig });
    const reload = vi.fn();
    shown.fixture.componentInstance.reload.subscribe(reload);
    shown.press('Save the rig');
    await shown.settle();
    const sent = shown.http.expectOne({ method: 'PUT', url: rigPaths.one(rig.id) });
    expect(sent.request.headers.get('If-Match')).toBe('"3"');
    sent.flush(
      { type: 'stale-version', title: 'x', status: 412, detail: 'Somebody else changed this.' },
      { status: 412, statusText: 'Precondition Failed' },
    );
    await shown.settle();
    expect(shown.page.querySelector('[role=alert]')?.textContent).toContain('Somebody else');
    shown.press('Load the newer version');
    expect(reload).toHaveBeenCalledOnce();
  });

  it('adds and removes gear stages', async () => {
    const shown = await showComponent(RigForm, { rig: fieldRig({}) });
    shown.press('Add a gear stage');
    await shown.settle();
    expect(shown.page.querySelectorAll('[aria-label^="Remove gear stage"]')).toHaveLength(2);
    shown.press('Remove');
    await shown.settle();
    expect(shown.fixture.componentInstance.form.getRawValue().mount.gearStages).toEqual([
      { name: '', periodSeconds: null },
    ]);
  });

  it('lets an advisor read and not write', async () => {
    const shown = await showComponent(RigForm, { rig: fieldRig({ role: 'advisor' }) });
    expect(shown.page.querySelectorAll('input:enabled, select:enabled')).toHaveLength(0);
    expect(shown.page.querySelector('[type=submit]')).toBeNull();
  });
});
