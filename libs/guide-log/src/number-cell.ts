const POWERS_OF_TEN = Float64Array.from({ length: 23 }, (_, power) => Number(`1e${power}`));
/** Fewer digits than this are an integer that a double holds exactly. */
const EXACT_DIGITS = 15;
const NUMBER = /^[+-]?(\d+\.?\d*|\.\d+)(e[+-]?\d+)?$/i;
const MINUS_SIGN = 0x2212;

/**
 * The number in a cell, or NaN where it holds none (`isMissingCell` tells blank from text). Blanks around it are
 * allowed; hexadecimal, infinity and grouped thousands are not numbers here.
 *
 * Digits are gathered as an integer and divided by a power of ten: exact operands and one rounding, so the result
 * is the nearest double (W. D. Clinger, How to read floating point numbers accurately, 1990), without the cost
 * of cutting and converting a string. Longer numbers and exponents go through Number.
 *
 * @param decimalCode Character code of the decimal sign, `.` or `,`.
 */
export function readNumber(cell: string, decimalCode: number): number {
  let at = 0;
  let end = cell.length;
  while (at < end && isBlank(cell.charCodeAt(at))) at++;
  while (end > at && isBlank(cell.charCodeAt(end - 1))) end--;
  const first = at < end ? cell.charCodeAt(at) : 0;
  const negative = first === 45 || first === MINUS_SIGN;
  if (negative || first === 43) at++;

  let digits = 0;
  let integer = 0;
  let decimals = -1; // none yet
  for (let i = at; i < end; i++) {
    const code = cell.charCodeAt(i);
    if (code >= 48 && code <= 57) {
      integer = integer * 10 + (code - 48);
      digits++;
      if (decimals >= 0) decimals++;
    } else if (code === decimalCode && decimals < 0) {
      decimals = 0;
    } else {
      return readLongNumber(cell.slice(at, end), decimalCode, negative);
    }
  }
  if (digits === 0) return NaN;
  if (digits > EXACT_DIGITS) return readLongNumber(cell.slice(at, end), decimalCode, negative);
  const magnitude = decimals > 0 ? integer / (POWERS_OF_TEN[decimals] ?? NaN) : integer;
  return negative ? -magnitude : magnitude;
}

/** Whether a cell says that there is no number: blank or NaN. */
export function isMissingCell(cell: string): boolean {
  return /^\s*([+-]?nan)?\s*$/i.test(cell);
}

function readLongNumber(unsigned: string, decimalCode: number, negative: boolean): number {
  const decimal = String.fromCharCode(decimalCode);
  if (decimal !== '.' && unsigned.includes('.')) return NaN;
  const plain = unsigned.replace(decimal, '.');
  if (!NUMBER.test(plain) || /^[+-]/.test(plain)) return NaN;
  const magnitude = Number(plain);
  if (!Number.isFinite(magnitude)) return NaN;
  return negative ? -magnitude : magnitude;
}

function isBlank(code: number): boolean {
  return code === 32 || code === 9 || code === 0xa0;
}
