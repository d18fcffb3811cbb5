import {
  COLUMN_ROLES,
  type ColumnMap,
  type ColumnRole,
  type DateOrder,
  type TimeUnit,
} from './column-map';
import { type ColumnPlan } from './column-plan';
import { pierSideCode } from './direction';
import { GrowingCodes, GrowingNumbers } from './growing-arrays';
import { type LogFrames } from './guide-log';
import { NameColumn } from './name-column';
import { NumberColumns, quoted } from './number-columns';
import { hasCameraErrors } from './plan-check';
import { StateColumn } from './state-column';
import { declinationsOf, hourAnglesOf } from './target-place';
import { TimeAxis } from './time-axis';
import { readDateTime } from './time-cell';
import { TimeWatch } from './time-watch';
import { unitWarnings } from './unit-check';

const TIME_WORDS: Readonly<Record<TimeUnit, string>> = {
  seconds: 'a number',
  milliseconds: 'a number',
  iso: 'a date and time',
  'epoch seconds': 'a number',
  'epoch milliseconds': 'a number',
  clock: 'a time of day',
};

/** The instant at which the clock of a place shows a time; both in seconds since 1970-01-01T00:00 of their clock. */
export type InstantOfLocalTime = (localSeconds: number) => number;

/** Rows of cells to columns of numbers; no row is kept. */
export class FrameBuilder {
  /** 0-based column by role; -1 for a role that the log does not have. */
  #at: Readonly<Record<ColumnRole, number>>;
  readonly #timeUnit: TimeUnit;
  readonly #axis: TimeAxis;
  readonly #times = new GrowingNumbers();
  readonly #numbers: NumberColumns;
  readonly #states: StateColumn;
  readonly #runs = new NameColumn();
  readonly #targets = new NameColumn();
  readonly #pierSides = new GrowingCodes();
  readonly #watch = new TimeWatch();
  #unitWarnings: readonly string[] = [];
  #lastRun = '';
  #lastTarget = '';
  #startEpochSeconds: number | null = null;
  #count = 0;

  constructor(
    private readonly plan: ColumnPlan,
    private readonly map: ColumnMap,
    decimal: '.' | ',',
    private readonly dateOrder: DateOrder | null,
    private readonly instantOfLocalTime: InstantOfLocalTime | null,
  ) {
    const decimalCode = decimal.charCodeAt(0);
    this.#at = indexByRole(plan);
    this.#timeUnit = timeUnitOf(plan);
    this.#axis = new TimeAxis(this.#timeUnit, decimalCode, dateOrder);
    this.#numbers = new NumberColumns(plan, map, decimalCode);
    this.#states = new StateColumn(map.states ?? {});
  }

  get count(): number {
    return this.#count;
  }

  /** Takes the columns at other places from here on: a header further down. */
  rearrange(plan: ColumnPlan): void {
    this.#at = indexByRole(plan);
    this.#numbers.rearrange(plan);
  }

  /**
   * Takes a row as a frame.
   *
   * @param followsHeader The header stood above this row once more: the time may begin anew.
   * @returns Why the row is refused, or null when it was taken.
   */
  add(cells: readonly string[], line: number, followsHeader: boolean): string | null {
    const timeCell = this.#timeCell(cells);
    const rawSeconds = this.#axis.read(timeCell);
    if (Number.isNaN(rawSeconds)) {
      return timeCell.trim() === ''
        ? 'time is blank'
        : `time is not ${TIME_WORDS[this.#timeUnit]}: ${quoted(timeCell)}`;
    }
    const fault = this.#numbers.read(cells);
    if (fault !== null) return fault;

    const run = this.#cell(cells, this.#at.run);
    const target = this.#cell(cells, this.#at.target);
    const changes = run !== this.#lastRun || target !== this.#lastTarget;
    const step = this.#axis.step(rawSeconds, changes || followsHeader);
    if (step === 'backward') {
      this.#watch.refusedBack(this.#axis.secondsBack(rawSeconds), line);
      return `time goes back by ${this.#secondsBack(rawSeconds)} s`;
    }
    if (step === 'restart' && !changes) {
      this.#watch.restarted(this.#axis.secondsBack(rawSeconds), line);
    }
    this.#lastRun = run;
    this.#lastTarget = target;
    const seconds = this.#axis.take(rawSeconds, step);
    this.#times.append(seconds);
    this.#watch.took(seconds, line, changes || followsHeader);
    this.#append(cells, run, target);
    return null;
  }

  finish(): LogFrames {
    const timeSeconds = this.#times.finish();
    const first = timeSeconds[0] ?? 0;
    for (let at = 0; at < timeSeconds.length; at++)
      timeSeconds[at] = (timeSeconds[at] ?? 0) - first;
    const { map } = this;
    const has = (role: ColumnRole) => this.#unit(role) !== null;
    const raError = this.#numbers.finish('raError') ?? new Float64Array(0);
    const decError = this.#numbers.finish('decError') ?? new Float64Array(0);
    const errorUnit = this.#errorUnit();
    this.#unitWarnings = unitWarnings(raError, decError, errorUnit);
    return {
      count: this.#count,
      timeSeconds,
      startEpochSeconds: this.#startEpochSeconds,
      raError,
      decError,
      errorUnit,
      raCorrection: this.#numbers.finish('raCorrection'),
      decCorrection: this.#numbers.finish('decCorrection'),
      correctionUnit:
        (this.#unit('raCorrection') ?? this.#unit('decCorrection')) === 'arcsec' ? 'arcsec' : 'ms',
      correctionSign: map.correctionSign ?? null,
      snr: this.#numbers.finish('snr'),
      brightness: this.#numbers.finish('brightness'),
      state: has('state') ? this.#states.finish() : null,
      run: has('run') ? this.#runs.finish() : null,
      runNames: this.#runs.names,
      target: has('target') ? this.#targets.finish() : null,
      targetNames: this.#targets.names,
      declinationDegrees:
        this.#numbers.finish('declination') ??
        declinationsOf(timeSeconds, map.targetDeclinationDegrees),
      hourAngleHours:
        this.#numbers.finish('hourAngle') ?? hourAnglesOf(timeSeconds, map.targetHourAngleHours),
      pierSide: has('pierSide') ? Uint8Array.from(this.#pierSides.finish()) : null,
    };
  }

  /** What a person should know of the frames, in plain sentences. */
  warnings(): string[] {
    const lacksZone = this.#timeUnit === 'iso' && this.#startEpochSeconds === null;
    return [
      ...(lacksZone
        ? ['The times carry no time zone, so that the instant of the start is not known.']
        : []),
      ...this.#watch.warnings(),
      ...this.#unitWarnings,
      ...this.#states.warnings(),
    ];
  }

  #append(cells: readonly string[], run: string, target: string): void {
    if (this.#count++ === 0) this.#startEpochSeconds = this.#startOf(cells);
    this.#numbers.append();
    if (this.#at.run >= 0) this.#runs.append(run);
    if (this.#at.target >= 0) this.#targets.append(target);
    if (this.#at.state >= 0) this.#states.append(this.#cell(cells, this.#at.state));
    if (this.#at.pierSide >= 0) {
      this.#pierSides.append(pierSideCode(this.#cell(cells, this.#at.pierSide)));
    }
  }

  /** Instant of the first frame: the log's own word, else the map's, else by the clock of the place, else not known. */
  #startOf(cells: readonly string[]): number | null {
    const timeCell = this.#timeCell(cells);
    if (this.#timeUnit.startsWith('epoch')) return this.#axis.read(timeCell);
    const startCell = this.plan.startColumn && cells[this.plan.startColumn.index];
    const times = [timeCell, startCell, this.map.startTime].map((cell) =>
      readDateTime(cell ?? '', this.dateOrder),
    );
    const withZone = times.find((time) => time?.hasZone);
    if (withZone) return withZone.epochSeconds;
    const local = times.find((time) => time !== null);
    return local ? (this.instantOfLocalTime?.(local.epochSeconds) ?? null) : null;
  }

  /** The time; with a date beside it both together. */
  #timeCell(cells: readonly string[]): string {
    const timeCell = cells[this.#at.time] ?? '';
    if (this.#at.date < 0) return timeCell;
    return `${this.#cell(cells, this.#at.date).trim()} ${timeCell.trim()}`.trim();
  }

  /** A cell of a column that the log may not have. */
  #cell(cells: readonly string[], at: number): string {
    return at < 0 ? '' : (cells[at] ?? '');
  }

  #secondsBack(rawSeconds: number): number {
    return Number(this.#axis.secondsBack(rawSeconds).toFixed(3));
  }

  #errorUnit(): 'arcsec' | 'guide px' {
    const unit = this.#unit(hasCameraErrors(this.plan) ? 'xError' : 'raError');
    return unit === 'guide px' ? 'guide px' : 'arcsec';
  }

  /** null: the log has no such column. */
  #unit(role: ColumnRole) {
    const column = this.plan.columns.find((planned) => planned.role === role);
    return column ? column.unit : null;
  }
}

function indexByRole(plan: ColumnPlan): Record<ColumnRole, number> {
  const index = (role: ColumnRole) =>
    plan.columns.find((column) => column.role === role)?.index ?? -1;
  return Object.fromEntries(COLUMN_ROLES.map((role) => [role, index(role)])) as Record<
    ColumnRole,
    number
  >;
}

function timeUnitOf(plan: ColumnPlan): TimeUnit {
  // A time of day with its date beside it is a date and time.
  if (plan.columns.some((column) => column.role === 'date')) return 'iso';
  const unit = plan.columns.find((column) => column.role === 'time')?.unit;
  return (unit as TimeUnit | undefined) ?? 'seconds';
}
