import fc from "fast-check";

/**
 * The same cases in every `npm test`, so that a red run means a change and not a draw of luck.
 * `npm run test:properties` looks further: new cases at each run, twenty times as many; a case it finds becomes a test of its own.
 */
const search = process.env["PROPERTY_RUNS"];
fc.configureGlobal(search === undefined ? { seed: 20_261_201 } : { numRuns: Number(search) });
