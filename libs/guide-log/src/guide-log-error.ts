export type GuideLogFault =
  | 'empty'
  | 'binary'
  | 'one-column'
  | 'no-figures'
  | 'line-too-long'
  | 'header-line-missing'
  | 'columns-unknown'
  | 'map-column-missing'
  | 'map-column-unclear'
  | 'map-unit'
  | 'role-twice'
  | 'units-differ'
  | 'camera-angle'
  | 'date-without-clock'
  | 'date-order-open'
  | 'too-many-lines'
  | 'every-line-refused';

/** A log that cannot be read at all: `fault` for programs, `message` one plain sentence for people. */
export class GuideLogError extends Error {
  constructor(
    readonly fault: GuideLogFault,
    message: string,
  ) {
    super(message);
    this.name = 'GuideLogError';
  }
}
