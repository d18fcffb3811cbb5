import { COLUMN_ROLES, type ColumnMap, type ColumnRole, type TimeUnit } from './column-map';
import { type ColumnPlan } from './column-plan';
import { pierSideCode } from './direction';
import { GrowingCodes, GrowingNumbers } from './growing-arrays';
import { type LogFrames } from './guide-log';
import { NameColumn } from './name-column';
import { NumberColumns, quoted } from './number-columns';
import { StateColumn } from './state-column';
import { TimeAxis } from './time-axis';
import { readIsoTime } from './time-cell';

/** Hours of hour angle that pass in one second: 1.00273790935 sidereal days a day (IAU 1982, Aoki et al.). */
const HOUR_ANGLE_HOURS_PER_SECOND = 1.002_737_909_35 / 3600;

/** Warnings of times that go back; a log with more of them has another trouble. */
const LISTED_RESTARTS = 20;

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
  readonly #at: Readonly<Record<ColumnRole, number>>;
  readonly #timeUnit: TimeUnit;
  readonly #axis: TimeAxis;
  readonly #times = new GrowingNumbers();
  readonly #numbers: NumberColumns;
  readonly #states: StateColumn;
  readonly #runs = new NameColumn();
  readonly #targets = new NameColumn();
  readonly #pierSides = new GrowingCodes();
  readonly #restarts: string[] = [];
  #lastRun = '';
  #lastTarget = '';
  #startEpochSeconds: number | null = null;
  #count = 0;

  constructor(
    private readonly plan: ColumnPlan,
    private readonly map: ColumnMap,
    decimal: '.' | ',',
    private readonly instantOfLocalTime: InstantOfLocalTime | null,
  ) {
    const decimalCode = decimal.charCodeAt(0);
    this.#at = indexByRole(plan);
    this.#timeUnit = timeUnitOf(plan);
    this.#axis = new TimeAxis(this.#timeUnit, decimalCode);
    this.#numbers = new NumberColumns(plan, decimalCode);
    this.#states = new StateColumn(map.states ?? {});
  }

  get count(): number {
    return this.#count;
  }

  /**
   * Takes a row as a frame.
   *
   * @param followsHeader The header stood above this row once more: the time may begin anew.
   * @returns Why the row is refused, or null when it was taken.
   */
  add(cells: readonly string[], line: number, followsHeader: boolean): string | null {
    const timeCell = cells[this.#at.time] ?? '';
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
    if (step === 'backward') return `time goes back by ${this.#secondsBack(rawSeconds)} s`;
    if (step === 'restart' && !changes && this.#restarts.length < LISTED_RESTARTS) {
      this.#restarts.push(
        `In line ${line} the time goes back by ${this.#secondsBack(rawSeconds)} s: a new run begins there.`,
      );
    }
    this.#lastRun = run;
    this.#lastTarget = target;
    this.#times.append(this.#axis.take(rawSeconds, step));
    this.#append(cells, run, target);
    return null;
  }

  finish(): LogFrames {
    const timeSeconds = this.#times.finish();
    const first = timeSeconds[0] ?? 0;
    for (let at = 0; at < timeSeconds.length; at++)
      timeSeconds[at] = (timeSeconds[at] ?? 0) - first;
    const { map } = this;
    const has = (role: ColumnRole) => this.#at[role] >= 0;
    return {
      count: this.#count,
      timeSeconds,
      startEpochSeconds: this.#startEpochSeconds,
      raError: this.#numbers.finish('raError') ?? new Float64Array(0),
      decError: this.#numbers.finish('decError') ?? new Float64Array(0),
      errorUnit: this.#unit('raError') === 'guide px' ? 'guide px' : 'arcsec',
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
        mapped(map.targetDeclinationDegrees, timeSeconds, (degrees) => degrees),
      hourAngleHours:
        this.#numbers.finish('hourAngle') ??
        mapped(map.targetHourAngleHours, timeSeconds, (hours, seconds) =>
          withinHalfTurn(hours + seconds * HOUR_ANGLE_HOURS_PER_SECOND),
        ),
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
      ...this.#restarts,
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
    const timeCell = cells[this.#at.time] ?? '';
    if (this.#timeUnit.startsWith('epoch')) return this.#axis.read(timeCell);
    const startCell = this.plan.startColumn && cells[this.plan.startColumn.index];
    const times = [timeCell, startCell, this.map.startTime].map((cell) => readIsoTime(cell ?? ''));
    const withZone = times.find((time) => time?.hasZone);
    if (withZone) return withZone.epochSeconds;
    const local = times.find((time) => time !== null);
    return local ? (this.instantOfLocalTime?.(local.epochSeconds) ?? null) : null;
  }

  /** A cell of a column that the log may not have. */
  #cell(cells: readonly string[], at: number): string {
    return at < 0 ? '' : (cells[at] ?? '');
  }

  #secondsBack(rawSeconds: number): number {
    return Number(this.#axis.secondsBack(rawSeconds).toFixed(3));
  }

  #unit(role: ColumnRole) {
    return this.plan.columns.find((column) => column.role === role)?.unit;
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
  const unit = plan.columns.find((column) => column.role === 'time')?.unit;
  return (unit as TimeUnit | undefined) ?? 'seconds';
}

/** A value of the map for every frame, or null when the map says nothing. */
function mapped(
  value: number | undefined,
  timeSeconds: Float64Array,
  at: (value: number, seconds: number) => number,
): Float64Array | null {
  return value === undefined ? null : timeSeconds.map((seconds) => at(value, seconds));
}

/** Hours in [-12, 12). */
function withinHalfTurn(hours: number): number {
  return ((((hours + 12) % 24) + 24) % 24) - 12;
}
