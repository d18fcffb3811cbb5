export * from './column-map';
export * from './guide-log';
export * from './guide-log-error';
export { knownHeader } from './known-headers';
export {
  createLogReader,
  MOST_LINES,
  readGuideLog,
  type LogReader,
  type LogReaderOptions,
} from './log-reader';
export * from './preview';
