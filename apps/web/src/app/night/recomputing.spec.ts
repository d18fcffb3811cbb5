import { provideHttpClient } from '@angular/common/http';
import { provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import type { LogImport } from '@stillpier/contract';
import { FakeEventSource } from '../../testing/fake-event-source';
import { NightLogs } from './night-logs';
import { Recomputing } from './recomputing';

const RIG = '11111111-1111-4111-8111-111111111111';
const LOG: LogImport = {
  id: '33333333-3333-4333-8333-333333333333',
  rigId: RIG,
  setupId: null,
  fileName: 'pier.csv',
  sizeBytes: 100,
  sha256: 'a'.repeat(64),
  state: 'done',
  progress: 1,
  stage: 'Done',
  error: null,
  attempt: 1,
  lines: 100,
  frames: 99,
  refusedCount: 0,
  nights: ['2026-11-28'],
  duplicate: false,
  createdAt: '2026-11-29T08:00:00Z',
};

function showRecomputing() {
  vi.stubGlobal('EventSource', FakeEventSource);
  TestBed.configureTestingModule({
    providers: [NightLogs, provideHttpClient(), provideHttpClientTesting()],
  });
  const fixture = TestBed.createComponent(Recomputing);
  fixture.componentRef.setInput('rigId', RIG);
  fixture.componentRef.setInput('logs', [{ importId: LOG.id }]);
  const stood = vi.fn();
  fixture.componentInstance.stood.subscribe(stood);
  TestBed.tick();
  const tell = (more: Partial<LogImport>) => {
    FakeEventSource.last.tell({ ...LOG, ...more });
    TestBed.tick();
  };
  const text = () => (fixture.nativeElement as HTMLElement).textContent.replace(/\s+/g, ' ').trim();
  return { stood, tell, text };
}

describe('Recomputing', () => {
  afterEach(() => vi.unstubAllGlobals());

  it('says nothing of a log whose figures stand', () => {
    const { stood, tell, text } = showRecomputing();
    tell({});
    expect(text()).toBe('');
    expect(stood).not.toHaveBeenCalled();
  });

  it('says how far the new figures are, and once that they stand', () => {
    const { stood, tell, text } = showRecomputing();
    tell({ state: 'running', stage: 'Analysing the runs', progress: 0.6 });
    expect(text()).toContain('pier.csv are being computed anew: Analysing the runs, 60 %.');
    tell({});
    tell({});
    expect(text()).toBe('');
    expect(stood).toHaveBeenCalledOnce();
  });

  it('leaves the earlier figures when the reading fails, and other logs alone', () => {
    const { stood, tell, text } = showRecomputing();
    tell({ state: 'running', progress: 0.2 });
    tell({ state: 'failed' });
    tell({ id: RIG, state: 'running' });
    expect(text()).toBe('');
    expect(stood).not.toHaveBeenCalled();
  });
});
