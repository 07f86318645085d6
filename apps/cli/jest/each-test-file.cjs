const fc = require('fast-check');

// A busy machine is slow, not wrong: nothing here asserts time, and a test that hangs still ends.
jest.setTimeout(120_000);

// Property tests draw the same cases on every run, so that a change is judged by what it changed; FC_SEED=random (or a number) looks further.
const chosen = process.env.FC_SEED ?? '20261201';
if (chosen !== 'random') fc.configureGlobal({ ...fc.readConfigureGlobal(), seed: Number(chosen) });
