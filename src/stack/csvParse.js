// The parser's own declarations pull in Node's types, which the core does without: csvParse.d.ts declares the part used.
export { parse } from 'csv-parse/browser/esm/sync'
