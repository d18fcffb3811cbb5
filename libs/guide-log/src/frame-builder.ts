import { type ColumnMap, type ColumnRole, type TimeUnit } from './column-map';
import { type ColumnPlan } from './column-plan';
import { correctionWithSign, pierSideCode } from './direction';
import { GrowingCodes, GrowingNumbers } from './growing-arrays';
import { type LogFrames } from './guide-log';
import { NameColumn } from './name-column';
import { NumberColumns, quoted } from './number-columns';
import { StateColumn } from './state-column';
import { TimeAxis } from './time-axis';
import { readIsoTime } from './time-cell';

/** Hours of hour angle that pass in one second: 1.00273790935 sidereal days a day (IAU 1982, Aoki et al.). */
const HOUR_ANGLE_HOURS_PER_SECOND = 1.002_737_909_35 / 3600;

const TIME_WORDS: Readonly<Record<TimeUnit, string>> = {
  seconds: 'a number',
  milliseconds: 'a number',
  iso: 'a date and time',
  'epoch seconds': 'a number',
  'epoch milliseconds': 'a number',
  clock: 'a time of day',
};

/** Rows of cells to columns of numbers; no row is kept. */
export class FrameBuilder {
  readonly #indexOf: ReadonlyMap<ColumnRole, number>;
  readonly #timeUnit: TimeUnit;
  readonly #axis: TimeAxis;
  readonly #times = new GrowingNumbers();
  readonly #numbers: NumberColumns;
  readonly #states: StateColumn;
  readonly #runs = new NameColumn();
  readonly #targets = new NameColumn();
  readonly #pierSides = new GrowingCodes();
  readonly #restarts: string[] = [];
  #section = 1;
  #lastRun = '';
  #lastTarget = '';
  #startEpochSeconds: number | null = null;
  #count = 0;

  constructor(
    private readonly plan: ColumnPlan,
    private readonly map: ColumnMap,
    decimal: '.' | ',',
  ) {
    const decimalCode = decimal.charCodeAt(0);
    this.#indexOf = new Map(plan.columns.map((column) => [column.role, column.index]));
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
    const timeCell = this.#cell(cells, 'time');
    const rawSeconds = this.#axis.read(timeCell);
    if (Number.isNaN(rawSeconds)) {
      return timeCell.trim() === ''
        ? 'time is blank'
        : `time is not ${TIME_WORDS[this.#timeUnit]}: ${quoted(timeCell)}`;
    }
    const fault = this.#numbers.read(cells) ?? this.#applyDirections(cells);
    if (fault !== null) return fault;

    const run = this.#cell(cells, 'run');
    const target = this.#cell(cells, 'target');
    const isNewRun = followsHeader || run !== this.#lastRun || target !== this.#lastTarget;
    const step = this.#axis.step(rawSeconds, isNewRun);
    const secondsBack = Number(this.#axis.secondsBack(rawSeconds).toFixed(3));
    if (step === 'backward') return `time goes back by ${secondsBack} s`;
    if (step === 'restart' && run === this.#lastRun && target === this.#lastTarget) {
      this.#section++;
      this.#restarts.push(
        `In line ${line} the time goes back by ${secondsBack} s: a new run begins.`,
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
    const has = (role: ColumnRole) => this.#indexOf.has(role);
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
      run: has('run') || this.#section > 1 ? this.#runs.finish() : null,
      runNames: has('run') || this.#section > 1 ? this.#runs.names : [],
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
      ...this.#restarts.slice(0, 20),
      ...this.#states.warnings(),
    ];
  }

  #append(cells: readonly string[], run: string, target: string): void {
    if (this.#count++ === 0) this.#startEpochSeconds = this.#startOf(cells);
    this.#numbers.append();
    if (this.#indexOf.has('state')) this.#states.append(this.#cell(cells, 'state'));
    const section = String(this.#section);
    this.#runs.append(this.#section === 1 ? run : run === '' ? section : `${run} (${section})`);
    this.#targets.append(target);
    if (this.#indexOf.has('pierSide')) {
      this.#pierSides.append(pierSideCode(this.#cell(cells, 'pierSide')));
    }
  }

  /** Instant of the first frame: the log's own word, else the map's, else not known. */
  #startOf(cells: readonly string[]): number | null {
    const timeCell = this.#cell(cells, 'time');
    if (this.#timeUnit.startsWith('epoch')) return this.#axis.read(timeCell);
    const startCell = this.plan.startColumn && cells[this.plan.startColumn.index];
    for (const cell of [timeCell, startCell, this.map.startTime]) {
      const time = readIsoTime(cell ?? '');
      if (time?.hasZone) return time.epochSeconds;
    }
    return null;
  }

  #applyDirections(cells: readonly string[]): string | null {
    return (
      this.#applyDirection(cells, 'raDirection', 'raCorrection') ??
      this.#applyDirection(cells, 'decDirection', 'decCorrection')
    );
  }

  #applyDirection(
    cells: readonly string[],
    directionRole: 'raDirection' | 'decDirection',
    correctionRole: 'raCorrection' | 'decCorrection',
  ): string | null {
    if (!this.#indexOf.has(directionRole) || !this.#indexOf.has(correctionRole)) return null;
    const cell = this.#cell(cells, directionRole);
    const correction = correctionWithSign(this.#numbers.value(correctionRole), cell);
    if (correction === null) {
      return `${directionRole === 'raDirection' ? 'RA' : 'Dec'} direction is not known: ${quoted(cell)}`;
    }
    this.#numbers.setValue(correctionRole, correction);
    return null;
  }

  #cell(cells: readonly string[], role: ColumnRole): string {
    const index = this.#indexOf.get(role);
    return index === undefined ? '' : (cells[index] ?? '');
  }

  #unit(role: ColumnRole) {
    return this.plan.columns.find((column) => column.role === role)?.unit;
  }
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
